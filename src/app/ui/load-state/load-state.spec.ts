import { TestBed } from '@angular/core/testing';
import { LoadProblem } from './load-problem';
import { Loading } from './loading';

describe('Loading', () => {
  it('is a busy status with a word', async () => {
    const fixture = TestBed.createComponent(Loading);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.getAttribute('aria-busy')).toBe('true');
    expect(host.textContent).toContain('Loading…');
  });
});

describe('LoadProblem', () => {
  it('offers to try again', async () => {
    const fixture = TestBed.createComponent(LoadProblem);
    fixture.componentRef.setInput('message', 'We could not load this profile.');
    let retried = 0;
    fixture.componentInstance.retried.subscribe(() => (retried += 1));
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.querySelector('[role="alert"]')?.textContent).toContain('We could not load this profile.');
    host.querySelector('button')?.click();
    expect(retried).toBe(1);
  });
});
