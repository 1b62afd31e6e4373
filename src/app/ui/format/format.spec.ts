import { FitPipe } from './fit-pipe';
import { PluralPipe } from './plural-pipe';
import { SharePipe } from './share-pipe';

describe('pipes', () => {
  it('shows a fit with one decimal', () => {
    const pipe = new FitPipe();
    expect([7140, 3800, 10000, 0, null].map((fit) => pipe.transform(fit))).toEqual([
      '71.4',
      '38.0',
      '100.0',
      '0.0',
      '–',
    ]);
  });

  it('counts in the right form', () => {
    const pipe = new PluralPipe();
    const words = [0, 1, 2, 2914].map((count) => pipe.transform(count, 'mentee', 'mentees'));
    expect(words).toEqual(['0 mentees', '1 mentee', '2 mentees', '2\u202f914 mentees']);
  });

  it('shows a share in per cent', () => {
    const pipe = new SharePipe();
    expect(pipe.transform(0.934)).toBe('93\u00a0%');
    expect(pipe.transform(0.934, 1)).toBe('93.4\u00a0%');
    expect(pipe.transform(undefined)).toBe('–');
  });
});
