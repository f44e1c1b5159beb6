import { execFileSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import * as turf from '@turf/turf';
import type { Feature, MultiPolygon, Polygon, Position } from 'geojson';
import polygonClipping from 'polygon-clipping';
import { z } from 'zod';
import { signedRingArea, type Ring } from '../../shared/geometry/ring.ts';
import { combineRings } from '../../shared/shadow/clipper-paths.ts';
import type { Clipper } from '../../shared/shadow/clipper.ts';
import { castContour, pointsOfRing } from '../../shared/shadow/shadow-contours.ts';
import type { BlockShadow, ShadowLayer, ShadowRole } from '../../shared/shadow/shadow-layer.ts';
import { pointFromFrame } from '../../shared/shadow/sun-frame.ts';
import type { AffectedReceptor } from './affected-receptors.ts';
import { milliseconds } from './measuring.ts';

type Coordinates = MultiPolygon['coordinates'];

/** One receptor and the shadows near it as polygons, ready for a polygon library. */
export interface ReceptorTask {
  receptor: Polygon['coordinates'];
  shadows: Record<ShadowRole, Coordinates[]>;
}

/** Area before, after and net new of each receptor, in m²; null where the library threw. */
export type TaskAreas = ([number, number, number] | null)[];

/** The work of one sun: what each library is then timed with. The shadow of each block is made for it. */
export function prepareTasks(
  clipper: Clipper,
  layer: ShadowLayer,
  affected: readonly AffectedReceptor[],
): ReceptorTask[] {
  const made = new Map<number, Coordinates>();
  const shadowAt = (index: number, shadow: BlockShadow) => {
    const polygons = made.get(index) ?? polygonsOfShadow(clipper, layer, shadow);
    made.set(index, polygons);
    return polygons;
  };
  return affected.map(({ receptor, shadows }) => {
    const near: ReceptorTask['shadows'] = { context: [], existing: [], proposed: [] };
    for (const index of shadows) {
      const shadow = layer.shadows[index];
      if (shadow !== undefined) near[shadow.role].push(shadowAt(index, shadow));
    }
    return { receptor: receptor.area.rings.map(closed), shadows: near };
  });
}

/** By polygon-clipping: difference for before and after, and once more for net new. */
export function byPolygonClipping(tasks: readonly ReceptorTask[]): TaskAreas {
  return tasks.map(({ receptor, shadows }) => {
    try {
      const before = polygonClipping.difference(
        [pairs(receptor)],
        ...[...shadows.context, ...shadows.existing].map((one) => one.map(pairs)),
      );
      const after = polygonClipping.difference(
        [pairs(receptor)],
        ...[...shadows.context, ...shadows.proposed].map((one) => one.map(pairs)),
      );
      const netNew = polygonClipping.difference(before, after);
      return [areaOf(before), areaOf(after), areaOf(netNew)];
    } catch {
      return null;
    }
  });
}

/** By turf, whose clipping is polyclip-ts. */
export function byTurf(tasks: readonly ReceptorTask[]): TaskAreas {
  return tasks.map(({ receptor, shadows }) => {
    try {
      const lit = (roles: ShadowRole[]) => {
        const shade = roles.flatMap((role) => shadows[role]).map((one) => turf.multiPolygon(one));
        return turf.difference(
          turf.featureCollection<Polygon | MultiPolygon>([turf.polygon(receptor), ...shade]),
        );
      };
      const before = lit(['context', 'existing']);
      const after = lit(['context', 'proposed']);
      return [areaOfFeature(before), areaOfFeature(after), areaOfFeature(less(before, after))];
    } catch {
      return null;
    }
  });
}

/**
 * The naive way, all of it by turf: each block's shadow as the union of its roof, its floor and a
 * quad for every wall, all shadows of the town united, and every receptor less the union.
 *
 * @returns the time, and on how many receptors it threw
 */
export function byTurfWithoutPruning(
  layer: ShadowLayer,
  receptors: readonly Polygon['coordinates'][],
): { ms: number; threw: number } {
  let threw = 0;
  const ms = milliseconds(() => {
    try {
      const shadows = layer.shadows.map((shadow) => ({
        role: shadow.role,
        feature: unionOfWalls(layer, shadow),
      }));
      const unionWithout = (left: ShadowRole) =>
        turf.union(
          turf.featureCollection(
            shadows.flatMap(({ role, feature }) =>
              role === left || feature === null ? [] : [feature],
            ),
          ),
        );
      const [shadeBefore, shadeAfter] = [unionWithout('proposed'), unionWithout('existing')];
      for (const receptor of receptors) {
        try {
          const before = less(turf.polygon(receptor), shadeBefore);
          const after = less(turf.polygon(receptor), shadeAfter);
          areaOfFeature(less(before, after));
        } catch {
          threw += 1;
        }
      }
    } catch {
      // Without the union there is no answer on any of them.
      threw = receptors.length;
    }
  });
  return { ms, threw };
}

function unionOfWalls(
  { points, frame }: ShadowLayer,
  { rings, nearShiftM, farShiftM }: BlockShadow,
): Areal {
  const at = (index: number, shiftM: number) =>
    pointFromFrame((points[index] ?? NaN) + shiftM, points[index + 1] ?? NaN, frame);
  const cap = (shiftM: number) =>
    turf.polygon(
      rings.map(({ start, end }) => {
        const ring: Ring[number][] = [];
        for (let index = start; index < end; index += 2) ring.push(at(index, shiftM));
        return closed(ring);
      }),
    );
  const walls = rings.flatMap(({ start, end }) => {
    const quads: Feature<Polygon>[] = [];
    for (let index = start; index < end; index += 2) {
      const next = index + 2 < end ? index + 2 : start;
      const quad = [
        at(index, nearShiftM),
        at(next, nearShiftM),
        at(next, farShiftM),
        at(index, farShiftM),
      ];
      quads.push(turf.polygon([closed(quad)]));
    }
    return quads;
  });
  return turf.union(turf.featureCollection([cap(nearShiftM), cap(farShiftM), ...walls]));
}

const shapelyAnswerSchema = z.object({
  version: z.string(),
  milliseconds: z.array(z.number()),
  areas: z.array(z.array(z.tuple([z.number(), z.number(), z.number()]))),
});

/** By GEOS through shapely in a process of its own, which times itself; null where it is not installed. */
export function byShapely(suns: readonly (readonly ReceptorTask[])[]) {
  const script = fileURLToPath(new URL('shapely-pipeline.py', import.meta.url));
  try {
    const answer = execFileSync('/usr/bin/python3', [script], {
      input: JSON.stringify(suns),
      maxBuffer: 1 << 30,
      stdio: ['pipe', 'pipe', 'ignore'],
    });
    return shapelyAnswerSchema.parse(JSON.parse(answer.toString()));
  } catch {
    return null;
  }
}

function polygonsOfShadow(
  clipper: Clipper,
  { points, frame }: ShadowLayer,
  { rings, nearShiftM, farShiftM }: BlockShadow,
): Coordinates {
  const contours = rings.map((ring) => castContour(points, ring, nearShiftM, farShiftM));
  return combineRings(clipper, 'Union', contours).map((polygon) =>
    polygon.map((ring) => closed(pointsOfRing(ring, (x, y) => pointFromFrame(x, y, frame)))),
  );
}

type Areal = Feature<Polygon | MultiPolygon> | null;

function less(from: Areal, shade: Areal): Areal {
  if (from === null || shade === null) return from;
  return turf.difference(turf.featureCollection([from, shade]));
}

function areaOfFeature(feature: Areal): number {
  if (feature === null) return 0;
  const { geometry } = feature;
  return areaOf(
    (geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates).map(pairs),
  );
}

function areaOf(polygons: [number, number][][][]): number {
  return polygons
    .flatMap((rings) =>
      rings.map((ring, index) => (index === 0 ? 1 : -1) * Math.abs(signedRingArea(ring))),
    )
    .reduce((sum, areaM2) => sum + areaM2, 0);
}

function closed(ring: Ring): Position[] {
  return [...ring, ...ring.slice(0, 1)].map(([x, y]) => [x, y]);
}

function pairs(rings: readonly Position[][]): [number, number][][] {
  return rings.map((ring) => ring.map(([x = NaN, y = NaN]) => [x, y]));
}
