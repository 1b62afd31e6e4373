import { TestBed } from '@angular/core/testing';
import { PlanAtAGlance, PlanGroup } from './plan-at-a-glance';

const groups: PlanGroup[] = [
  {
    key: 'hydrographic',
    label: 'Hydrographic',
    mentees: [
      { key: 'a', name: 'Ines Varga', mentorKey: 'm', fit: 7130 },
      { key: 'b', name: 'Ravi Menon', mentorKey: null, fit: null },
    ],
    places: [{ key: 'm', name: 'Edda Holm', menteeKey: 'a' }],
    short: 1,
  },
];

describe('PlanAtAGlance', () => {
  async function draw() {
    const fixture = TestBed.createComponent(PlanAtAGlance);
    fixture.componentRef.setInput('groups', groups);
    await fixture.whenStable();
    return { fixture, host: fixture.nativeElement as HTMLElement };
  }

  it('says every pairing', async () => {
    const { host } = await draw();
    const options = [...host.querySelectorAll('[role="option"]')].map((option) => option.getAttribute('aria-label'));
    expect(options).toEqual(['Ines Varga with Edda Holm, fit 71.3', 'Ravi Menon, left out']);
  });

  it('follows a thread by keyboard and tells which was chosen', async () => {
    const { fixture, host } = await draw();
    const selected: string[] = [];
    fixture.componentInstance.selected.subscribe((key) => selected.push(key));
    const list = host.querySelector('[role="listbox"]');
    list?.dispatchEvent(new FocusEvent('focus'));
    await fixture.whenStable();
    expect(host.querySelector('.followed-words')?.textContent).toContain('Ines Varga with Edda Holm');

    list?.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowRight' }));
    list?.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter' }));
    expect(selected).toEqual(['b']);
  });

  it('tells which group was chosen, and null when it is chosen again', async () => {
    const { fixture, host } = await draw();
    const chosen: (string | null)[] = [];
    fixture.componentInstance.groupChosen.subscribe((key) => chosen.push(key));
    const group = host.querySelector('.group');
    group?.dispatchEvent(new MouseEvent('click', { bubbles: true }));
    fixture.componentRef.setInput('chosenGroup', 'hydrographic');
    await fixture.whenStable();
    group?.dispatchEvent(new MouseEvent('click', { bubbles: true }));
    expect(chosen).toEqual(['hydrographic', null]);
  });

  it('says so when nobody is in the plan', async () => {
    const { fixture, host } = await draw();
    fixture.componentRef.setInput('groups', []);
    await fixture.whenStable();
    expect(host.querySelector('.followed-words')?.textContent).toContain('Nobody is in this plan yet');
    expect(host.querySelector('[role="listbox"]')).toBeNull();
  });

  it('bundles where there are very many threads', async () => {
    const { fixture, host } = await draw();
    fixture.componentRef.setInput('threadLimit', 0);
    await fixture.whenStable();
    expect(host.querySelector('[role="listbox"]')).toBeNull();
    expect(host.querySelector('.bundles.always')).not.toBeNull();
  });
});
