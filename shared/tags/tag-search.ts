/** Finding tags by what people type, ignoring case and accents. */
import type { Tag } from './tags-contract';

/** Lower case without accents, for comparing. */
export const folded = (text: string): string => text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();

/** A tag's name in addresses and files: letters and digits with hyphens; empty where nothing is left. */
export const slugOf = (label: string): string =>
  folded(label)
    .replace(/&/g, ' and ')
    .replace(/[^\p{L}\p{N}]+/gu, '-')
    .replace(/^-+|-+$/g, '');

/** Tags whose label or synonyms contain the text; those that begin with it come first. Retired ones are left out. */
export function searchTags(tags: readonly Tag[], text: string): Tag[] {
  const wanted = folded(text.trim());
  const rank = (tag: Tag): number => {
    const names = [tag.label, ...tag.synonyms].map(folded);
    if (names.some((name) => name.startsWith(wanted))) return 0;
    return names.some((name) => name.includes(wanted)) ? 1 : 2;
  };
  return tags
    .filter((tag) => tag.state !== 'retired')
    .map((tag) => ({ tag, rank: rank(tag) }))
    .filter((entry) => entry.rank < 2)
    .sort((a, b) => a.rank - b.rank || a.tag.label.localeCompare(b.tag.label))
    .map((entry) => entry.tag);
}
