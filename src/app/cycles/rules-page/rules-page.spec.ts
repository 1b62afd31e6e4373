import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting, type TestRequest } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { CycleSettings } from '../../../../shared/cycles/cycles-contract';
import { FIT_BINS, type RuleEffects } from '../../../../shared/matching/effects-contract';
import { DEFAULT_MATCHING_SETTINGS, type MatchingSettings } from '../../../../shared/matching/matching-contract';
import { RulesPage } from './rules-page';
import { withRule } from './settings-changes';

const ID = '6b1f2a52-6f0a-4c53-9d0e-3c8f5e1f7a10';
const SETTINGS = `/api/cycles/${ID}/settings`;
const EFFECTS = `/api/matching/cycles/${ID}/effects`;
const AFTER_THE_PAUSE = 400;
const stored = (version: number, settings: MatchingSettings, savedBy: string): CycleSettings => ({
  cycleId: ID,
  version,
  settings,
  savedBy,
  savedAt: '2026-12-01T09:00:00.000Z',
});
const found = (pairable: number): RuleEffects => ({
  mentees: 156,
  mentors: 98,
  places: 170,
  eligiblePairs: 2914,
  menteesWithNone: 4,
  pairable,
  rules: [{ rule: 'meeting', label: 'A way to meet', excludesAlone: 31, gainWithout: 3 }],
  distribution: Array.from({ length: FIT_BINS }, (_, at) => at),
});

describe('RulesPage', { timeout: 20_000 }, () => {
  let fixture: ComponentFixture<RulesPage>;
  let host: HTMLElement;
  let http: HttpTestingController;

  const pause = (): Promise<void> => new Promise((resolve) => setTimeout(resolve, AFTER_THE_PAUSE));
  const settle = async (): Promise<void> => {
    await new Promise((resolve) => setTimeout(resolve));
    fixture.detectChanges();
  };
  const words = (): string => host.textContent?.replace(/\s+/g, ' ') ?? '';
  const button = (name: string): HTMLButtonElement =>
    [...host.querySelectorAll('button')].find((each) => each.textContent?.trim() === name)!;
  const field = (label: string): HTMLInputElement =>
    [...host.querySelectorAll('mat-form-field')]
      .find((each) => each.querySelector('label')?.textContent?.trim() === label)!
      .querySelector('input, textarea')!;

  async function type(label: string, text: string): Promise<void> {
    const input = field(label);
    input.value = text;
    input.dispatchEvent(new Event('input'));
    await settle();
  }

  async function effectIs(pairable: number): Promise<TestRequest> {
    await pause();
    const request = http.expectOne(EFFECTS);
    request.flush(found(pairable));
    await settle();
    return request;
  }

  beforeEach(async () => {
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
    });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(RulesPage);
    fixture.componentRef.setInput('cycleId', ID);
    host = fixture.nativeElement as HTMLElement;
    await settle();
    http.expectOne(SETTINGS).flush(stored(4, DEFAULT_MATCHING_SETTINGS, 'Ines Varga'));
    http.match(`${SETTINGS}/history`).forEach((request) => request.flush({ versions: [] }));
    await settle();
  });

  it('shows who saved last, and the effect of the whole and of each rule', async () => {
    await effectIs(145);
    expect(words()).toContain('Version 4 · saved by Ines Varga');
    expect(words()).toContain('145 of 156 mentees');
    expect(words()).toContain('excludes 31 pairs that nothing else excludes; without it 3 more could be paired');
    const edges = [...host.querySelectorAll('app-distribution-bars svg text')].map((text) => text.textContent?.trim());
    expect(edges).toContain('100');
    expect(edges).not.toContain('10000');
    expect(button('Save').disabled).toBe(true);
  });

  it('asks once after several changes, and keeps the last numbers meanwhile', async () => {
    await effectIs(145);
    await type('In person only within', '60');
    await type('In person only within', '40');
    expect(words()).toContain('Computing …');
    expect(words()).toContain('145 of 156 mentees');
    const request = await effectIs(140);
    expect((request.request.body as { settings: MatchingSettings }).settings).toEqual(
      withRule(DEFAULT_MATCHING_SETTINGS, { rule: 'meeting', on: true, maxKm: 40 }),
    );
    expect(words()).toContain('140 of 156 mentees');
  });

  it('says at the field what is wrong, drops the request under way, and asks nothing', async () => {
    await pause();
    const underWay = http.expectOne(EFFECTS);
    await type('In person only within', '0');
    expect(underWay.cancelled).toBe(true);
    await pause();
    http.expectNone(EFFECTS);
    expect(words()).toContain('Between 1 and 1000 kilometres');
    expect(words()).toContain('Waits until every field is right');
    expect(button('Save').disabled).toBe(true);
  });

  it('undoes what was typed in every field', async () => {
    await type('Groups of companies', 'Aldermoor');
    await type('Seed', '');
    await type('Charge, 3rd place on', '7.25');
    expect(words()).toContain('“Aldermoor” stands alone on its line');
    expect(words()).toContain('A whole number from 0');
    button('Undo changes').click();
    await settle();
    expect(field('Groups of companies').value).toBe('');
    expect(field('Seed').value).toBe('1');
    expect(field('Charge, 3rd place on').value).toBe('6.0');
    expect(words()).not.toContain('not saved');
  });

  it('saves on the version it read and keeps what is typed meanwhile', async () => {
    await type('Seed', '7');
    expect(words()).toContain('Changes are not saved yet');
    button('Save').click();
    await settle();
    const request = http.expectOne({ method: 'PUT', url: SETTINGS });
    expect(request.request.headers.get('if-match')).toBe('"4"');
    await type('Seed', '78');
    request.flush(stored(5, { ...DEFAULT_MATCHING_SETTINGS, seed: 7 }, 'Ravi Menon'));
    await settle();
    expect(field('Seed').value).toBe('78');
    expect(words()).toContain('Changes are not saved yet');
  });

  describe('where a colleague saved meanwhile', () => {
    const theirs = stored(5, { ...DEFAULT_MATCHING_SETTINGS, leftOutBonus: 900 }, 'Ravi Menon');

    beforeEach(async () => {
      await type('Seed', '7');
      button('Save').click();
      await settle();
      http
        .expectOne({ method: 'PUT', url: SETTINGS })
        .flush(
          { type: '/problems/stale', title: 'Somebody else saved', status: 412, code: 'stale', current: theirs },
          { status: 412, statusText: 'Precondition Failed' },
        );
      await settle();
    });

    it('lists what each changed, and takes theirs', async () => {
      expect(words()).toContain('Ravi Menon saved other settings meanwhile');
      const sides = [...host.querySelectorAll('app-stale-notice ul')].map((list) => list.textContent?.trim());
      expect(sides).toEqual(['Bonus for those left out last time: 5.0 → 9.0', 'Seed: 1 → 7']);
      button('Take theirs').click();
      await settle();
      expect(field('Seed').value).toBe('1');
      expect(field('Bonus, left out last time').value).toBe('9.0');
      expect(words()).toContain('Version 5 · saved by Ravi Menon');
    });

    it('saves mine over theirs on their version', async () => {
      button('Save mine over it').click();
      await settle();
      const again = http.expectOne({ method: 'PUT', url: SETTINGS });
      expect(again.request.headers.get('if-match')).toBe('"5"');
      again.flush(stored(6, { ...DEFAULT_MATCHING_SETTINGS, seed: 7 }, 'Ines Varga'));
      await settle();
      expect(words()).not.toContain('meanwhile');
      expect(words()).toContain('Version 6 · saved by Ines Varga');
    });
  });
});
