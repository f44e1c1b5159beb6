import { beforeAll, describe, expect, it } from 'vitest';
import { loadClipper } from '../../../api/clipper.ts';
import type { Clipper } from '../../../shared/shadow/clipper.ts';
import { sunPositionAt } from '../../../shared/solar/sun-position.ts';
import { computeStudy } from '../../../shared/study/compute-study.ts';
import { digestOf } from '../../../shared/study/digest.ts';
import { evidenceFileSchema } from '../../../shared/study/evidence-schema.ts';
import { readStudyInput } from '../../../shared/study/read-study-input.ts';
import { computeReceptorLedger } from '../../../shared/study/receptor-ledger.ts';
import { makeRectangle } from '../../support/plane-scenes.ts';
import {
  blockFeature,
  clauseOf,
  readInput,
  receptorFeature,
  smallPlace,
  studyInputOf,
} from '../../support/small-study.ts';

let clipper: Clipper;
beforeAll(async () => {
  clipper = await loadClipper();
});

const compute = async (value: unknown) =>
  (await computeStudy(readInput(value), { clipper })).evidence;

/** A wall of a building 400 m long from west to east, south of the yard: it shades by its height alone. */
const longBlock = (role: 'context' | 'existing' | 'proposed', topM: number) =>
  blockFeature(`long-${role}`, role, makeRectangle(-200, -10, 400, 10), 0, topM);
const yard = receptorFeature('12', makeRectangle(-10, 0, 20, 20));

