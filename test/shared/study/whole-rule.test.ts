import { beforeAll, describe, expect, it } from 'vitest';
import { loadClipper } from '../../../api/clipper.ts';
import type { Clipper } from '../../../shared/shadow/clipper.ts';
import { computeStudy } from '../../../shared/study/compute-study.ts';
import { evidenceFileSchema, type EvidenceFile } from '../../../shared/study/evidence-schema.ts';
import { readStudyInput } from '../../../shared/study/read-study-input.ts';
import { computeReceptorLedger } from '../../../shared/study/receptor-ledger.ts';
import { makeRectangle } from '../../support/plane-scenes.ts';
import {
  blockFeature,
  clauseOf,
  readInput,
  receptorFeature,
  studyInputOf,
  toPolygon,
  windowFeature,
} from '../../support/small-study.ts';

let clipper: Clipper;
beforeAll(async () => {
  clipper = await loadClipper();
});

async function compute(value: unknown): Promise<EvidenceFile> {
  const { evidence } = await computeStudy(readInput(value), { clipper });
  // What is computed is a file that can be read again.
  expect(evidenceFileSchema.parse(JSON.parse(JSON.stringify(evidence)))).toEqual(evidence);
  return evidence;
}

const issuesOf = (value: unknown) => {
  const result = readStudyInput(value);
  return result.ok ? [] : result.issues.map(({ path }) => path);
};

/** A hundredth of a millimetre high: it shades what it covers. */
const slab = (
  id: string,
  role: 'context' | 'existing' | 'proposed' | 'by-right',
  ring = yardRing,
) => blockFeature(id, role, ring, 0, 0.00001);

const yardRing = makeRectangle(0, 0, 20, 20);
const southHalf = makeRectangle(0, 0, 20, 10);
const eastHalf = makeRectangle(10, 0, 10, 20);
const yard = receptorFeature('12', yardRing);
const site = toPolygon(makeRectangle(-20, -30, 60, 20));

const shadeShare = { measure: { kind: 'shade-share' }, limit: { noWorse: true } };

describe('a baseline', () => {
  it('of what could be built by right takes those blocks before, and leaves out what exists', async () => {
    const evidence = await compute(
      studyInputOf({
        blocks: [
          slab('right', 'by-right', southHalf),
          slab('old', 'existing', eastHalf),
          slab('new', 'proposed', southHalf),
        ],
        receptors: [yard],
        clauses: [
          clauseOf({ ...shadeShare, baseline: 'by-right' }),
          clauseOf({ ...shadeShare, id: 'now' }),
        ],
      }),
    );
    const [byRight, now] = evidence.results.receptors[0]?.clauses ?? [];
    expect(byRight?.tests[0]).toMatchObject({ before: 0.5, after: 0.5 });
    expect(byRight?.finding).toBe('not-affected');
    // Held against what exists, the south-west quarter of 100 m² is shaded anew.
    expect(now?.finding).toBe('not-met');
    expect(now?.tests[0]?.margin).toBeCloseTo(1 - 100, 1);
  });

  it('of the proposal alone leaves open ground open, whatever stands around', async () => {
    const evidence = await compute(
      studyInputOf({
        blocks: [slab('house', 'context', eastHalf), slab('new', 'proposed', southHalf)],
        receptors: [yard],
        clauses: [clauseOf({ ...shadeShare, limit: { atMost: 0.6 }, baseline: 'proposal-alone' })],
      }),
    );
    // The house's ground is not open: of the 200 m² west of it the slab covers half.
    expect(evidence.results.receptors[0]?.clauses[0]?.tests[0]).toMatchObject({
      before: 0,
      after: 0.5,
    });
  });

  it('of a wall takes no context that the rule does not name', async () => {
    const wall = (list: string[]) =>
      clauseOf({ ...shadeShare, baseline: { wall: 0.5, with: list } });
    const input = (list: string[]) =>
      studyInputOf({
        site,
        blocks: [slab('house', 'context', southHalf), slab('new', 'proposed', eastHalf)],
        receptors: [yard],
        clauses: [{ ...wall(list), receptors: { classes: ['yard'], of: 'whole' } }],
      });
    const shares = async (list: string[]) => {
      const { before, after } =
        (await compute(input(list))).results.receptors[0]?.clauses[0]?.tests[0] ?? {};
      return [before, after];
    };
    // The wall lies 10 m south of the yard and half a metre high: it does not reach it.
    expect(await shares(['context'])).toEqual([0.5, 0.75]);
    expect(await shares([])).toEqual([0, 0.75]);
  });

  it('needs the site where it has a wall, and so does a ring', () => {
    const without = (clause: Record<string, unknown>) =>
      issuesOf(studyInputOf({ blocks: [], receptors: [yard], clauses: [clauseOf(clause)] }));
    expect(without({ ...shadeShare, baseline: { wall: 3 } })).toEqual(['site']);
    expect(without({ receptors: { ring: { from: 5 } } })).toEqual(['site']);
    expect(without({})).toEqual([]);
  });
});

