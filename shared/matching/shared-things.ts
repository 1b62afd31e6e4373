/** What two people have in common, in words ready to be read by both. */
import type { SharedThings } from '../pairings/pairings-contract';
import type { Judge } from './build-problem';
import { bothInPerson, bothRemote, commonSlots, kilometres } from './facts';
import { slotInWords } from './explain-pair';
import { slotsOfBits } from './weekly-slots';

const LANGUAGE_NAMES = new Intl.DisplayNames('en', { type: 'language' });

/** Mentee i and mentor j by their positions in the input; times are in the mentee's zone. */
export function sharedThings(judge: Judge, i: number, j: number): SharedThings {
  const { columns, input } = judge;
  const covered = [...columns.areas[i]!.tags, ...columns.topics[i]!.tags].filter(
    (tag) => columns.cover[j * columns.tagCount + tag]! > 0,
  );
  const common = columns.languages.filter((_, language) => {
    const at = (side: Uint8Array, row: number): number => side[row * columns.languageCount + language]!;
    return at(columns.mentees.levels, i) > 0 && at(columns.mentors.levels, j) > 0;
  });
  return {
    tags: covered.map((tag) => input.tags[tag]!.label),
    times: slotsOfBits(commonSlots(columns, i, j)).map(slotInWords),
    languages: common.map((code) => LANGUAGE_NAMES.of(code) ?? code),
    meeting: meetingInWords(judge, i, j),
  };
}

function meetingInWords({ columns }: Judge, i: number, j: number): string {
  const away = kilometres(columns, i, j);
  const apart = away < 0 ? '' : away < 1 ? ' in the same town' : `, about ${Math.round(away)} km apart`;
  if (bothInPerson(columns, i, j))
    return bothRemote(columns, i, j) ? `in person${apart}, or remotely` : `in person${apart}`;
  return bothRemote(columns, i, j) ? 'remotely' : 'to be agreed';
}
