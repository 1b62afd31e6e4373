import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { MemberRibbon } from './member-ribbon';

describe('MemberRibbon', () => {
  it('marks the step of now and shows every date', async () => {
    TestBed.configureTestingModule({ providers: [provideRouter([])] });
    const fixture = TestBed.createComponent(MemberRibbon);
    fixture.componentRef.setInput('steps', [
      { key: 'applied', label: 'Applied', date: '2 October', state: 'done' },
      { key: 'proposal', label: 'Proposal', date: 'today', state: 'now', link: '/proposal' },
    ]);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.querySelector('[aria-current="step"]')?.textContent).toContain('Proposal');
    expect([...host.querySelectorAll('.date')].map((date) => date.textContent)).toEqual(['2 October', 'today']);
  });
});
