/** Tags by any of their names, and the nearest one for a name that is not known. */
import { folded, searchTags, slugOf } from '../tags/tag-search';
import type { Tag } from '../tags/tags-contract';

export interface TagFinder {
  /** By label, slug or synonym, ignoring case and accents; null where no tag has this name. */
  find(text: string): Tag | null;
  /** What may have been meant; null where nothing is near. */
  closest(text: string): Tag | null;
}

/** Retired tags are not found. */
export function tagFinder(tags: readonly Tag[]): TagFinder {
  const live = tags.filter((tag) => tag.state !== 'retired');
  const known = new Map<string, Tag>();
  // Labels go last, so that one tag's synonym never hides another tag's own name.
  for (const tag of live) for (const synonym of tag.synonyms) known.set(slugOf(synonym), tag);
  for (const tag of live) known.set(tag.slug, tag).set(slugOf(tag.label), tag);
  return {
    find: (text) => known.get(slugOf(text)) ?? null,
    closest: (text) => searchTags(live, text)[0] ?? nearest(known, folded(text.trim()).replace(/\s+/g, '-')),
  };
}

function nearest(known: ReadonlyMap<string, Tag>, slug: string): Tag | null {
  let best: Tag | null = null;
  // A third of the letters may differ; beyond that a guess misleads.
  let least = Math.floor(slug.length / 3) + 1;
  for (const [name, tag] of known) {
    const distance = editDistance(name, slug, least);
    if (distance < least) [best, least] = [tag, distance];
  }
  return best;
}

/** Levenshtein's distance (1966): inserted, removed and replaced letters; stops counting at `limit`. */
export function editDistance(a: string, b: string, limit = Infinity): number {
  if (Math.abs(a.length - b.length) >= limit) return limit;
  let row = Array.from({ length: b.length + 1 }, (_, index) => index);
  for (let i = 1; i <= a.length; i++) {
    const next = [i];
    for (let j = 1; j <= b.length; j++)
      next.push(
        Math.min((row[j] ?? 0) + 1, (next[j - 1] ?? 0) + 1, (row[j - 1] ?? 0) + (a[i - 1] === b[j - 1] ? 0 : 1)),
      );
    row = next;
  }
  return row[b.length] ?? 0;
}
