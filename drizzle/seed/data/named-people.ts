/** The people of the demo association with accounts to sign in to. Written by hand. */
import type { Slot } from '../../../shared/profiles/profiles-contract';
import { asMentee, asMentor, type Blueprint } from './blueprints';
import type { DemoPerson } from './demo-shapes';
import { HOME_ZONE } from './profile-choices';
import type { Facts } from './profile-texts';

export interface CastMember {
  person: DemoPerson;
  plan: Blueprint;
  facts: Facts;
  /** Goals written by hand; empty = put together. */
  goals: string;
}

const evenings: Slot[] = ['mon-evening', 'tue-evening', 'wed-evening', 'thu-evening'];

const staff = (
  fields: Pick<DemoPerson, 'email' | 'name' | 'membershipNumber' | 'roles'>,
  headline: string,
  words: Pick<DemoPerson['wishes'], 'hopes' | 'style' | 'cannotHelpWith'>,
): DemoPerson => ({
  ...fields,
  membershipCurrent: true,
  about: {
    name: fields.name,
    knownAs: '',
    pronouns: '',
    headline,
    employer: 'Ellmark Institute of Surveyors',
    region: 'midvale',
    town: 'Greyford',
    timeZone: HOME_ZONE,
    languages: [
      { code: 'en', level: 'first' },
      { code: 'da', level: 'B2' },
    ],
  },
  practice: { careerStage: 'senior', yearsInPractice: 19, sector: 'private', credentials: 'Chartered member' },
  interests: { offers: [], seeks: [] },
  meeting: { meetingMode: 'both', maxDistanceKm: null, availability: ['tue-morning', 'wed-midday', 'thu-morning'] },
  wishes: {
    ...words,
    wishedYearsMin: null,
    wishedYearsMax: null,
    wishedSector: 'any',
    wishedStages: [],
    listed: false,
  },
  private: { exclusions: [], declaredInterests: [], adjustments: '' },
});

export const STAFF: readonly DemoPerson[] = [
  staff(
    {
      email: 'oona.rask@ellmark.example',
      name: 'Oona Rask',
      membershipNumber: 'EIS-04011',
      roles: ['coordinator'],
    },
    'Coordinates the Institute’s mentoring programme; cadastral surveyor before that',
    {
      hopes: 'I look after the programme and do not take part in this year’s cycles myself.',
      style: 'Write or call; I answer within two working days.',
      cannotHelpWith: 'Questions about membership fees go to the Institute’s office.',
    },
  ),
  staff(
    {
      email: 'halvard.ness@ellmark.example',
      name: 'Halvard Ness',
      membershipNumber: 'EIS-03127',
      roles: ['organiser'],
    },
    'Chairs the education committee; engineering surveyor in Port Ansel',
    {
      hopes: 'I follow how the cycles go as a whole and report to the council.',
      style: 'I like numbers with their uncertainty beside them.',
      cannotHelpWith: 'I see no one’s private answers and cannot look them up.',
    },
  ),
  staff(
    {
      email: 'signe.dahl@ellmark.example',
      name: 'Signe Dahl',
      membershipNumber: 'EIS-05260',
      roles: ['administrator'],
    },
    'Runs the Institute’s office and its systems',
    {
      hopes: 'I keep accounts, settings and the membership list in order.',
      style: 'A short message with a clear subject is the quickest way to reach me.',
      cannotHelpWith: 'Pairings are decided by the coordinators, not by the office.',
    },
  ),
];

