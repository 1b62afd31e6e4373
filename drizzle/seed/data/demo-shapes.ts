/** The shapes of the demo association's data. People are named by e-mail address and tags by slug; the seed finds the ids. */
import type { Role } from '../../../shared/accounts/accounts-contract';
import type { ApplicationSide } from '../../../shared/applications/applications-contract';
import type { CycleDraft, CyclePhase } from '../../../shared/cycles/cycles-contract';
import type {
  AboutSection,
  InterestKind,
  MeetingSection,
  PracticeSection,
  Region,
  TagPriority,
  WishesSection,
} from '../../../shared/profiles/profiles-contract';
import type { TagKind } from '../../../shared/tags/tags-contract';

export interface DemoTown {
  name: string;
  region: Region;
  latitude: number;
  longitude: number;
}

export interface DemoTag {
  slug: string;
  kind: TagKind;
  label: string;
  synonyms: string[];
  /** Slug of the tag it belongs under. */
  parent: string | null;
}

export interface DemoTagChoice {
  slug: string;
  priority: TagPriority;
}

export interface DemoPerson {
  /** Lower case, ASCII, ends in `.example`; unique. */
  email: string;
  name: string;
  /** Unique; null for somebody who is not on the membership list. */
  membershipNumber: string | null;
  membershipCurrent: boolean;
  roles: Role[];
  about: AboutSection;
  practice: PracticeSection;
  interests: { offers: DemoTagChoice[]; seeks: DemoTagChoice[] };
  meeting: MeetingSection;
  wishes: WishesSection;
  private: {
    /** E-mail addresses. */
    exclusions: string[];
    declaredInterests: { email: string; kind: InterestKind }[];
    adjustments: string;
  };
}

export interface DemoApplication {
  personEmail: string;
  side: ApplicationSide;
  /** 1–6 for a mentor, 0 for a mentee. */
  places: number;
  oneMoreIfAsked: boolean;
  goals: string;
  /** Up to three e-mail addresses, in order of preference. */
  preferredMentors: string[];
  /** A day, `YYYY-MM-DD`, in the association's time zone. */
  submittedOn: string;
  /** Where the application stands: late ones wait, incomplete ones of an open cycle stay submitted. */
  becomes: 'submitted' | 'admitted' | 'waiting-list' | 'withdrawn';
}

/** What came of a mentee's pairing in a closed cycle, whoever the mentor of the published plan is. */
export interface DemoOutcome {
  menteeEmail: string;
  menteeAnswer: 'accepted' | 'declined' | 'unanswered';
  mentorAnswer: 'accepted' | 'declined' | 'unanswered';
  /** Filled where that side declined. */
  menteeReason: string;
  mentorReason: string;
  /** Days from publishing to the answer; null where there was none. */
  menteeAnsweredAfterDays: number | null;
  mentorAnsweredAfterDays: number | null;
  ending: 'completed' | 'ended-early' | 'declined' | 'expired';
  /** For pairs that ended early; may be empty, since either side may end without a reason. */
  endReason: string;
  endedOn: string | null;
  meetings: { on: string; minutes: number }[];
  /** Sum of the meetings, in hours. */
  hours: number;
  /** 1–5 from the closing survey; null where it was not answered. */
  menteeSatisfaction: number | null;
  mentorSatisfaction: number | null;
}

export interface DemoCycle {
  key: 'summer-2026' | 'winter-2026' | 'summer-2027';
  phase: CyclePhase;
  draft: CycleDraft;
  /** The day on which the first round was published; null where none was. */
  publishedOn: string | null;
  applications: DemoApplication[];
  outcomes: DemoOutcome[];
}

export interface DemoAssociation {
  towns: readonly DemoTown[];
  tags: readonly DemoTag[];
  people: DemoPerson[];
  cycles: DemoCycle[];
}
