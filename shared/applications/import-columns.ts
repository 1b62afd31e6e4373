/** Which column of an applicants' file fills which field: names of the fields, and a first guess from the headings. */
import { folded } from '../tags/tag-search';
import { IMPORT_FIELDS, type ImportField, type ImportMapping } from './applications-contract';

export const IMPORT_FIELD_LABEL: Record<ImportField, string> = {
  name: 'Name',
  email: 'E-mail address',
  side: 'Side (mentor, mentee or both)',
  places: 'Places',
  oneMoreIfAsked: 'One more if asked',
  membershipNumber: 'Membership number',
  employer: 'Employer',
  region: 'Region',
  town: 'Town',
  timeZone: 'Time zone',
  languages: 'Languages with level',
  careerStage: 'Career stage',
  yearsInPractice: 'Years in practice',
  sector: 'Sector',
  offers: 'Tags offered',
  seeks: 'Tags sought',
  meetingMode: 'In person, remote or both',
  maxDistanceKm: 'Distance in km',
  availability: 'Times of the week',
  headline: 'Headline',
  goals: 'Goals',
  wishedYearsMin: 'Years a mentor should have, from',
  wishedYearsMax: 'Years a mentor should have, to',
};

/** A file without these says too little to make an application. */
export const REQUIRED_FIELDS: readonly ImportField[] = ['name', 'email', 'side'];

// How membership lists and forms commonly head their columns, without accents, blanks and signs.
const SYNONYMS: Record<ImportField, string> = {
  name: 'name fullname membername member applicant person nameofmember applicantname surnameandname displayname',
  email: 'email mail emailaddress mailaddress address emailaddr contactemail emailcontact contact',
  side: 'side role applyingas appliesas participation mentorormentee programmerole type joinsas takespartas takingpartas',
  places: 'places numberofplaces capacity mentees menteestaken numberofmentees placesoffered maxmentees',
  oneMoreIfAsked: 'onemoreifasked onemore extraplace additionalplace couldtakeonemore onemoreplace',
  membershipNumber: 'membershipnumber membershipno memberno membernumber memberid membershipid number no',
  employer: 'employer company organisation organization firm workplace worksfor employedby',
  region: 'region area district regionofwork county homeregion',
  town: 'town city place hometown location basedin nearesttown',
  timeZone: 'timezone zone tz',
  languages: 'languages language languagesspoken spokenlanguages languageskills speaks',
  careerStage: 'careerstage stage grade membershipgrade careerlevel professionalstage',
  yearsInPractice: 'yearsinpractice yearsofpractice yearsofexperience experience years practiceyears yearspractice',
  sector: 'sector sectorofwork industry kindofemployer',
  offers: 'offers canhelpwith tagsoffered offered expertise teaches helpswith subjectsoffered topicsoffered',
  seeks: 'seeks wantshelpwith tagssought sought looksfor lookingfor wantstolearn subjectssought topicssought interests',
  meetingMode: 'meetingmode howtomeet inpersonremoteorboth meets meeting wayofmeeting meetingpreference mode',
  maxDistanceKm: 'maxdistancekm distanceinkm distancekm maxdistance distance traveldistance wouldtravel travelskm',
  availability: 'availability timesoftheweek times slots freetimes available availabletimes weeklytimes whenfree',
  headline: 'headline shortdescription inoneline tagline jobtitle position',
  goals: 'goals goal hopes aims objectives whatihopetoreach motivation goalsforthiscycle reason',
  wishedYearsMin:
    'wishedyearsmin mentoryearsfrom yearsamentorshouldhavefrom minmentoryears mentorminyears mentoryearsmin',
  wishedYearsMax: 'wishedyearsmax mentoryearsto yearsamentorshouldhaveto maxmentoryears mentormaxyears mentoryearsmax',
};

const bare = (text: string): string => folded(text).replace(/[^\p{L}\p{N}]+/gu, '');

/**
 * Guesses which heading belongs to which field: by the field's own name, its label, or a common synonym; after that by a
 * heading that contains a longer synonym. No heading serves two fields.
 */
export function guessMapping(columns: readonly string[]): ImportMapping {
  const mapping: ImportMapping = {};
  const free = new Map(columns.map((column) => [column, bare(column)]));
  const take = (field: ImportField, fits: (heading: string) => boolean): void => {
    if (mapping[field] !== undefined) return;
    for (const [column, heading] of free) {
      if (!fits(heading)) continue;
      mapping[field] = column;
      free.delete(column);
      return;
    }
  };
  const namesOf = (field: ImportField): string[] => [
    bare(field),
    bare(IMPORT_FIELD_LABEL[field]),
    ...SYNONYMS[field].split(' '),
  ];
  for (const field of IMPORT_FIELDS) for (const name of namesOf(field)) take(field, (heading) => heading === name);
  for (const field of IMPORT_FIELDS)
    for (const name of namesOf(field)) if (name.length >= 8) take(field, (heading) => heading.includes(name));
  return mapping;
}

/** Keeps of an earlier mapping what this file has columns for; null where nothing is left. */
export function mappingFor(columns: readonly string[], earlier: ImportMapping): ImportMapping | null {
  const kept = Object.entries(earlier).filter(([, column]) => columns.includes(column));
  return kept.length > 0 ? (Object.fromEntries(kept) as ImportMapping) : null;
}
