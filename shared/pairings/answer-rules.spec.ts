import { describe, expect, it } from 'vitest';
import { mayAnswer, mayTakeBack, reminderMoments, stateAfter, wasAsked, type Answered } from './answer-rules';

const due = new Date('2026-12-15T22:59:59Z');
const before = new Date('2026-12-10T12:00:00Z');
const after = new Date('2026-12-16T00:00:00Z');
const pairing = (change: Partial<Answered> = {}): Answered => ({
  state: 'pending',
  menteeAnswer: 'unanswered',
  mentorAnswer: 'unanswered',
  answersDueAt: due,
  ...change,
});

describe('answers', () => {
  it('are taken until the deadline, once', () => {
    expect(mayAnswer(pairing(), 'mentee', 'both', before)).toBe(true);
    expect(mayAnswer(pairing(), 'mentee', 'both', after)).toBe(false);
    expect(mayAnswer(pairing({ menteeAnswer: 'accepted' }), 'mentee', 'both', before)).toBe(false);
    expect(mayAnswer(pairing({ state: 'withdrawn' }), 'mentee', 'both', before)).toBe(false);
  });

  it('are asked of the mentee only after the mentor accepted, where mentors come first', () => {
    expect(wasAsked(pairing(), 'mentee', 'mentor')).toBe(false);
    expect(mayAnswer(pairing(), 'mentee', 'mentor', before)).toBe(false);
    expect(mayAnswer(pairing(), 'mentor', 'mentor', before)).toBe(true);
    expect(mayAnswer(pairing({ mentorAnswer: 'accepted' }), 'mentee', 'mentor', before)).toBe(true);
  });

  it('can be taken back while the other side has not answered; a decline never', () => {
    expect(mayTakeBack(pairing({ menteeAnswer: 'accepted' }), 'mentee')).toBe(true);
    expect(
      mayTakeBack(pairing({ menteeAnswer: 'accepted', mentorAnswer: 'accepted', state: 'under-way' }), 'mentee'),
    ).toBe(false);
    expect(mayTakeBack(pairing({ menteeAnswer: 'declined', state: 'declined' }), 'mentee')).toBe(false);
  });

  it.each([
    ['unanswered', 'unanswered', 'pending'],
    ['accepted', 'unanswered', 'pending'],
    ['accepted', 'accepted', 'under-way'],
    ['declined', 'accepted', 'declined'],
    ['unanswered', 'declined', 'declined'],
  ] as const)('%s and %s make a pairing %s', (mentee, mentor, state) => {
    expect(stateAfter(mentee, mentor)).toBe(state);
  });

  it('are reminded of half-way and two days before, in that order', () => {
    const names = (from: string) => reminderMoments(new Date(from), due).map((moment) => moment.name);
    expect(names('2026-12-01T12:00:00Z')).toEqual(['half-way', 'two-days']);
    expect(names('2026-12-13T12:00:00Z')).toEqual(['half-way']);
  });
});
