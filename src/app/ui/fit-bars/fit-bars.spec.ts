import { TestBed } from '@angular/core/testing';
import { FitBars } from './fit-bars';

describe('FitBars', () => {
  it('lists score and weight of each criterion', async () => {
    const fixture = TestBed.createComponent(FitBars);
    fixture.componentRef.setInput('criteria', [
      { label: 'Topics', weight: 3, score: 0.6 },
      { label: 'Language', weight: 1, score: 0.5, missing: true },
    ]);
    await fixture.whenStable();
    const rows = [...(fixture.nativeElement as HTMLElement).querySelectorAll('tbody tr')];
    const words = rows.map((row) => row.textContent?.replace(/\s+/gu, ' ').trim());
    expect(words[0]).toContain('Topics 60 × 75 %');
    expect(words[1]).toContain('not stated');
  });
});
