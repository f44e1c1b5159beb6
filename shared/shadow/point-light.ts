import { boxOfFlatRings } from '../geometry/flat-rings.ts';
import type { Box } from '../geometry/ring.ts';
import type { SamplePoints } from './sample-points.ts';
import { addEdgeToRuns, sumAlongRuns } from './sample-points.ts';
import { castContour } from './shadow-contours.ts';
import type { ShadowLayer, ShadowRole } from './shadow-layer.ts';
import { turnIntoFrame, turnOutOfFrame, type SunFrame } from './sun-frame.ts';

/** Whether each point is in sun at one instant: 1, or 0 in shade. */
export interface PointLight {
  before: Uint8Array;
  after: Uint8Array;
}

/**
 * Makes the sampler of a study; its calls share their scratch memory. A point is in shade where its
 * winding number under the shadows' contours is not 0, as for the areas of `receptor-light.ts`.
 */
export function createPointSampler() {
  let windings: Record<ShadowRole, Int32Array> = {
    context: new Int32Array(0),
    existing: new Int32Array(0),
    proposed: new Int32Array(0),
  };
  const contoursOf = createContourCache();
  return (points: SamplePoints, layer: ShadowLayer): PointLight => {
    const { count, runs, box } = points;
    if (windings.context.length < count) {
      windings = {
        context: new Int32Array(count * 2),
        existing: new Int32Array(count * 2),
        proposed: new Int32Array(count * 2),
      };
    }
    const { context, existing, proposed } = windings;
    for (const counts of [context, existing, proposed]) counts.fill(0, 0, count);
    for (const index of layer.near(boxInFrame(box, layer.frame))) {
      const role = layer.shadows[index]?.role ?? 'context';
      for (const contour of contoursOf(layer, index)) {
        addContour(points, windings[role], contour);
      }
    }
    for (const counts of [context, existing, proposed]) sumAlongRuns(runs, counts);
    const before = new Uint8Array(count);
    const after = new Uint8Array(count);
    for (let point = 0; point < count; point += 1) {
      if (context[point] !== 0) continue;
      if (existing[point] === 0) before[point] = 1;
      if (proposed[point] === 0) after[point] = 1;
    }
    return { before, after };
  };
}

export type PointSampler = ReturnType<typeof createPointSampler>;

function addContour({ runs }: SamplePoints, counts: Int32Array, contour: Float64Array): void {
  let x = contour[contour.length - 2] ?? NaN;
  let y = contour[contour.length - 1] ?? NaN;
  for (let index = 0; index + 1 < contour.length; index += 2) {
    const nextX = contour[index] ?? NaN;
    const nextY = contour[index + 1] ?? NaN;
    addEdgeToRuns(runs, counts, x, y, nextX, nextY);
    x = nextX;
    y = nextY;
  }
}

/** The contours of a layer's shadows on the local plane, each worked out once for all receptors. */
function createContourCache() {
  const known = new WeakMap<ShadowLayer, Map<number, Float64Array[]>>();
  return (layer: ShadowLayer, index: number): Float64Array[] => {
    const ofLayer = known.get(layer) ?? new Map<number, Float64Array[]>();
    known.set(layer, ofLayer);
    const shadow = layer.shadows[index];
    const contours =
      ofLayer.get(index) ??
      (shadow?.rings ?? []).map((ring) =>
        turnOutOfFrame(
          castContour(layer.points, ring, shadow?.nearShiftM ?? 0, shadow?.farShiftM ?? 0),
          layer.frame,
        ),
      );
    ofLayer.set(index, contours);
    return contours;
  };
}

/** The box in a sun's frame around a box of the local plane. */
function boxInFrame({ minX, minY, maxX, maxY }: Box, frame: SunFrame): Box {
  const corners = turnIntoFrame(
    Float64Array.of(minX, minY, maxX, minY, maxX, maxY, minX, maxY),
    frame,
  );
  return boxOfFlatRings(corners, [{ start: 0, end: corners.length }]);
}
