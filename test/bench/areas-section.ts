import { blocksTowardSun } from '../../shared/shadow/blocks-toward-sun.ts';
import type { Clipper } from '../../shared/shadow/clipper.ts';
import { createShadowCaster } from '../../shared/shadow/shadow-layer.ts';
import { sunPositionAt } from '../../shared/solar/sun-position.ts';
import type { StudyInput } from '../../shared/study/evidence-schema.ts';
import { buildScene } from '../../shared/study/scene.ts';
import { affectedReceptors, boxOfReceptors } from './affected-receptors.ts';
import { median, milliseconds, say, table } from './measuring.ts';
import {
  byPolygonClipping,
  byShapely,
  byTurf,
  prepareTasks,
  type TaskAreas,
} from './polygon-pipelines.ts';

interface Way {
  name: string;
  /** For each sun. */
  timesMs: number[];
  areas: TaskAreas[];
}

/**
 * Before, after and net new on every receptor that the proposal can reach, at each sun: the sweep
 * beside polygon libraries, all of them pruned to the shadows near each receptor.
 */
export function compareAreas(clipper: Clipper, input: StudyInput): string {
  const scene = buildScene(input);
  const suns = (input.instants ?? []).map((at) =>
    sunPositionAt(Date.parse(at), input.place.longitude, input.place.latitude),
  );
  const work = suns.map((sun) => {
    const layer = createShadowCaster(scene.blocks, sun)(0);
    const affected = affectedReceptors(scene, layer);
    return { sun, affected, tasks: prepareTasks(clipper, layer, affected) };
  });
  const tasks = work.map((one) => one.tasks);

  const sweep: Way = { name: 'the sweep', timesMs: [], areas: [] };
  // Twice, so that the second time is not that of the compiler.
  for (let round = 0; round < 2; round += 1) {
    sweep.timesMs = [];
    sweep.areas = work.map(({ sun, affected }) => {
      const areas: TaskAreas = [];
      sweep.timesMs.push(
        milliseconds(() => {
          const near = blocksTowardSun(scene.blocks, sun, boxOfReceptors(affected), 0);
          const layer = createShadowCaster(near, sun)(0);
          for (const { receptor } of affected) {
            const light = scene.measures.light(receptor.area, layer);
            areas.push([light.sunBeforeM2, light.sunAfterM2, light.netNewM2]);
          }
        }),
      );
      return areas;
    });
  }
  const ways = [
    sweep,
    timed('polygon-clipping 0.15.7', tasks, byPolygonClipping),
    timed('turf 7.4.0', tasks, byTurf),
  ];
  const shapely = byShapely(tasks);
  if (shapely !== null) {
    const name = `GEOS ${shapely.version} by shapely`;
    ways.push({ name, timesMs: shapely.milliseconds, areas: shapely.areas });
  }
  const affectedCount = median(work.map(({ affected }) => affected.length));
  const total = ({ timesMs }: Way) => timesMs.reduce((sum, ms) => sum + ms, 0);
  return [
    `${suns.length} suns; ${affectedCount} receptors at the median sun. The libraries are given the shadow of each block ready-made, on Clipper2’s grid of 0.01 mm, which is what GEOS differs by.`,
    '',
    table(
      [
        'way',
        'median ms a sun',
        'worst ms',
        'all suns, ms',
        'times the sweep',
        'threw',
        'largest difference, m²',
      ],
      ways.map((way) => [
        way.name,
        say(median(way.timesMs)),
        say(Math.max(...way.timesMs)),
        say(total(way)),
        way === sweep ? '1' : say(total(way) / total(sweep)),
        String(way.areas.flat().filter((areas) => areas === null).length),
        way === sweep ? '' : say(largestDifference(sweep.areas, way.areas)),
      ]),
    ),
    '',
    ...(shapely === null ? ['shapely is not installed here (Debian: python3-shapely).', ''] : []),
  ].join('\n');
}

function timed(
  name: string,
  suns: readonly (readonly Parameters<typeof byTurf>[0][number][])[],
  compute: (tasks: Parameters<typeof byTurf>[0]) => TaskAreas,
): Way {
  const way: Way = { name, timesMs: [], areas: [] };
  for (const tasks of suns) {
    way.timesMs.push(milliseconds(() => way.areas.push(compute(tasks))));
  }
  return way;
}

function largestDifference(one: readonly TaskAreas[], other: readonly TaskAreas[]): number {
  let largest = 0;
  one.forEach((receptors, sun) => {
    receptors.forEach((areas, receptor) => {
      const others = other[sun]?.[receptor];
      if (areas === null || others === null || others === undefined) return;
      areas.forEach((areaM2, index) => {
        largest = Math.max(largest, Math.abs(areaM2 - (others[index] ?? NaN)));
      });
    });
  });
  return largest;
}