describe('a ring', () => {
  it('is a receptor of its own: the band around the site with round corners', async () => {
    const evidence = await compute(
      studyInputOf({
        site,
        blocks: [slab('house', 'context', yardRing), slab('new', 'proposed', southHalf)],
        receptors: [],
        clauses: [
          clauseOf({ receptors: { ring: { from: 5, to: 10 } } }),
          clauseOf({ id: 'near', receptors: { ring: { from: 0, to: 10 }, of: 'whole' } }),
        ],
      }),
    );
    const [ring, near] = evidence.results.receptors;
    expect(ring?.id).toBe('ring:midwinter');
    expect(near?.id).toBe('ring:near');
    // The site is 60 m × 20 m: 160 m of border times 5 m, and a round band of π (10² − 5²).
    expect(Math.abs((ring?.openArea ?? NaN) - (160 * 5 + Math.PI * 75))).toBeLessThan(0.2);
    // From 0 to 10 m: 160 · 10 + π · 100 m²; the house begins 10 m from the site.
    expect(Math.abs((near?.openArea ?? NaN) - (1600 + Math.PI * 100))).toBeLessThan(0.2);
    expect(evidence.results.findings.clauses.map(({ finding }) => finding)).toEqual(['met', 'met']);
  });

  it('reaches as far as the shadow where it has no outer distance', async () => {
    const evidence = await compute(
      studyInputOf({
        site,
        blocks: [blockFeature('new', 'proposed', makeRectangle(-20, -30, 60, 20), 0, 10)],
        receptors: [],
        clauses: [
          clauseOf({
            receptors: { ring: { from: 1 } },
            window: { basis: 'solar', from: '12:00', to: '12:00' },
            ...shadeShare,
            limit: { atMost: 1 },
          }),
        ],
      }),
    );
    // At noon a shadow is 25.3 m long (10 m at 21.6°), so the band is 24.3 m wide: 160 m of border
    // on the site plus the round corners, π ((25.3)² − 1²).
    const expectedM2 = 160 * 24.3 + Math.PI * (25.3 ** 2 - 1);
    const { openArea } = evidence.results.receptors[0] ?? {};
    expect(Math.abs((openArea ?? NaN) - expectedM2)).toBeLessThan(0.01 * expectedM2);
    // In shade: 60 m × 24.3 m north of the site.
    const shade = evidence.results.receptors[0]?.clauses[0]?.tests[0]?.after ?? NaN;
    expect(Math.abs(shade - (60 * 24.3) / expectedM2)).toBeLessThan(0.01);
  });

  it('is checked by its polygons like any other receptor', async () => {
    const evidence = await compute(
      studyInputOf({
        site,
        blocks: [
          blockFeature('house', 'context', makeRectangle(0, 2, 8, 8), 0, 6),
          blockFeature('new', 'proposed', makeRectangle(0, -25, 20, 10), 0, 14),
        ],
        receptors: [],
        // The house's ground is cut out of what is judged, and not of what is shown.
        clauses: [
          clauseOf({ receptors: { ring: { from: 5, to: 40 } }, baseline: 'proposal-alone' }),
        ],
      }),
    );
    expect(evidence.results.instants[0]?.netNew).toBeGreaterThan(100);
    expect(evidence.results.check?.largestDifferenceM2).toBeLessThan(1e-3);
  });

  it('says no-receptor where no shadow reaches it', async () => {
    const evidence = await compute(
      studyInputOf({
        site,
        blocks: [slab('new', 'proposed', makeRectangle(-20, -30, 60, 20))],
        receptors: [],
        clauses: [clauseOf({ receptors: { ring: { from: 5 } } })],
      }),
    );
    expect(evidence.results.findings.clauses[0]?.finding).toBe('no-receptor');
    expect(evidence.results.receptors).toEqual([]);
  });
});