describe('a study', () => {
  it('gives the sunlit area at noon that the height and the altitude say', async () => {
    const at = '2026-12-21T12:00:00+00:00';
    const evidence = await compute(
      studyInputOf({ blocks: [longBlock('proposed', 4)], receptors: [yard], instants: [at] }),
    );
    const sun = sunPositionAt(Date.parse(at), smallPlace.longitude, smallPlace.latitude);
    // The long wall's shadow reaches height · cot(altitude) · cos(azimuth from south) to the north.
    const reachM =
      (4 / Math.tan((sun.altitudeDeg * Math.PI) / 180)) *
      Math.abs(Math.cos((sun.azimuthDeg * Math.PI) / 180));
    const [instant] = evidence.results.receptors[0]?.instants ?? [];
    expect(instant?.sunBefore).toBeCloseTo(400, 1);
    expect(instant?.sunAfter).toBeCloseTo(20 * (20 - reachM), 1);
    expect(evidence.results.receptors[0]?.openArea).toBeCloseTo(400, 1);
  });

  it('judges mean hours: a tower that shades the whole yard leaves none', async () => {
    const evidence = await compute(
      studyInputOf({ blocks: [longBlock('proposed', 60)], receptors: [yard] }),
    );
    const [result] = evidence.results.receptors[0]?.clauses ?? [];
    // Four hours of true solar time, which in December run 4 s longer than by the clock; the yard is
    // open to the whole southern sky before.
    expect(result?.tests[0]?.before).toBeCloseTo(4, 2);
    expect(result?.tests[0]?.after).toBeCloseTo(0, 3);
    expect(result?.finding).toBe('not-met');
    expect(result?.loss).toBeCloseTo(1, 4);
    expect(result?.band).toBe('substantial');
    expect(evidence.results.findings).toMatchObject({
      met: false,
      lossIndex: 100,
      clauses: [{ clause: 'midwinter', finding: 'not-met', receptorsNotMet: ['12'] }],
    });
  });

  it('finds nothing where the proposal equals what stands there', async () => {
    const evidence = await compute(
      studyInputOf({
        blocks: [longBlock('existing', 9), longBlock('proposed', 9)],
        receptors: [yard],
        // Met by nothing at all, and yet nothing hangs on it.
        clauses: [clauseOf({ limit: { noWorse: true } })],
      }),
    );
    expect(evidence.results.instants[0]).toMatchObject({ netNew: 0, removed: 0 });
    expect(evidence.results.receptors[0]?.clauses[0]).toMatchObject({
      finding: 'not-affected',
      close: false,
    });
    expect(evidence.results.findings.lossIndex).toBe(0);
  });

  it('credits shade that goes: net new less removed is after less before', async () => {
    const existing = blockFeature('old', 'existing', makeRectangle(-20, -15, 12, 10), 0, 12);
    const proposed = blockFeature('new', 'proposed', makeRectangle(2, -15, 12, 10), 0, 15);
    const evidence = await compute(
      studyInputOf({
        blocks: [existing, proposed],
        receptors: [receptorFeature('all', makeRectangle(-400, -5, 800, 400))],
        instants: ['2026-12-21T10:30:00+00:00', '2026-03-20T15:00:00+00:00'],
      }),
    );
    evidence.results.receptors[0]?.instants.forEach((row, index) => {
      const total = evidence.results.instants[index];
      // The field reaches north of the blocks, so it holds the change of the whole ground but for
      // what lies under and south of them.
      expect(row.sunBefore - row.sunAfter).not.toBe(0);
      expect(total?.netNew).toBeGreaterThan(0);
      expect(total?.removed).toBeGreaterThan(0);
    });
    expect(evidence.results.check?.largestDifferenceM2).toBeLessThan(1e-3);
  });

  it('leaves what lies on the site out of every figure', async () => {
    const site = { ...receptorFeature('site', makeRectangle(-200, -20, 400, 30)).geometry };
    const half = receptorFeature('half', makeRectangle(0, 0, 20, 19));
    const onSite = receptorFeature('inside', makeRectangle(0, -5, 20, 14));
    const evidence = await compute(
      studyInputOf({
        blocks: [longBlock('proposed', 60)],
        receptors: [half, onSite],
        site: site.type === 'Polygon' ? site : undefined,
      }),
    );
    // The site ends at y = 10: 9 m of the first receptor's 19 m are left, none of the second's.
    expect(evidence.results.receptors[0]?.openArea).toBeCloseTo(20 * 9, 1);
    expect(evidence.results.receptors[1]?.openArea).toBeCloseTo(0, 1);
    expect(evidence.results.receptors[1]?.clauses).toEqual([]);
  });

  it('takes a roof at its own height and context out of the open area', async () => {
    const house = blockFeature('house', 'context', makeRectangle(0, 5, 8, 10), 0, 6);
    const evidence = await compute(
      studyInputOf({
        blocks: [house, longBlock('proposed', 5)],
        receptors: [
          receptorFeature('yard', makeRectangle(-10, 0, 20, 20)),
          receptorFeature('roof', makeRectangle(1, 6, 6, 8), { class: 'collector', plane: 6 }),
        ],
      }),
    );
    const [ground, roof] = evidence.results.receptors;
    expect(ground?.openArea).toBeCloseTo(400 - 80, 1);
    // The proposal is lower than the roof.
    expect(roof?.openArea).toBeCloseTo(48, 1);
    expect(roof?.instants[0]?.sunAfter).toBeCloseTo(48, 1);
  });

  it('says no-receptor, not met, where a clause finds none', async () => {
    const evidence = await compute(
      studyInputOf({
        blocks: [longBlock('proposed', 20)],
        receptors: [yard],
        clauses: [clauseOf({ receptors: { classes: ['collector'] } })],
      }),
    );
    expect(evidence.results.findings.clauses[0]?.finding).toBe('no-receptor');
  });

  it('reports a brief shade as disregarded and does not hold it against the proposal', async () => {
    const chimney = blockFeature('mast', 'proposed', makeRectangle(0, -30, 6, 6), 0, 40);
    const strict = { limit: { losesAtMost: 0 } };
    const input = (minutes: number) =>
      studyInputOf({
        blocks: [chimney],
        receptors: [yard],
        clauses: [clauseOf({ ...strict, disregard: { minutes, area: 1 } })],
      });
    expect((await compute(input(0))).results.receptors[0]?.clauses[0]?.finding).toBe('not-met');
    expect((await compute(input(240))).results.receptors[0]?.clauses[0]?.finding).toBe(
      'disregarded',
    );
  });

  it('takes what is approved nearby into both states of the cumulative findings only', async () => {
    const approved = blockFeature('next', 'approved', makeRectangle(-200, -12, 400, 2), 0, 80);
    const evidence = await compute(
      studyInputOf({ blocks: [longBlock('proposed', 60), approved], receptors: [yard] }),
    );
    expect(evidence.results.findings.met).toBe(false);
    // With the approved block the yard has no sun to lose.
    expect(evidence.results.cumulative?.met).toBe(true);
  });

  it('has a digest over all but itself and the check, the same at every run', async () => {
    const input = studyInputOf({ blocks: [longBlock('proposed', 9)], receptors: [yard] });
    const first = await compute(input);
    const second = await compute(input);
    expect(second).toEqual(first);
    expect(evidenceFileSchema.parse(first)).toEqual(first);
    expect(digestOf({ ...first, results: { ...first.results, check: undefined } })).toBe(
      first.digest,
    );
    expect(digestOf({ ...first, year: 2027 })).not.toBe(first.digest);
  });

  it('lists the hours of daylight and the ends of the window when no instants are named', async () => {
    const input = readInput(studyInputOf({ blocks: [], receptors: [yard] }));
    const { instants: _instants, ...unnamed } = input;
    const { evidence } = await computeStudy(unnamed, { clipper });
    expect(evidence.instants).toContain('2026-12-21T12:00:00+00:00');
    expect(evidence.instants).not.toContain('2026-12-21T07:00:00+00:00');
    expect(evidence.results.instants).toHaveLength(evidence.instants?.length ?? 0);
    // Ten o'clock of true solar time at longitude 0 on this day is about 09:58 by the clock.
    expect(evidence.instants?.some((at) => at.startsWith('2026-12-21T09:5'))).toBe(true);
  });

  it('tells its progress instant by instant and ends when the caller throws', async () => {
    const input = readInput(studyInputOf({ blocks: [], receptors: [yard] }));
    const seen: number[] = [];
    const run = computeStudy(input, {
      clipper,
      onProgress: (done) => {
        seen.push(done);
        if (done === 3) throw new Error('cancelled');
      },
    });
    await expect(run).rejects.toThrow('cancelled');
    expect(seen).toEqual([1, 2, 3]);
  });
});

