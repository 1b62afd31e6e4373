import { TestBed } from '@angular/core/testing';
import { durationInWords, ProgressPanel } from './progress-panel';

describe('ProgressPanel', () => {
  it('has a named progress bar and can be stopped', async () => {
    const fixture = TestBed.createComponent(ProgressPanel);
    fixture.componentRef.setInput('label', 'Run 7');
    fixture.componentRef.setInput('percent', 42);
    fixture.componentRef.setInput('stage', 'Looking for the best plan');
    let stopped = 0;
    fixture.componentInstance.cancelled.subscribe(() => (stopped += 1));
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    const bar = host.querySelector('[role="progressbar"]');
    expect(bar?.getAttribute('aria-label')).toBe('Run 7');
    expect(bar?.getAttribute('aria-valuenow')).toBe('42');
    expect(host.querySelector('[role="status"]')?.textContent).toContain('Looking for the best plan');

    host.querySelector('button')?.click();
    expect(stopped).toBe(1);
  });

  it('says durations in words', () => {
    expect([null, 48, 71].map((seconds) => durationInWords(seconds))).toEqual([
      '',
      '48\u00a0s',
      '1\u00a0min 11\u00a0s',
    ]);
  });
});
