import { describe, expect, it } from 'vitest';
import { bandPaths, type BandSample } from '../../../web/map/ledger-bands.ts';

const box = { xOf: (ms: number) => ms, beforeBottom: 20, afterBottom: 40, height: 10 };

describe('bandPaths', () => {
  it('stand as high as the share of the area in sun', () => {
    const samples: BandSample[] = [
      { atMs: 0, shareBefore: 1, shareAfter: 0.25 },
      { atMs: 5, shareBefore: 1, shareAfter: 0.25 },
    ];
    const paths = bandPaths(samples, box);
    expect(area(paths.before)).toBeCloseTo(5 * 10);
    expect(area(paths.after)).toBeCloseTo(5 * 2.5);
    expect(area(paths.lost)).toBeCloseTo(5 * 7.5);
    expect(paths.before.startsWith('M0.00 10.00')).toBe(true);
  });

  it('hatches nothing where nothing is lost, though sun is gained', () => {
    const samples: BandSample[] = [
      { atMs: 0, shareBefore: 0.2, shareAfter: 0.2 },
      { atMs: 5, shareBefore: 0.2, shareAfter: 0.9 },
    ];
    expect(bandPaths(samples, box).lost).toBe('');
  });

  it('outlines the stretches of a loss apart, and nothing between them', () => {
    const shares = [0.5, 0, 0.5, 0.5, 0.5, 0, 0.5];
    const samples = shares.map((shareAfter, atMs) => ({ atMs, shareBefore: 0.5, shareAfter }));
    const outlines = bandPaths(samples, box).lost.split('M').slice(1);
    const xs = outlines.map((one) => [...one.matchAll(/(\d+\.\d\d) /g)].map(([, x]) => Number(x)));
    expect(xs.map((all) => [Math.min(...all), Math.max(...all)])).toEqual([
      [0, 2],
      [4, 6],
    ]);
    // Each is a triangle of half the height over two steps.
    expect(outlines.map((one) => area(`M${one}`))).toEqual([5, 5]);
  });

  it('draws nothing where there is no sun at all', () => {
    const samples: BandSample[] = [
      { atMs: 0, shareBefore: 0, shareAfter: 0 },
      { atMs: 5, shareBefore: 0, shareAfter: 0 },
    ];
    expect(bandPaths(samples, box)).toEqual({ before: '', after: '', lost: '' });
    expect(bandPaths([], box)).toEqual({ before: '', after: '', lost: '' });
  });
});

/** The surface inside a path of straight lines, by the shoelace formula. */
function area(path: string): number {
  const points = path
    .slice(1, -1)
    .split('L')
    .map((point) => point.split(' ').map(Number));
  const twice = points.reduce((sum, [x = 0, y = 0], index) => {
    const [nextX = 0, nextY = 0] = points[(index + 1) % points.length] ?? [];
    return sum + x * nextY - nextX * y;
  }, 0);
  return Math.abs(twice) / 2;
}
