/** Turns a blueprint into a person with a name, an address and a whole mentoring profile. */
import { type Blueprint } from './blueprints';
import { ADJUSTMENTS, CREDENTIALS } from './common-words';
import type { DemoPerson } from './demo-shapes';
import { asciiMailName, drawName, drawPronouns } from './names';
import {
  drawAvailability,
  drawLanguages,
  drawMode,
  drawPlacement,
  drawTimeZone,
  drawWishedStages,
  drawWishedYears,
  HOME_ZONE,
  offeredTopics,
  soughtTopics,
  withPriorities,
} from './profile-choices';
import { type Facts, TextLedger, writeHeadline, writeHopes, writeLimits, writeStyle } from './profile-texts';
import type { Chance } from './random';

export interface Written {
  person: DemoPerson;
  facts: Facts;
}

/** Keeps names, addresses and texts apart while an association is written. */
export class PersonWriter {
  private readonly texts = new TextLedger();
  private readonly names = new Set<string>();
  private readonly addresses = new Set<string>();
  private number = 0;

  /** `taken`: people written by hand, whose names and addresses are not given again. */
  constructor(taken: readonly DemoPerson[] = []) {
    for (const person of taken) {
      this.names.add(person.name);
      this.addresses.add(person.email);
    }
  }

  write(luck: Chance, plan: Blueprint): Written {
    const { name, language } = this.newName(luck);
    const mailName = asciiMailName(name);
    const placement = drawPlacement(luck, plan, mailName, name.split(' ').slice(1).join(' ') || name);
    const timeZone = drawTimeZone(luck);
    const mode = timeZone === HOME_ZONE ? drawMode(luck) : 'remote';
    const background = {
      newcomer: language !== 'en' && language !== 'da',
      academic: placement.sector === 'academic',
      independent: placement.sector === 'self-employed',
      privateFirm: placement.sector === 'private',
    };
    const seeksTopics = plan.side === 'mentor' ? [] : soughtTopics(luck, plan, background);
    const offersTopics = plan.side === 'mentee' ? [] : offeredTopics(luck, plan, background);
    const facts: Facts = {
      side: plan.side,
      area: plan.offers[0] ?? plan.seeks[0] ?? 'gis-and-data',
      stage: plan.stage,
      years: plan.years,
      town: placement.town,
      employer: placement.employer,
      mode,
      seeksTopics,
      offersTopics,
    };
    const wished = drawWishedYears(luck, plan);
    const person: DemoPerson = {
      email: this.newAddress(mailName, placement.domain),
      name,
      membershipNumber: `EIS-${String(10_000 + ++this.number * 7).padStart(5, '0')}`,
      membershipCurrent: true,
      roles: [],
      about: {
        name,
        knownAs: luck.happens(0.12) ? (name.split(' ')[0] ?? '') : '',
        pronouns: drawPronouns(luck, name),
        headline: this.texts.unique(() => writeHeadline(luck, facts)),
        employer: placement.employer,
        region: plan.region,
        town: placement.town,
        timeZone,
        languages: drawLanguages(luck, language, plan.side !== 'mentee'),
      },
      practice: {
        careerStage: plan.stage,
        yearsInPractice: plan.years,
        sector: placement.sector,
        credentials: luck.pick(CREDENTIALS[plan.stage]),
      },
      interests: {
        offers: withPriorities(plan.offers, offersTopics),
        seeks: withPriorities(plan.seeks, seeksTopics),
      },
      meeting: {
        meetingMode: mode,
        maxDistanceKm: mode === 'remote' ? null : luck.pick([null, null, 40, 60, 80]),
        availability: drawAvailability(luck),
      },
      wishes: {
        hopes: this.texts.unique(() => writeHopes(luck, facts)),
        style: this.texts.unique(() => writeStyle(luck, facts)),
        cannotHelpWith: luck.happens(0.8) ? writeLimits(luck, facts) : '',
        wishedYearsMin: wished.min,
        wishedYearsMax: wished.max,
        wishedSector:
          plan.side === 'mentor'
            ? 'any'
            : luck.pickWeighted([
                ['any', 64],
                ['different', 18],
                ['same', 18],
              ] as const),
        wishedStages: drawWishedStages(luck, plan),
        listed: plan.side !== 'mentee' && luck.happens(0.72),
      },
      private: { exclusions: [], declaredInterests: [], adjustments: luck.happens(0.03) ? luck.pick(ADJUSTMENTS) : '' },
    };
    return { person, facts };
  }

  /** Draws a text that no one else has. */
  uniqueText(draw: () => string): string {
    return this.texts.unique(draw);
  }

  private newName(luck: Chance): { name: string; language: string } {
    let drawn = drawName(luck);
    for (let tries = 0; tries < 40 && this.names.has(drawn.name); tries++) drawn = drawName(luck);
    this.names.add(drawn.name);
    return drawn;
  }

  private newAddress(mailName: string, domain: string): string {
    let address = `${mailName}@${domain}`;
    for (let copy = 2; this.addresses.has(address); copy++) address = `${mailName}${copy}@${domain}`;
    this.addresses.add(address);
    return address;
  }
}
