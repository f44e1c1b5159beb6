import type { MultiPolygon } from 'geojson';
import type { PlanePoint, Ring } from '../../../shared/geometry/ring.ts';
import type { SceneBlock } from '../../../shared/shadow/shadow-layer.ts';
import { multiPolygonOf, type SecondOpinion } from '../../support/second-opinion.ts';

// Shadows in ways that share nothing with the engine: no contours, no turned frame, no pruning.

/** Metres that a shadow's tip moves along x and y for each metre of height. */
export interface Along {
  x: number;
  y: number;
}

export function alongOf(sun: { azimuthDeg: number; altitudeDeg: number }): Along {
  const length = 1 / Math.tan((sun.altitudeDeg / 180) * Math.PI);
  const fromSun = ((sun.azimuthDeg + 180) / 180) * Math.PI;
  return { x: length * Math.sin(fromSun), y: length * Math.cos(fromSun) };
}

/** Whether the ray from a point of a plane to the sun meets a block, by all its walls. */
export function isShadedByRay(
  point: PlanePoint,
  planeM: number,
  block: SceneBlock,
  along: Along,
): boolean {
  const low = Math.max(block.baseM - planeM, 0);
  const high = block.topM - planeM;
  if (high <= 0) return false;
  // Towards the sun the ray passes above (x − along·h, y − along·h) at height h.
  const heights = [low, high];
  for (const ring of block.rings) {
    ring.forEach((from, index) => {
      const to = ring[(index + 1) % ring.length] ?? from;
      const edgeX = to[0] - from[0];
      const edgeY = to[1] - from[1];
      const cross = -along.x * edgeY + along.y * edgeX;
      if (cross === 0) return;
      const toX = from[0] - point[0];
      const toY = from[1] - point[1];
      const height = (toX * edgeY - toY * edgeX) / cross;
      const share = (toX * -along.y - toY * -along.x) / cross;
      if (share >= 0 && share <= 1) heights.push(height);
    });
  }
  const cuts = heights.filter((height) => height >= low && height <= high).sort((a, b) => a - b);
  return cuts.slice(1).some((top, index) => {
    const middle = (top + (cuts[index] ?? top)) / 2;
    return isInside([point[0] - along.x * middle, point[1] - along.y * middle], block.rings);
  });
}

/** Even-odd crossing test. */
function isInside([x, y]: PlanePoint, rings: readonly Ring[]): boolean {
  let inside = false;
  for (const ring of rings) {
    ring.forEach((a, index) => {
      const b = ring[(index + 1) % ring.length] ?? a;
      if (a[1] > y !== b[1] > y && x < ((b[0] - a[0]) * (y - a[1])) / (b[1] - a[1]) + a[0]) {
        inside = !inside;
      }
    });
  }
  return inside;
}

/** The shadow of a block on the plane at 0 as the union of its walls' quads and its two caps. */
export function shadowByQuads(geos: SecondOpinion, block: SceneBlock, along: Along): MultiPolygon {
  const nearM = Math.max(block.baseM, 0);
  const move = ([x, y]: PlanePoint, heightM: number): PlanePoint => [
    x + along.x * heightM,
    y + along.y * heightM,
  ];
  const cap = (heightM: number) =>
    capOf(
      geos,
      block.rings.map((ring) => ring.map((point) => move(point, heightM))),
    );
  const quads = block.rings.flatMap((ring) =>
    ring.flatMap((from, index) => {
      const to = ring[(index + 1) % ring.length] ?? from;
      const quad = [
        move(from, nearM),
        move(to, nearM),
        move(to, block.topM),
        move(from, block.topM),
      ];
      // A wall in line with the sun throws none.
      return Math.abs(doubledArea(quad)) < 1e-12 ? [] : [multiPolygonOf([quad])];
    }),
  );
  return geos.union([cap(nearM), cap(block.topM), ...quads]);
}

/** The shell less each of its courtyards, which may touch it. */
function capOf(geos: SecondOpinion, [shell = [], ...holes]: readonly Ring[]): MultiPolygon {
  return holes.reduce(
    (rest, hole) => geos.difference(rest, multiPolygonOf([hole])),
    multiPolygonOf([shell]),
  );
}

function doubledArea(ring: Ring): number {
  return ring.reduce((sum, [x, y], index) => {
    const [nextX, nextY] = ring[(index + 1) % ring.length] ?? [x, y];
    return sum + x * nextY - nextX * y;
  }, 0);
}
