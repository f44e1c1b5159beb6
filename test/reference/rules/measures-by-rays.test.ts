import { describe, expect, it } from 'vitest';
import { loadClipper } from '../../../api/clipper.ts';
import type { PlanePoint } from '../../../shared/geometry/ring.ts';
import type { SceneBlock } from '../../../shared/shadow/shadow-layer.ts';
import { solarClockToMs } from '../../../shared/solar/solar-time.ts';
import { sunPositionAt } from '../../../shared/solar/sun-position.ts';
import { computeStudy } from '../../../shared/study/compute-study.ts';
import { readStudyInput } from '../../../shared/study/read-study-input.ts';
import { makeRandomTown, makeRectangle } from '../../support/plane-scenes.ts';
import { createSeededRandom } from '../../support/seeded-random.ts';
import {
  blockFeature,
  clauseOf,
  receptorFeature,
  smallPlace,
  studyInputOf,
} from '../../support/small-study.ts';
import { alongOf, isShadedByRay } from '../shadow/independent-shadow.ts';

const date = '2026-03-20';
const clauses = [
  clauseOf({
    receptors: { classes: ['yard'], of: 'whole' },
    days: [{ date: '03-20' }],
    window: { basis: 'solar', from: '09:00', to: '15:00' },
    measure: { kind: 'sun-share', hours: 2 },
    limit: {
      allOf: [
        { atLeast: 0 },
        { atLeast: 0, measure: { kind: 'sun-area', hours: 4 } },
        { atLeast: 0, measure: { kind: 'worst-shade-hours' } },
        { atLeast: 0, measure: { kind: 'sun-hours' } },
        { atLeast: 0, measure: { kind: 'shade-share' } },
      ],
    },
  }),
];

/**
 * Hours of sun at random points, by a ray to the sun from each at every instant: no grid, no
 * contours, no sweep, no code of the rule. Each instant counts for half a step on each side.
 */
function hoursByRays(points: readonly PlanePoint[], blocks: readonly SceneBlock[]) {
  const at = (clock: string) =>
    Math.round(solarClockToMs(date, clock, smallPlace.longitude, smallPlace.latitude) / 1000) *
    1000;
  const [fromMs, toMs] = [at('09:00'), at('15:00')];
  const instants: number[] = [];
  for (let atMs = fromMs; atMs < toMs; atMs += 600_000) instants.push(atMs);
  instants.push(toMs);
  const hours = points.map(() => 0);
  let leastLit = points.length;
  instants.forEach((atMs, index) => {
    const sun = sunPositionAt(atMs, smallPlace.longitude, smallPlace.latitude);
    const along = alongOf(sun);
    const before = instants[index - 1] ?? atMs;
    const after = instants[index + 1] ?? atMs;
    let lit = 0;
    points.forEach((point, number) => {
      if (blocks.some((block) => isShadedByRay(point, 0, block, along))) return;
      lit += 1;
      hours[number] = (hours[number] ?? 0) + (after - before) / 2 / 3_600_000;
    });
    leastLit = Math.min(leastLit, lit);
  });
  return { hours, shadeShare: 1 - leastLit / points.length };
}

describe('measures of a study in random towns', () => {
  it.each([31, 32, 33])('agree with rays from random points (town %d)', async (seed) => {
    const random = createSeededRandom(seed);
    const town = makeRandomTown(random, 45).filter(({ role }) => role !== 'existing');
    const ring = makeRectangle(-20, -15, 40, 30);
    const input = readStudyInput(
      studyInputOf({
        // Each ring of a block stands alone here, so that courtyards are filled in both ways.
        blocks: town.flatMap(({ rings, role, baseM, topM }, index) =>
          rings
            .slice(0, 1)
            .map((shell) => blockFeature(`block ${index}`, role, shell, baseM, topM)),
        ),
        receptors: [receptorFeature('yard', ring)],
        instants: [],
        clauses,
      }),
    );
    if (!input.ok) throw new Error(JSON.stringify(input.issues));
    const { evidence } = await computeStudy(input.input, { clipper: await loadClipper() });
    const tests = evidence.results.receptors[0]?.clauses[0]?.tests ?? [];
    const points = Array.from({ length: 1500 }, (): PlanePoint => [
      random() * 40 - 20,
      random() * 30 - 15,
    ]);
    const { hours, shadeShare } = hoursByRays(
      points,
      town.map((block) => ({ ...block, rings: block.rings.slice(0, 1) })),
    );
    const shareOf = (asked: number) =>
      hours.filter((one) => one >= asked - 1e-9).length / points.length;
    const expected = [
      shareOf(2),
      shareOf(4) * 1200,
      6 - Math.min(...hours),
      hours.reduce((sum, one) => sum + one, 0) / points.length,
      shadeShare,
    ];
    // What 1,500 random points leave open of a share (three standard deviations), of an area, of an
    // extreme (a step), of a mean of hours, and of the worst share.
    const leeway = [0.04, 48, 0.17, 0.2, 0.05];
    expect(tests).toHaveLength(expected.length);
    tests.forEach(({ measure, after }, index) => {
      const difference = Math.abs(after - (expected[index] ?? NaN));
      expect(difference, `${measure}: ${after}, by rays ${expected[index]}`).toBeLessThan(
        leeway[index] ?? 0,
      );
    });
  });
});
