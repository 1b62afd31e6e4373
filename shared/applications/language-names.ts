/** Languages by name or ISO 639-1 code. */
import { folded } from '../tags/tag-search';

const LETTERS = [...'abcdefghijklmnopqrstuvwxyz'];
let codes: Map<string, string> | null = null;

// The names come with the platform (CLDR); codes that only stand for an older spelling of another one are left out.
function knownCodes(): Map<string, string> {
  const names = new Intl.DisplayNames('en', { type: 'language', fallback: 'none' });
  const found = new Map<string, string>();
  for (const code of LETTERS.flatMap((first) => LETTERS.map((second) => first + second))) {
    const name = names.of(code);
    if (name !== undefined && Intl.getCanonicalLocales(code)[0] === code) found.set(folded(name), code).set(code, code);
  }
  return found;
}

/** The ISO 639-1 code of a language given by its English name or its code, in any case; null where it is not known. */
export function languageCode(text: string): string | null {
  codes ??= knownCodes();
  const code = codes.get(folded(text.trim())) ?? null;
  // “Norwegian” alone means the more common of its two written forms, which is what profiles offer.
  return code === 'no' ? 'nb' : code;
}
