/** Pure decisions about profiles that both sides make. */
import type { MentoringProfile, ProfileSection } from './profiles-contract';

export interface MissingItem {
  section: ProfileSection;
  text: string;
  /** Why it matters for matching, in one sentence. */
  why: string;
  /** Matching cannot pair the person without it: a rule of the default set counts missing data as not met. */
  needed: boolean;
}

interface Check extends MissingItem {
  done(profile: MentoringProfile): boolean;
}

const CHECKS: readonly Check[] = [
  {
    section: 'about',
    text: 'Languages you can meet in',
    why: 'Two people need a common language; without one you cannot be paired.',
    needed: true,
    done: (p) => p.about.languages.length > 0,
  },
  {
    section: 'about',
    text: 'Region and town',
    why: 'They tell how far apart two people live.',
    needed: false,
    done: (p) => p.about.region !== null && p.about.town !== null,
  },
  {
    section: 'about',
    text: 'Employer',
    why: 'People of the same employer are not paired; without it a coordinator has to look.',
    needed: false,
    done: (p) => p.about.employer !== '',
  },
  {
    section: 'about',
    text: 'Headline',
    why: 'It is the first thing that the other person reads about you.',
    needed: false,
    done: (p) => p.about.headline !== '',
  },
  {
    section: 'practice',
    text: 'Years in practice',
    why: 'A mentor should have some years more than the mentee; without them you cannot be paired.',
    needed: true,
    done: (p) => p.practice.yearsInPractice !== null,
  },
  {
    section: 'practice',
    text: 'Career stage',
    why: 'Mentors may wish for certain stages.',
    needed: false,
    done: (p) => p.practice.careerStage !== null,
  },
  {
    section: 'practice',
    text: 'Sector',
    why: 'Some people wish for the same sector, others for a different one.',
    needed: false,
    done: (p) => p.practice.sector !== null,
  },
  {
    section: 'interests',
    text: 'Interest tags',
    why: 'Pairings follow what one seeks and the other offers; without tags you cannot be paired.',
    needed: true,
    done: (p) => p.interests.offers.length + p.interests.seeks.length > 0,
  },
  {
    section: 'meeting',
    text: 'In person, remote or both',
    why: 'Two people need a way to meet that both accept; without it you cannot be paired.',
    needed: true,
    done: (p) => p.meeting.meetingMode !== null,
  },
  {
    section: 'meeting',
    text: 'Times of the week',
    why: 'Two people need at least one time that suits both; without any you cannot be paired.',
    needed: true,
    done: (p) => p.meeting.availability.length > 0,
  },
  {
    section: 'wishes',
    text: 'What you hope for, or how you work as a mentor',
    why: 'It helps the other person to say yes.',
    needed: false,
    done: (p) => p.wishes.hopes !== '' || p.wishes.style !== '',
  },
];

export interface Completeness {
  /** 0..100, whole. */
  percent: number;
  missing: MissingItem[];
  /** True where nothing that matching needs is missing. */
  readyForMatching: boolean;
}

/** How complete a profile is, what is missing, and why it matters. */
export function completenessOf(profile: MentoringProfile): Completeness {
  const missing = CHECKS.filter((check) => !check.done(profile));
  return {
    percent: Math.round((100 * (CHECKS.length - missing.length)) / CHECKS.length),
    missing: missing.map(({ section, text, why, needed }) => ({ section, text, why, needed })),
    readyForMatching: missing.every((check) => !check.needed),
  };
}
