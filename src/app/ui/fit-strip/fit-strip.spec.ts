import { TestBed } from '@angular/core/testing';
import { FitStrip, stripInWords } from './fit-strip';
import { FitStripHeader } from './fit-strip-header';
import { FitCriterion } from './strip-layout';

const criteria: FitCriterion[] = [
  { label: 'Practice areas', short: 'Prac', weight: 3, score: 0.92 },
  { label: 'Distance', weight: 1, score: 0.5, missing: true },
];

describe('FitStrip', () => {
  it('says the numbers that it draws', async () => {
    const fixture = TestBed.createComponent(FitStrip);
    fixture.componentRef.setInput('criteria', criteria);
    await fixture.whenStable();
    const svg = (fixture.nativeElement as HTMLElement).querySelector('svg');
    expect(svg?.getAttribute('aria-label')).toBe(stripInWords(criteria));
    expect(svg?.querySelectorAll('.fill')).toHaveLength(2);
    expect(svg?.querySelectorAll('.fill.missing')).toHaveLength(1);
  });

  it('tells what was not stated', () => {
    expect(stripInWords(criteria)).toBe(
      'Practice areas 92 of 100, weight 75 %; Distance not stated, counted as 50, weight 25 %',
    );
  });
});

describe('FitStripHeader', () => {
  it('is as long as the strip and names every criterion', async () => {
    const strip = TestBed.createComponent(FitStrip);
    strip.componentRef.setInput('criteria', criteria);
    const header = TestBed.createComponent(FitStripHeader);
    header.componentRef.setInput('criteria', criteria);
    await strip.whenStable();
    await header.whenStable();
    const svgOf = (host: HTMLElement): SVGElement | null => host.querySelector('svg');
    const drawn = svgOf(header.nativeElement as HTMLElement);
    expect(drawn?.getAttribute('width')).toBe(svgOf(strip.nativeElement as HTMLElement)?.getAttribute('width'));
    expect(drawn?.getAttribute('aria-label')).toContain('Practice areas, Distance');
  });
});
