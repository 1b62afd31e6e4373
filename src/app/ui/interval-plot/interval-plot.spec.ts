import { TestBed } from '@angular/core/testing';
import { IntervalPlot, IntervalRow } from './interval-plot';

describe('IntervalPlot', () => {
  it('draws a dot and a line for what may be shown, and says why the rest is hidden', async () => {
    const rows: IntervalRow[] = [
      { kind: 'shown', label: 'Student', count: 22, of: 25, share: 0.88, low: 0.7, high: 0.96 },
      { kind: 'hidden', label: 'Returning', because: 'hidden: fewer than 10 people' },
    ];
    const fixture = TestBed.createComponent(IntervalPlot);
    fixture.componentRef.setInput('caption', 'Paired, by career stage');
    fixture.componentRef.setInput('rows', rows);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.querySelectorAll('circle')).toHaveLength(1);
    expect(host.querySelector('text.hidden')?.textContent).toContain('fewer than 10');
    expect(host.querySelector('table')?.textContent).toContain('70\u00a0% to 96\u00a0%');
  });
});