const ruth: CastMember = {
  goals:
    'I would like to accompany somebody at the start of a first lead, and to hear how the work looks from there. One visit to a night shift on the railway is part of the offer.',
  plan: {
    side: 'mentor',
    seeks: [],
    offers: ['laser-scanning', 'engineering-setting-out', 'monitoring-and-deformation'],
    region: 'midvale',
    stage: 'senior',
    years: 14,
    parts: { summer2026: asMentor(2, false), winter2026: asMentor(2, true) },
  },
  facts: {
    side: 'mentor',
    area: 'laser-scanning',
    stage: 'senior',
    years: 14,
    town: 'Sallow Bridge',
    employer: 'Ellmark Rail',
    mode: 'both',
    seeksTopics: [],
    offersTopics: ['first-site-lead', 'chartership', 'rail-and-track', 'leading-a-team', 'building-information'],
  },
  person: {
    email: 'ruth.calloway@ellmarkrail.example',
    name: 'Ruth Calloway',
    membershipNumber: 'EIS-06318',
    membershipCurrent: true,
    roles: [],
    about: {
      name: 'Ruth Calloway',
      knownAs: 'Ruth',
      pronouns: 'she/her',
      headline: 'Leads the scanning and monitoring team of Ellmark Rail; happiest on a station roof',
      employer: 'Ellmark Rail',
      region: 'midvale',
      town: 'Sallow Bridge',
      timeZone: HOME_ZONE,
      languages: [
        { code: 'en', level: 'first' },
        { code: 'da', level: 'B1' },
      ],
    },
    practice: {
      careerStage: 'senior',
      yearsInPractice: 14,
      sector: 'public',
      credentials: 'Fellow of the Institute, track safety supervisor',
    },
    interests: {
      offers: [
        { slug: 'laser-scanning', priority: 1 },
        { slug: 'engineering-setting-out', priority: 2 },
        { slug: 'monitoring-and-deformation', priority: 3 },
        { slug: 'first-site-lead', priority: 1 },
        { slug: 'chartership', priority: 2 },
        { slug: 'building-information', priority: 2 },
        { slug: 'rail-and-track', priority: 3 },
        { slug: 'leading-a-team', priority: 3 },
      ],
      seeks: [],
    },
    meeting: {
      meetingMode: 'both',
      maxDistanceKm: 60,
      availability: [...evenings, 'fri-midday', 'fri-afternoon'],
    },
    wishes: {
      hopes:
        'I was made a site lead at twenty-six, with nobody to ask, and I would like to be the person I was missing. Ask me about scanning under traffic, about getting a crew home safely at four in the morning, and about saying “not yet” to a project manager. I do not have a method; I have a good memory for my own mistakes.',
      style:
        'An hour on a fixed evening, with three things you want to talk about. Between meetings a short message is fine. Once in the cycle I would like you to come out on a night shift.',
      cannotHelpWith:
        'I have always been employed and know nothing about running a practice. Boundaries I leave to others.',
      wishedYearsMin: null,
      wishedYearsMax: null,
      wishedSector: 'any',
      wishedStages: ['graduate', 'candidate', 'returning'],
      listed: true,
    },
    private: { exclusions: [], declaredInterests: [], adjustments: '' },
  },
};

const amara: CastMember = {
  goals:
    'By the summer I want to run a scanning job from the first visit to the handover, with my own control and my own checks. I am also preparing for chartership and would like somebody to read my case study before the examiners do.',
  plan: {
    side: 'mentee',
    seeks: ['laser-scanning', 'engineering-setting-out'],
    offers: [],
    region: 'midvale',
    stage: 'graduate',
    years: 3,
    parts: { winter2026: asMentee() },
  },
  facts: {
    side: 'mentee',
    area: 'laser-scanning',
    stage: 'graduate',
    years: 3,
    town: 'Greyford',
    employer: 'Northlight Data',
    mode: 'both',
    seeksTopics: ['first-site-lead', 'chartership', 'building-information'],
    offersTopics: [],
  },
  person: {
    email: 'amara.nwosu@northlight-data.example',
    name: 'Amara Nwosu',
    membershipNumber: 'EIS-11840',
    membershipCurrent: true,
    roles: [],
    about: {
      name: 'Amara Nwosu',
      knownAs: '',
      pronouns: 'she/her',
      headline: 'Graduate surveyor: point clouds of stations, mills and one very patient lighthouse',
      employer: 'Northlight Data',
      region: 'midvale',
      town: 'Greyford',
      timeZone: HOME_ZONE,
      languages: [
        { code: 'en', level: 'first' },
        { code: 'ig', level: 'C1' },
        { code: 'da', level: 'B1' },
      ],
    },
    practice: {
      careerStage: 'graduate',
      yearsInPractice: 3,
      sector: 'private',
      credentials: 'MSc Geoinformation, University of Greyford',
    },
    interests: {
      offers: [],
      seeks: [
        { slug: 'laser-scanning', priority: 1 },
        { slug: 'engineering-setting-out', priority: 2 },
        { slug: 'first-site-lead', priority: 1 },
        { slug: 'chartership', priority: 2 },
        { slug: 'building-information', priority: 3 },
      ],
    },
    meeting: {
      meetingMode: 'both',
      maxDistanceKm: 60,
      availability: ['mon-evening', 'wed-evening', 'thu-evening', 'fri-midday', 'fri-afternoon'],
    },
    wishes: {
      hopes:
        'I came to surveying through computing and can make a point cloud look like a photograph. What I cannot do yet is stand on a site and decide: where the control goes, when to stop, what to tell the client. In spring I am to lead a small team for the first time, and I would like to be nervous in good company.',
      style:
        'I prepare, I ask a great many questions, and I like to draw while I listen. Please tell me plainly when something is not good.',
      cannotHelpWith: 'I cannot show data from the hospital project, which is confidential.',
      wishedYearsMin: 8,
      wishedYearsMax: 25,
      wishedSector: 'different',
      wishedStages: [],
      listed: false,
    },
    private: { exclusions: [], declaredInterests: [], adjustments: '' },
  },
};

export const RUTH_CALLOWAY = ruth;
export const AMARA_NWOSU = amara;
