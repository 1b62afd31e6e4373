/** What stands in a number field, and the number that it means. */

/** Hundredths are shown as points with one decimal, or two where a finer number was set. Empty for null and NaN. */
export function numberToText(value: number | null, hundredths: boolean): string {
  if (value === null || Number.isNaN(value)) return '';
  return hundredths ? (value / 100).toFixed(value % 10 === 0 ? 1 : 2) : String(value);
}

/** NaN for what is no number; null for an optional number left empty. */
export function textToNumber(text: string, as: { hundredths: boolean; optional: boolean }): number | null {
  const trimmed = text.trim();
  if (trimmed === '') return as.optional ? null : Number.NaN;
  return as.hundredths ? Math.round(Number(trimmed) * 100) : Number(trimmed);
}