describe('the sun ledger', () => {
  it('adds its hours up to the day and loses what a long wall takes', () => {
    const input = readInput(
      studyInputOf({ blocks: [longBlock('proposed', 60)], receptors: [yard] }),
    );
    const ledger = computeReceptorLedger(input, '12');
    expect(ledger.days.map((day) => day.event)).toEqual([
      'march-equinox',
      'june-solstice',
      'september-equinox',
      'december-solstice',
    ]);
    const winter = ledger.days[3];
    const sum = winter?.hours.reduce((total, hour) => total + hour.sunHours.lost, 0) ?? 0;
    expect(sum).toBeCloseTo(winter?.sunHours.lost ?? 0, 2);
    expect(winter?.sunHours.before).toBeGreaterThan(8);
    expect(winter?.lostSpans).toHaveLength(1);
    expect(winter?.beamEnergyKwhM2.lost).toBeGreaterThan(0);
  });

  it('agrees with the judged hours of a study over the same window', async () => {
    const block = blockFeature('tower', 'proposed', makeRectangle(-5, -40, 14, 14), 0, 30);
    const value = studyInputOf({
      blocks: [block],
      receptors: [yard],
      clauses: [clauseOf({ window: { basis: 'sun', afterSunrise: 0, beforeSunset: 0 }, step: 5 })],
    });
    const evidence = await compute(value);
    const [test] = evidence.results.receptors[0]?.clauses[0]?.tests ?? [];
    const winter = computeReceptorLedger(readInput(value), '12').days[3];
    // Both integrate every five minutes; the ledger also cuts at whole hours.
    expect(winter?.sunHours.before).toBeCloseTo(test?.before ?? 0, 2);
    expect(winter?.sunHours.after).toBeCloseTo(test?.after ?? 0, 2);
  });
});

describe('reading a study', () => {
  it('names the member that is wrong', () => {
    const good = studyInputOf({ blocks: [], receptors: [yard] });
    const result = readStudyInput({ ...(good as object), colour: 'blue' });
    expect(result).toMatchObject({ ok: false });
    const missing = readStudyInput({ format: 'noonmark-study/1' });
    expect(missing.ok ? [] : missing.issues.map((issue) => issue.path)).toContain('place');
  });

  it('refuses a footprint that crosses itself, even or uneven', () => {
    for (const tip of [10, 14]) {
      const bowtie = [
        [0, 0],
        [10, tip],
        [10, 0],
        [0, 10],
      ] as const;
      const result = readStudyInput(
        studyInputOf({ blocks: [blockFeature('b', 'context', bowtie, 0, 5)], receptors: [yard] }),
      );
      expect(result.ok ? '' : result.issues[0]?.path).toBe('blocks.features.0.geometry');
    }
  });

  it('refuses a window in which the sun never stands', () => {
    const night = clauseOf({ window: { basis: 'civil', from: '01:00', to: '03:00' } });
    const result = readStudyInput(
      studyInputOf({ blocks: [], receptors: [yard], clauses: [night] }),
    );
    expect(result.ok ? '' : result.issues[0]?.path).toBe('rule.clauses.0.window');
  });
});
