import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkMassing } from '../../../shared/massing/check-massing.ts';
import { compareMassings } from '../../../shared/massing/compare-massings.ts';
import type { MassingBlock } from '../../../shared/massing/massing-block.ts';
import { massingFiguresSchema } from '../../../shared/massing/massing-figures.ts';
import { massingIssueSchema } from '../../../shared/massing/massing-issue.ts';
import { measureMassing } from '../../../shared/massing/measure-massing.ts';
import { readMassing } from '../../../shared/massing/read-massing.ts';
import { block, bytesOf, feature, readFeatures, rectangle, ring, site } from './drawn-massing.ts';
import type { Point } from './drawn-massing.ts';

const sample = {
  type: 'FeatureCollection',
  crs: { type: 'name', properties: { name: 'urn:ogc:def:crs:OGC:1.3:CRS84' } },
  features: [
    feature({ id: 'podium', base: 0, top: 12, storeys: 3 }, [
      rectangle(10, 10, 40, 30),
      rectangle(20, 20, 5, 5).reverse(),
    ]),
    feature({ id: 'tower', base: 12, top: '45', name: 'Tower' }, [rectangle(15, 15, 20, 20)]),
    feature({ role: 'existing', height: 6 }, [[rectangle(60, 10, 10, 10)]], 'MultiPolygon'),
  ],
};

/** Reads, and where that gives blocks, checks, measures and compares them; every answer has its shape. */
function goThrough(bytes: Uint8Array) {
  const reading = readMassing(bytes, 'tower.geojson');
  const issues = [...reading.issues];
  if (reading.ok) {
    issues.push(...checkMassing(reading.blocks, site));
    expect(massingFiguresSchema.safeParse(measureMassing(reading.blocks)).success).toBe(true);
    compareMassings(reading.blocks, reading.blocks.slice(1));
  } else {
    expect(issues.length).toBeGreaterThan(0);
  }
  for (const issue of issues) {
    expect(massingIssueSchema.safeParse(issue).error).toBeUndefined();
  }
}

describe('a massing file that was damaged', () => {
  it('never throws, whatever bytes are changed', () => {
    const bytes = bytesOf(sample);
    const change = fc.record({
      at: fc.nat(bytes.length - 1),
      byte: fc.oneof(fc.nat(255), fc.constantFrom(...bytesOf('[]{}",:0919-e.n'))),
    });
    fc.assert(
      fc.property(fc.array(change, { minLength: 1, maxLength: 4 }), (changes) => {
        const damaged = bytes.slice();
        for (const { at, byte } of changes) damaged[at] = byte;
        goThrough(damaged);
      }),
      { numRuns: 400 },
    );
  });

  it('never throws, wherever it is cut', () => {
    const bytes = bytesOf(sample);
    fc.assert(
      fc.property(fc.nat(bytes.length), fc.nat(bytes.length), (start, end) => {
        goThrough(bytes.slice(Math.min(start, end), Math.max(start, end)));
      }),
    );
  });

  it('never throws on any JSON in the place of any part', () => {
    fc.assert(
      fc.property(fc.jsonValue(), fc.nat(6), (value, part) => {
        const [first] = sample.features;
        const parts = [
          value,
          { ...sample, features: value },
          { ...sample, features: [value, first] },
          { ...sample, features: [{ ...first, geometry: value }] },
          { ...sample, features: [{ ...first, properties: value }] },
          { ...sample, features: [feature({ top: 9 }, value)] },
          { ...sample, crs: value },
        ];
        goThrough(bytesOf(parts[part]));
      }),
      { numRuns: 400 },
    );
  });

  it('never throws on rings of any numbers', () => {
    const position = fc.tuple(
      fc.oneof(fc.constantFrom(-91.3, 180, -180, 0), fc.double({ min: -91.31, max: -91.29 })),
      fc.oneof(fc.constantFrom(46.75, 90, -90, 0), fc.double({ min: 46.74, max: 46.76 })),
    );
    const rings = fc.array(fc.array(position, { maxLength: 9 }), { maxLength: 3 });
    fc.assert(
      fc.property(rings, fc.double(), fc.double(), (coordinates, base, top) => {
        goThrough(bytesOf(feature({ base, top }, coordinates)));
      }),
      { numRuns: 300 },
    );
  });
});

/** Footprints as an architect draws them: outlines around a middle, some with a courtyard. */
const blockArbitrary = fc
  .record({
    radii: fc.array(fc.double({ min: 4, max: 30, noNaN: true }), { minLength: 3, maxLength: 10 }),
    hasCourtyard: fc.boolean(),
    role: fc.constantFrom('proposed' as const, 'existing' as const),
    baseM: fc.double({ min: -10, max: 50, noNaN: true }),
    depthM: fc.double({ min: 0.1, max: 100, noNaN: true }),
    storeys: fc.option(fc.integer({ min: 1, max: 40 })),
    name: fc.option(fc.constantFrom('Tower', 'Kopf­bau', 'Äußerer Flügel')),
  })
  .map(({ radii, hasCourtyard, depthM, baseM, ...rest }): Omit<MassingBlock, 'id'> => {
    const corners = radii.map((radius, index): Point => {
      const turn = (index * 2 * Math.PI) / radii.length;
      return [40 + radius * Math.cos(turn), 40 + radius * Math.sin(turn)];
    });
    const courtyard = ring([39.5, 40], [40, 39.5], [40.5, 40]).reverse();
    const coordinates = hasCourtyard ? [ring(...corners), courtyard] : [ring(...corners)];
    // JSON writes −0 as 0.
    return {
      ...rest,
      baseM: baseM + 0,
      topM: baseM + depthM,
      geometry: { type: 'Polygon', coordinates },
    };
  });

const massingArbitrary = fc
  .array(blockArbitrary, { minLength: 1, maxLength: 6 })
  .map((blocks) => blocks.map((rest, index) => block(`b${index}`, [], rest)));

function featureOf({ geometry, ...properties }: MassingBlock) {
  return feature(properties, geometry.coordinates, geometry.type);
}

describe('a massing that is written and read again', () => {
  it('is the same, without an issue', () => {
    fc.assert(
      fc.property(massingArbitrary, (blocks) => {
        expect(readFeatures(...blocks.map(featureOf))).toEqual({ ok: true, blocks, issues: [] });
      }),
    );
  });

  it('is the same massing when its rings begin elsewhere, run the other way and stay open', () => {
    fc.assert(
      fc.property(massingArbitrary, fc.nat(9), fc.boolean(), (blocks, start, isReversed) => {
        const redrawn = blocks.map((original) => {
          const drawn = featureOf(original);
          const coordinates = original.geometry.coordinates.flat(0).map((positions) => {
            const open = positions.slice(0, -1);
            const from = start % open.length;
            const turned = [...open.slice(from), ...open.slice(0, from)];
            return isReversed ? turned.reverse() : turned;
          });
          return { ...drawn, geometry: { ...drawn.geometry, coordinates } };
        });
        const reading = readFeatures(...redrawn);
        expect(compareMassings(blocks, reading.blocks).map(({ change }) => change)).toEqual(
          blocks.map(() => 'same'),
        );
        expect(reading.issues.every(({ severity }) => severity === 'repaired')).toBe(true);
        expect(measureMassing(reading.blocks).footprintM2).toBeCloseTo(
          measureMassing(blocks).footprintM2 ?? NaN,
          6,
        );
      }),
    );
  });
});
