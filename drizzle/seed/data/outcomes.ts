/** What came of the pairings of the closed cycle: answers, meetings, endings. */
import { dayAfter, daysBetween } from './calendar';
import type { DemoOutcome } from './demo-shapes';
import type { Chance } from './random';

const MENTEE_DECLINES = [
  'I have changed jobs and we would now work in the same building.',
  'I am going on leave in May and would not do it justice.',
  'We know each other well from a project; somebody new would help me more.',
];
const MENTOR_DECLINES = [
  'I have taken on a site abroad and will not be there half of the time.',
  'My own assessment panel may see this candidate next year.',
  'After a family illness I must leave this cycle out.',
];
const EARLY_ENDS = [
  'The mentor moved to another country.',
  'The mentee changed to another field of work.',
  'We agreed after two meetings that our expectations differed; no hard feelings.',
  'Parental leave began earlier than planned.',
  'Too little time in the field season, on both sides.',
  '',
  'The aim was reached early.',
  'Illness.',
];

export interface OutcomeDates {
  publishedOn: string;
  answersDueOn: string;
  startsOn: string;
  endsOn: string;
}

const answered = (luck: Chance, within: number): number =>
  Math.min(
    within,
    luck.pickWeighted([
      [luck.between(0, 2), 45],
      [luck.between(3, 7), 33],
      [luck.between(8, within), 22],
    ] as const),
  );

function heldMeetings(luck: Chance, dates: OutcomeDates, until: string): DemoOutcome['meetings'] {
  const meetings: DemoOutcome['meetings'] = [];
  for (let day = luck.between(3, 16); day < daysBetween(dates.startsOn, until); day += luck.between(22, 40)) {
    meetings.push({ on: dayAfter(dates.startsOn, day), minutes: luck.pick([45, 60, 60, 60, 75, 90]) });
  }
  return meetings;
}

function survey(luck: Chance, ending: 'completed' | 'ended-early'): number | null {
  if (!luck.happens(ending === 'completed' ? 0.78 : 0.45)) return null;
  return ending === 'completed'
    ? luck.pickWeighted([
        [5, 42],
        [4, 38],
        [3, 15],
        [2, 5],
      ] as const)
    : luck.pickWeighted([
        [4, 20],
        [3, 40],
        [2, 28],
        [1, 12],
      ] as const);
}

type Course = DemoOutcome['ending'] | 'mentor-declined';

function ofCourse(luck: Chance, menteeEmail: string, course: Course, dates: OutcomeDates): DemoOutcome {
  const window = Math.max(8, daysBetween(dates.publishedOn, dates.answersDueOn));
  const outcome: DemoOutcome = {
    menteeEmail,
    menteeAnswer: 'accepted',
    mentorAnswer: 'accepted',
    menteeReason: '',
    mentorReason: '',
    menteeAnsweredAfterDays: answered(luck, window),
    mentorAnsweredAfterDays: answered(luck, window),
    ending: course === 'mentor-declined' ? 'declined' : course,
    endReason: '',
    endedOn: null,
    meetings: [],
    hours: 0,
    menteeSatisfaction: null,
    mentorSatisfaction: null,
  };
  if (course === 'declined') {
    return { ...outcome, menteeAnswer: 'declined', menteeReason: luck.pick(MENTEE_DECLINES) };
  }
  if (course === 'mentor-declined') {
    return { ...outcome, mentorAnswer: 'declined', mentorReason: luck.pick(MENTOR_DECLINES) };
  }
  if (course === 'expired') return { ...outcome, menteeAnswer: 'unanswered', menteeAnsweredAfterDays: null };
  const length = daysBetween(dates.startsOn, dates.endsOn);
  const endedOn = course === 'completed' ? dates.endsOn : dayAfter(dates.startsOn, luck.between(40, length - 40));
  const meetings = heldMeetings(luck, dates, endedOn);
  return {
    ...outcome,
    endedOn,
    endReason: course === 'ended-early' ? luck.pick(EARLY_ENDS) : '',
    meetings,
    hours: meetings.reduce((minutes, meeting) => minutes + meeting.minutes, 0) / 60,
    menteeSatisfaction: survey(luck, course),
    mentorSatisfaction: survey(luck, course),
  };
}

/** One outcome for every mentee; it applies to whichever mentor the published plan gave them. */
export function demoOutcomes(luck: Chance, mentees: readonly string[], dates: OutcomeDates): DemoOutcome[] {
  return mentees.map((email) => {
    const course = luck.pickWeighted<Course>([
      ['completed', 78],
      ['ended-early', 12],
      ['declined', 3],
      ['mentor-declined', 3],
      ['expired', 4],
    ]);
    return ofCourse(luck, email, course, dates);
  });
}
