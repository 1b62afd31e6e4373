import { layOutStrip, NARROWEST_CELL, stripLength } from './strip-layout';

describe('layOutStrip', () => {
  it('gives each cell its weight', () => {
    const cells = layOutStrip([3, 1], 202);
    expect(cells.map((cell) => cell.width)).toEqual([150, 50]);
    expect(cells[1]?.x).toBe(152);
  });

  it('keeps every cell at 14 px or more and the strip at its length', () => {
    const cells = layOutStrip([60, 20, 10, 6, 2, 1, 1], 156);
    expect(Math.min(...cells.map((cell) => cell.width))).toBeGreaterThanOrEqual(NARROWEST_CELL);
    expect(stripLength(cells)).toBeCloseTo(156, 6);
  });

  it('grows when even the narrowest cells do not fit', () => {
    const cells = layOutStrip([1, 1, 1, 1], 20);
    expect(cells.every((cell) => cell.width >= NARROWEST_CELL)).toBe(true);
  });

  it('has no cell without criteria', () => {
    expect(stripLength(layOutStrip([], 156))).toBe(0);
  });
});
