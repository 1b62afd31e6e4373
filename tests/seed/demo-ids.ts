/** Stable ids for the demo's people and tags, as the database would give them. */
import { hashText } from '../../drizzle/seed/data/random';

function idOf(kind: string, text: string): string {
  const part = (salt: string): string => hashText(`${kind}:${salt}:${text}`).toString(16).padStart(8, '0');
  const digits = part('a') + part('b') + part('c') + part('d');
  return `${digits.slice(0, 8)}-${digits.slice(8, 12)}-4${digits.slice(13, 16)}-8${digits.slice(17, 20)}-${digits.slice(20, 32)}`;
}

export const personId = (email: string): string => idOf('person', email);
export const tagId = (slug: string): string => idOf('tag', slug);
