import { TestBed } from '@angular/core/testing';
import { AnswerThreads } from './answer-threads';

describe('AnswerThreads', () => {
  it('says both answers', async () => {
    const fixture = TestBed.createComponent(AnswerThreads);
    fixture.componentRef.setInput('mentor', 'accepted');
    fixture.componentRef.setInput('mentee', 'unanswered');
    await fixture.whenStable();
    const svg = (fixture.nativeElement as HTMLElement).querySelector('svg');
    expect(svg?.getAttribute('aria-label')).toBe('Mentor: accepted. Mentee: not answered yet.');
  });
});