describe('a window', () => {
  const inWindow = { receptors: { classes: ['window'] } };

  it('is given in shares, without an area', async () => {
    const noon = '2026-12-21T12:00:00+00:00';
    const evidence = await compute(
      studyInputOf({
        // A wall 10 m off that hides the sun of noon from the window's eastern half alone.
        blocks: [blockFeature('new', 'proposed', makeRectangle(2, -11, 200, 1), 0, 30)],
        receptors: [
          windowFeature(
            'w',
            [
              [0, 0],
              [4, 0],
            ],
            180,
          ),
        ],
        instants: [noon],
        clauses: [clauseOf(inWindow)],
      }),
    );
    const [window] = evidence.results.receptors;
    expect(window?.openArea).toBeNull();
    // The sun stands half a degree west of south at noon by the clock: 10 m · sin 0.5° = 0.1 m.
    expect(window?.instants[0]?.sunBefore).toBe(1);
    expect(Math.abs((window?.instants[0]?.sunAfter ?? NaN) - 0.5)).toBeLessThan(0.05);
    // 4 m at 32 points.
    expect(window?.clauses[0]?.spacingM).toBe(0.125);
  });

  it('has no sun while the sun stands behind its wall', async () => {
    const evidence = await compute(
      studyInputOf({
        blocks: [],
        receptors: [windowFeature('north', [[0, 0]], 0), windowFeature('west', [[0, 0]], 270)],
        clauses: [clauseOf(inWindow)],
      }),
    );
    const [north, west] = evidence.results.receptors;
    expect(north?.clauses[0]?.tests[0]?.before).toBe(0);
    // Two of the four hours around solar noon.
    expect(Math.abs((west?.clauses[0]?.tests[0]?.before ?? NaN) - 2)).toBeLessThan(0.1);
  });

  it('is close to a limit within one of its points, even at an instant', async () => {
    const judge = async (atMost: number) => {
      const evidence = await compute(
        studyInputOf({
          blocks: [blockFeature('new', 'proposed', makeRectangle(2, -11, 200, 1), 0, 30)],
          receptors: [
            windowFeature(
              'w',
              [
                [0, 0],
                [4, 0],
              ],
              180,
            ),
          ],
          clauses: [
            clauseOf({
              ...inWindow,
              window: { basis: 'solar', from: '12:00', to: '12:00' },
              measure: { kind: 'shade-share' },
              limit: { atMost },
            }),
          ],
        }),
      );
      return evidence.results.receptors[0]?.clauses[0]?.close;
    };
    // The eastern half is hidden: 16 of 32 points, of which one is 3 %.
    expect(await judge(0.52)).toBe(true);
    expect(await judge(0.6)).toBe(false);
  });

  it('counts any new shade, since it has no square metre to let pass', async () => {
    const evidence = await compute(
      studyInputOf({
        blocks: [blockFeature('new', 'proposed', makeRectangle(-3, -12, 6, 1), 0, 30)],
        receptors: [windowFeature('w', [[0, 0]], 180)],
        clauses: [clauseOf({ ...inWindow, limit: { losesAtMost: 0 } })],
      }),
    );
    expect(evidence.results.receptors[0]?.clauses[0]?.finding).toBe('not-met');
  });

  it('is left out when it lies on the site', async () => {
    const evidence = await compute(
      studyInputOf({
        site,
        blocks: [],
        receptors: [windowFeature('own', [[0, -20]], 180), windowFeature('next', [[0, 5]], 180)],
        clauses: [clauseOf(inWindow)],
      }),
    );
    expect(evidence.results.receptors.map(({ clauses }) => clauses.length)).toEqual([0, 1]);
  });

  it('has energy on its upright plane, and a ledger without an area', async () => {
    const value = studyInputOf({
      blocks: [blockFeature('new', 'proposed', makeRectangle(-3, -12, 6, 1), 0, 30)],
      receptors: [windowFeature('w', [[0, 0]], 180), receptorFeature('ground', yardRing)],
      clauses: [
        clauseOf({
          receptors: { classes: ['window', 'yard'] },
          measure: { kind: 'beam-energy' },
          limit: { keeps: 0.5 },
        }),
      ],
    });
    const [window, ground] = (await compute(value)).results.receptors.map(
      ({ clauses }) => clauses[0]?.tests[0]?.before ?? NaN,
    );
    // Around a winter noon at 45° N the sun stands at 16° to 22°: an upright plane takes the cosine
    // of it, level ground the sine, so about three times as much.
    expect((window ?? NaN) / (ground ?? NaN)).toBeGreaterThan(2.2);
    expect((window ?? NaN) / (ground ?? NaN)).toBeLessThan(3.2);
    const ledger = computeReceptorLedger(readInput(value), 'w');
    expect(ledger.openAreaM2).toBeNull();
    expect(ledger.days[3]?.sunHours.lost).toBeGreaterThan(0.5);
  });

  it.each([
    [
      'a polygon',
      { ...receptorFeature('w', yardRing, { class: 'window', facing: 180 }) },
      'geometry.type',
    ],
    ['no direction', windowFeature('w', [[0, 0]], undefined), 'properties.facing'],
  ])('is refused with %s', (_what, feature, path) => {
    const input = studyInputOf({ blocks: [], receptors: [feature] });
    expect(issuesOf(input)).toEqual([`receptors.features.0.${path}`]);
  });
});

