import fc from 'fast-check';
import { intersection, union, xor } from 'polyclip-ts';
import { describe, expect, it } from 'vitest';
import { orientRing, signedRingArea, type PlanePoint } from '../../../shared/geometry/ring.ts';
import { measureWhere, sweepFootprints } from '../../../shared/massing/footprint-sweep.ts';

type Ring = [number, number][];

const square = (x: number, y: number, side: number): Ring => [
  [x, y],
  [x + side, y],
  [x + side, y + side],
  [x, y + side],
];

const inAny = (windings: readonly number[]) => windings.some((winding) => winding !== 0);
const inAll = (windings: readonly number[]) => windings.every((winding) => winding !== 0);

describe('measureWhere', () => {
  it('measures a square and names its middle', () => {
    expect(measureWhere([[square(3, 4, 10)]], inAny)).toEqual({ areaM2: 100, at: [8, 9] });
  });

  it('measures union, intersection and difference of two squares', () => {
    const layers = [[square(0, 0, 10)], [square(6, 6, 10)]];
    expect(measureWhere(layers, inAny)?.areaM2).toBe(184);
    expect(measureWhere(layers, inAll)).toEqual({ areaM2: 16, at: [8, 8] });
    expect(measureWhere(layers, ([a, b]) => a !== 0 && b === 0)?.areaM2).toBe(84);
  });

  it('counts a courtyard out', () => {
    const courtyard = square(2, 2, 4).toReversed();
    expect(measureWhere([[square(0, 0, 10), courtyard]], inAny)?.areaM2).toBe(84);
  });

  it('finds nothing shared by blocks with a party wall', () => {
    const layers = [[square(0, 0, 10)], [square(10, 2, 10)]];
    expect(measureWhere(layers, inAll)).toEqual({ areaM2: 0, at: null });
    expect(measureWhere(layers, inAny)?.areaM2).toBe(200);
  });

  it('measures a crossing of turned strips', () => {
    // Strips 2 wide at ±45°: the diamond they share has an area of 2 · 2 = 4.
    const half = Math.SQRT2;
    const strip = (turn: 1 | -1): Ring =>
      [
        [-20, -20 - half],
        [20, 20 - half],
        [20, 20 + half],
        [-20, -20 + half],
      ].map(([x = 0, y = 0]): [number, number] => [turn * x, y]);
    expect(measureWhere([[strip(1)], [strip(-1)]], inAll)?.areaM2).toBeCloseTo(4, 9);
  });

  it('takes no rings, and rings that enclose nothing', () => {
    expect(measureWhere([], inAny)).toEqual({ areaM2: 0, at: null });
    const line: Ring = [
      [0, 0],
      [5, 5],
    ];
    expect(measureWhere([[[], line]], inAny)).toEqual({ areaM2: 0, at: null });
    expect(measureWhere([[square(NaN, 0, 1)]], inAny)?.areaM2).toBe(0);
  });

  it('gives up where edges cross without measure, rather than give a wrong area', () => {
    const star = Array.from({ length: 5001 }, (_, index): PlanePoint => {
      const turn = (index * 2500 * 2 * Math.PI) / 5001;
      return [Math.cos(turn), Math.sin(turn)];
    });
    expect(measureWhere([[star]], inAny)).toBeNull();
  });
});

/** Simple rings: the corners at rising angles around a middle. A part of them is snapped to whole metres. */
const ringArbitrary = fc
  .record({
    x: fc.integer({ min: 0, max: 30 }),
    y: fc.integer({ min: 0, max: 30 }),
    radii: fc.array(fc.integer({ min: 3, max: 25 }), { minLength: 3, maxLength: 9 }),
    isSnapped: fc.boolean(),
  })
  .map(({ x, y, radii, isSnapped }): Ring => {
    const corners = radii.map((radius, index): [number, number] => {
      const turn = (index * 2 * Math.PI) / radii.length;
      return [x + radius * Math.cos(turn), y + radius * Math.sin(turn)];
    });
    return isSnapped ? corners.map(([cx, cy]) => [Math.round(cx), Math.round(cy)]) : corners;
  })
  .filter((ring) => Math.abs(signedRingArea(ring)) > 1);

/** The peer: polyclip-ts, an independent construction that builds the polygons. */
function areaOf(polygons: [number, number][][][]): number {
  let areaM2 = 0;
  for (const [outline = [], ...holes] of polygons) {
    areaM2 += Math.abs(signedRingArea(outline.slice(0, -1)));
    for (const hole of holes) areaM2 -= Math.abs(signedRingArea(hole.slice(0, -1)));
  }
  return areaM2;
}

/** polyclip-ts throws on about one pair in a thousand; fast-check draws another in its place. */
function clipOrNull(a: Ring, b: Ring) {
  try {
    return {
      union: areaOf(union([a], [b])),
      intersection: areaOf(intersection([a], [b])),
      xor: areaOf(xor([a], [b])),
    };
  } catch {
    return null;
  }
}

describe('the sweep beside an independent clipping', () => {
  it('gives the same areas of union, intersection and symmetric difference', () => {
    fc.assert(
      fc.property(ringArbitrary, ringArbitrary, (a, b) => {
        const layers = [[orientRing(a, 'outer')], [orientRing(b, 'outer')]];
        const xorOf = ([inA, inB]: readonly number[]) => (inA !== 0) !== (inB !== 0);
        const clipped = clipOrNull(a, b);
        fc.pre(clipped !== null);
        // polyclip-ts snaps to about 1e-9 of the coordinates.
        expect(measureWhere(layers, inAny)?.areaM2).toBeCloseTo(clipped.union, 5);
        expect(measureWhere(layers, inAll)?.areaM2).toBeCloseTo(clipped.intersection, 5);
        expect(measureWhere(layers, xorOf)?.areaM2).toBeCloseTo(clipped.xor, 5);
      }),
      { numRuns: 300 },
    );
  });

  it('gives the same area for a ring begun at another corner, run the other way, moved and turned', () => {
    fc.assert(
      fc.property(
        ringArbitrary,
        fc.nat(8),
        fc.double({ min: 0, max: 6.28, noNaN: true }),
        (ring, start, turn) => {
          const from = start % ring.length;
          const changed = [...ring.slice(from), ...ring.slice(0, from)]
            .toReversed()
            .map(([x, y]): [number, number] => [
              1e5 + x * Math.cos(turn) - y * Math.sin(turn),
              -1e5 + x * Math.sin(turn) + y * Math.cos(turn),
            ]);
          expect(measureWhere([[changed]], inAny)?.areaM2).toBeCloseTo(
            Math.abs(signedRingArea(ring)),
            5,
          );
        },
      ),
    );
  });
});

describe('sweepFootprints', () => {
  it('hands out cells whose corners bound their area', () => {
    sweepFootprints([[square(0, 0, 10)]], (windings, { areaM2, corners }) => {
      expect(windings).toEqual([1]);
      expect(areaM2).toBe(100);
      expect(corners()).toEqual([
        [0, 0],
        [0, 10],
        [10, 0],
        [10, 10],
      ]);
    });
    expect.assertions(3);
  });
});
