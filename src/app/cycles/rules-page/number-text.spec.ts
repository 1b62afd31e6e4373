import { numberToText, textToNumber } from './number-text';

describe('the text of a number', () => {
  it('shows hundredths as points with one decimal, two where a finer number was set', () => {
    expect([500, 0, 305].map((value) => numberToText(value, true))).toEqual(['5.0', '0.0', '3.05']);
    expect(numberToText(12.5, false)).toBe('12.5');
    expect([numberToText(null, false), numberToText(Number.NaN, true)]).toEqual(['', '']);
  });

  it('reads it back; nothing is null only where that may be', () => {
    const plain = { hundredths: false, optional: false };
    expect(textToNumber(' 7 ', plain)).toBe(7);
    expect(textToNumber('3.05', { ...plain, hundredths: true })).toBe(305);
    expect(textToNumber('', plain)).toBeNaN();
    expect(textToNumber('', { ...plain, optional: true })).toBeNull();
  });
});
