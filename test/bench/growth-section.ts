import { blocksTowardSun } from '../../shared/shadow/blocks-toward-sun.ts';
import type { Clipper } from '../../shared/shadow/clipper.ts';
import { createShadowCaster } from '../../shared/shadow/shadow-layer.ts';
import { sunPositionAt } from '../../shared/solar/sun-position.ts';
import { computeStudy } from '../../shared/study/compute-study.ts';
import type { StudyInput } from '../../shared/study/evidence-schema.ts';
import { buildScene } from '../../shared/study/scene.ts';
import { affectedReceptors, boxOfReceptors } from './affected-receptors.ts';
import { median, milliseconds, say, table } from './measuring.ts';
import { byTurfWithoutPruning } from './polygon-pipelines.ts';
import { makeTown } from './town.ts';

/** The cost of a sun as the town grows round the same proposal. */
export function growthWithBlocks(): string {
  const rows = [570, 1200, 2400, 4850].map((sideM) => {
    const input = makeTown(sideM);
    const scene = buildScene(input);
    const perSun = sunsOf(input).map((sun) => {
      const affected = affectedReceptors(scene, createShadowCaster(scene.blocks, sun)(0));
      const work = () => {
        const near = blocksTowardSun(scene.blocks, sun, boxOfReceptors(affected), 0);
        const layer = createShadowCaster(near, sun)(0);
        for (const { receptor } of affected) scene.measures.light(receptor.area, layer);
        return near.blocks.length;
      };
      const looked = work();
      return { ms: milliseconds(work), affected: affected.length, looked };
    });
    return {
      blocks: input.blocks.features.length,
      affected: median(perSun.map((one) => one.affected)),
      looked: median(perSun.map((one) => one.looked)),
      medianMs: median(perSun.map(({ ms }) => ms)),
      worstMs: Math.max(...perSun.map(({ ms }) => ms)),
    };
  });
  return table(
    ['blocks', 'receptors reached', 'blocks looked at', 'median ms a sun', 'worst ms'],
    rows.map(({ blocks, affected, looked, medianMs, worstMs }) => [
      String(blocks),
      String(affected),
      String(looked),
      say(medianMs),
      say(worstMs),
    ]),
  );
}

/** The cost of a sun as more receptors are asked about. */
export function growthWithReceptors(input: StudyInput): string {
  const rows = [200, 400, 800, input.receptors.features.length].map((count) => {
    const { features } = input.receptors;
    const scene = buildScene({
      ...input,
      receptors: { ...input.receptors, features: features.slice(0, count) },
    });
    const times = sunsOf(input).map((sun) => {
      const layer = createShadowCaster(scene.blocks, sun)(0);
      return milliseconds(() => {
        for (const { area } of scene.receptors) scene.measures.light(area, layer);
      });
    });
    return [String(count), say(median(times)), say((1000 * median(times)) / count)];
  });
  return table(['receptors', 'median ms a sun', 'µs a receptor'], rows);
}

/** The cost of a whole study, polygons included, as it lists more instants. */
export async function growthWithInstants(clipper: Clipper, input: StudyInput): Promise<string> {
  const all = input.instants ?? [];
  const rows: string[][] = [];
  for (const every of [9, 3, 1]) {
    const instants = all.filter((_, index) => index % every === 0);
    const times: number[] = [];
    for (let round = 0; round < 3; round += 1) {
      const startedMs = performance.now();
      await computeStudy({ ...input, instants }, { clipper });
      times.push(performance.now() - startedMs);
    }
    rows.push([String(instants.length), say(median(times)), say(median(times) / instants.length)]);
  }
  return table(['instants', 'ms', 'ms an instant'], rows);
}

/** One sun of small towns, everything united by turf without pruning, beside the sweep. */
export function naiveGrowth(): string {
  const rows = [110, 200, 300, 400, 570].map((sideM) => {
    const input = makeTown(sideM);
    const scene = buildScene(input);
    const sun = sunPositionAt(
      Date.parse('2026-12-21T10:00:00-05:00'),
      input.place.longitude,
      input.place.latitude,
    );
    const layer = createShadowCaster(scene.blocks, sun)(0);
    const receptors = scene.receptors.map(({ area }) =>
      area.rings.map((ring) => [...ring, ...ring.slice(0, 1)].map(([x, y]) => [x, y])),
    );
    const sweep = () => {
      const cast = createShadowCaster(scene.blocks, sun)(0);
      for (const { area } of scene.receptors) scene.measures.light(area, cast);
    };
    const affected = affectedReceptors(scene, layer);
    const sweepReached = () => {
      const near = blocksTowardSun(scene.blocks, sun, boxOfReceptors(affected), 0);
      const cast = createShadowCaster(near, sun)(0);
      for (const { receptor } of affected) scene.measures.light(receptor.area, cast);
    };
    const medianMs = (work: () => void) => {
      for (let round = 0; round < 20; round += 1) work();
      return median(Array.from({ length: 9 }, () => milliseconds(work)));
    };
    const [sweepMs, reachedMs] = [medianMs(sweep), medianMs(sweepReached)];
    const { ms, threw } = byTurfWithoutPruning(layer, receptors);
    return [
      String(input.blocks.features.length),
      say(ms),
      say(sweepMs),
      say(ms / sweepMs),
      say(reachedMs),
      say(ms / reachedMs),
      `${threw} of ${receptors.length}`,
    ];
  });
  return table(
    [
      'blocks',
      'turf, unpruned, ms',
      'the sweep on every receptor, ms',
      'times',
      'on those that the proposal reaches, ms',
      'times',
      'receptors on which turf threw',
    ],
    rows,
  );
}

function sunsOf({ instants = [], place }: StudyInput) {
  return instants.map((at) => sunPositionAt(Date.parse(at), place.longitude, place.latitude));
}
