import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';

/**
 * Contrast of the colour tokens in both themes (WCAG 2.2: 1.4.3 text 4.5:1, 1.4.11 controls and graphics 3:1),
 * read from the style sheet itself, so that a changed colour is a tested colour.
 */
const TOKENS = join('src', 'theme', '_tokens.scss');
type Theme = 'light' | 'dark';

/** Reads `'name': (#rrggbb, #rrggbb)` pairs, however they are wrapped. */
function readTokens(scss: string): ReadonlyMap<string, Record<Theme, string>> {
  const pair = /'([a-z0-9-]+)':\s*\(\s*(#[0-9a-f]{6}),\s*(#[0-9a-f]{6}),?\s*\)/g;
  return new Map(
    [...scss.matchAll(pair)].map(([, name, light, dark]) => [name ?? '', { light: light ?? '', dark: dark ?? '' }]),
  );
}

/** Relative luminance as WCAG 2.2 defines it. */
function luminance(hex: string): number {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5].map((at) => {
    const channel = parseInt(hex.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

function contrast(a: string, b: string): number {
  const [lighter = 0, darker = 0] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return (lighter + 0.05) / (darker + 0.05);
}

const tokens = readTokens(readFileSync(TOKENS, 'utf8'));
const grounds = ['linen', 'paper', 'raised', 'indigo-soft'];

/** What is written in which colour on which ground. */
const TEXT: readonly (readonly [string, readonly string[]])[] = [
  ['ink', [...grounds, 'cell', 'madder-soft', 'woad-soft', 'weld-soft', 'lichen-soft']],
  ['muted', [...grounds, 'cell', 'madder-soft']],
  ['indigo', [...grounds, 'cell']],
  ['madder', [...grounds, 'madder-soft']],
  ['woad', [...grounds, 'woad-soft']],
  ['weld', [...grounds, 'weld-soft']],
  ['lichen', [...grounds, 'lichen-soft']],
  ['on-indigo', ['indigo']],
  ['on-madder', ['madder']],
  ['paper', ['ink', 'woad']],
  ['indigo-inverse', ['ink']],
];

/** Edges of controls, marks, bars and threads. */
const GRAPHICS: readonly (readonly [string, readonly string[]])[] = [
  ['edge', grounds],
  ['indigo', [...grounds, 'cell']],
  ['indigo-mid', [...grounds, 'cell']],
  ['on-indigo', ['indigo']],
  ['madder', [...grounds, 'cell', 'madder-soft']],
  ['woad', [...grounds, 'cell', 'woad-soft']],
  ['weld', grounds],
  ['lichen', [...grounds, 'cell']],
  ...[1, 2, 3, 4, 5].map((strength) => [`thread-${strength}`, ['paper', 'linen']] as const),
];

function check(theme: Theme, pairs: typeof TEXT, least: number): string[] {
  return pairs.flatMap(([front, backs]) =>
    backs.flatMap((back) => {
      const a = tokens.get(front)?.[theme];
      const b = tokens.get(back)?.[theme];
      if (!a || !b) return [`${front} or ${back} is no token`];
      const ratio = contrast(a, b);
      return ratio < least ? [`${front} on ${back}: ${ratio.toFixed(2)}`] : [];
    }),
  );
}

describe('colour tokens', () => {
  it('knows black on white as 21:1 and one colour on itself as 1:1', () => {
    expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 6);
    expect(contrast('#2b3a72', '#2b3a72')).toBe(1);
  });

  it.each<Theme>(['light', 'dark'])('keeps text readable in the %s theme', (theme) => {
    expect(check(theme, TEXT, 4.5)).toEqual([]);
  });

  it.each<Theme>(['light', 'dark'])('keeps control edges and graphics visible in the %s theme', (theme) => {
    expect(check(theme, GRAPHICS, 3)).toEqual([]);
  });

  it('tells a pair that is too faint', () => {
    expect(check('light', [['line', ['paper']]], 3)).toEqual([expect.stringMatching(/^line on paper: 1\./)]);
  });
});

describe('style sheets', () => {
  const sheets = readdirSync('src', { recursive: true, encoding: 'utf8' }).filter((file) => file.endsWith('.scss'));

  it('write colours only as tokens', () => {
    const hex = /#[0-9a-f]{3,8}\b(?![^\n]*\{)|\brgba?\(|\bhsla?\(/i;
    const strays = sheets
      .filter((file) => !file.endsWith('_tokens.scss'))
      .filter((file) => hex.test(readFileSync(join('src', file), 'utf8').replaceAll(/#\{[^}]*\}/g, '')));
    expect(strays).toEqual([]);
  });

  it('use only tokens that exist', () => {
    const dyes =
      /var\(--((?:linen|paper|line|edge|ink|muted|cell|indigo|madder|woad|weld|lichen|thread|on)(?:-[a-z0-9]+)*)\)/g;
    const unknown = sheets.flatMap((file) =>
      [...readFileSync(join('src', file), 'utf8').matchAll(dyes)]
        .map(([, name]) => name ?? '')
        .filter((name) => !tokens.has(name))
        .map((name) => `${file}: ${name}`),
    );
    expect(unknown).toEqual([]);
  });

  it('never shout', () => {
    expect(
      sheets.filter((file) =>
        /!important/.test(readFileSync(join('src', file), 'utf8').replaceAll(/\/\*[\s\S]*?\*\//g, '')),
      ),
    ).toEqual([]);
  });
});