describe('a plane of the clause', () => {
  it('opens the ground above a house that is lower', async () => {
    const evidence = await compute(
      studyInputOf({
        blocks: [blockFeature('house', 'context', eastHalf, 0, 3)],
        receptors: [yard],
        clauses: [
          clauseOf({ receptors: { classes: ['yard'] }, limit: { atMost: 4.1 } }),
          clauseOf({ id: 'above', receptors: { classes: ['yard'], plane: 4 } }),
        ],
      }),
    );
    const hours = evidence.results.receptors[0]?.clauses.map(({ tests }) => tests[0]?.before) ?? [];
    // At 4 m nothing stands in the way: all of the yard has the four hours.
    expect(Math.abs((hours[1] ?? NaN) - 4)).toBeLessThan(0.01);
    // Below, the house of 3 m shades some of its west in the morning.
    expect(hours[0]).toBeLessThan(3.8);
  });
});

describe('limits that bring their own measure', () => {
  it('are tested each by its own, and led by the clause’s in the sentence', async () => {
    const evidence = await compute(
      studyInputOf({
        blocks: [slab('new', 'proposed', southHalf)],
        receptors: [yard],
        clauses: [
          clauseOf({
            limit: {
              anyOf: [
                { atLeast: 150, measure: { kind: 'sun-area', hours: 3 } },
                { atLeast: 3 },
                { atMost: 1, measure: { kind: 'worst-shade-hours' } },
              ],
            },
          }),
        ],
      }),
    );
    const [result] = evidence.results.receptors[0]?.clauses ?? [];
    // Half of 400 m² has all four hours: 200 m², two hours as a mean, four hours of shade below the slab.
    expect(result?.tests.map(({ after, unit }) => [Math.round(after), unit])).toEqual([
      [200, 'm²'],
      [2, 'h'],
      [4, 'h'],
    ]);
    expect(result?.finding).toBe('met');
    expect(result?.note).toContain('has 4 h of sun in the judged hours before and 2 h after');
    expect(result?.note).toContain('at least 150 m²');
  });
});

describe('a year and a season', () => {
  it('are judged day by day: the worst day, and how many are not met', async () => {
    const season = (more: Record<string, unknown>) =>
      studyInputOf({
        blocks: [slab('new', 'proposed', southHalf)],
        receptors: [yard],
        clauses: [clauseOf({ step: 60, limit: { atLeast: 3 }, ...more })],
      });
    const year = await compute(season({ days: [{ year: true }] }));
    const [result] = year.results.receptors[0]?.clauses ?? [];
    // Two of four hours on every day of the year.
    expect(result).toMatchObject({ finding: 'not-met', daysNotMet: 365 });
    const winter = await compute(season({ days: [{ from: '12-15', to: '01-15', everyDays: 1 }] }));
    expect(winter.results.receptors[0]?.clauses[0]?.daysNotMet).toBe(32);
  });

  it('add up what adds up, over a year’s end as well', async () => {
    const evidence = await compute(
      studyInputOf({
        blocks: [slab('new', 'proposed', southHalf)],
        receptors: [yard],
        clauses: [
          clauseOf({
            days: [{ from: '12-30', to: '01-02', everyDays: 1 }, { date: '12-31' }],
            measure: { kind: 'sun-area-hours' },
            limit: { losesAtMostShare: 0.6, of: 'theoretical' },
          }),
        ],
      }),
    );
    const [result] = evidence.results.receptors[0]?.clauses ?? [];
    // Four days of four hours on 400 m²; the 31st counts once.
    expect(Math.abs((result?.tests[0]?.before ?? NaN) - 6400)).toBeLessThan(10);
    expect(Math.abs((result?.tests[0]?.after ?? NaN) - 3200)).toBeLessThan(10);
    expect(result).toMatchObject({ day: null, finding: 'met' });
  });
});
