import { boxOfRings, orientRing, type Ring } from '../../shared/geometry/ring.ts';
import type { SceneBlock, ShadowRole } from '../../shared/shadow/shadow-layer.ts';

/** A rectangle from its lower left corner, turned about that corner, counter-clockwise. */
export function makeRectangle(
  x: number,
  y: number,
  widthM: number,
  depthM: number,
  turnDeg = 0,
): Ring {
  const turn = (turnDeg * Math.PI) / 180;
  const corners = [
    [0, 0],
    [widthM, 0],
    [widthM, depthM],
    [0, depthM],
  ] as const;
  return corners.map(([u, v]) => [
    x + u * Math.cos(turn) - v * Math.sin(turn),
    y + u * Math.sin(turn) + v * Math.cos(turn),
  ]);
}

/** A prism on the plane; the first ring is the shell, the others are courtyards. */
export function makeBlock(
  rings: Ring[],
  baseM: number,
  topM: number,
  role: ShadowRole = 'proposed',
): SceneBlock {
  const oriented = rings.map((ring, index) => orientRing(ring, index === 0 ? 'outer' : 'hole'));
  return { rings: oriented, box: boxOfRings(oriented), baseM, topM, role };
}

/**
 * Blocks of a random town on 300 m × 300 m: courtyards, overhangs, party walls, duplicates, corners
 * snapped to metres and turned ones, in all three roles.
 */
export function makeRandomTown(random: () => number, count: number): SceneBlock[] {
  const roles: ShadowRole[] = ['context', 'context', 'context', 'existing', 'proposed'];
  const blocks: SceneBlock[] = [];
  for (let index = 0; index < count; index += 1) {
    const isSnapped = random() < 0.5;
    const snap = (value: number) => (isSnapped ? Math.round(value) : value);
    const x = snap(random() * 300 - 150);
    const y = snap(random() * 300 - 150);
    const widthM = snap(4 + random() * 25);
    const depthM = snap(4 + random() * 25);
    const rings = [makeRectangle(x, y, widthM, depthM, isSnapped ? 0 : random() * 360)];
    if (isSnapped && widthM > 14 && depthM > 14) {
      rings.push(makeRectangle(x + 4, y + 4, widthM - 8, depthM - 8));
    }
    const baseM = random() < 0.2 ? random() * 6 : 0;
    const topM = baseM + 2 + random() * (random() < 0.1 ? 60 : 12);
    const role = roles[Math.floor(random() * roles.length)] ?? 'context';
    blocks.push(makeBlock(rings, baseM, topM, role));
    if (random() < 0.1) blocks.push(makeBlock(rings, baseM, topM, role));
    if (random() < 0.2) {
      blocks.push(makeBlock([makeRectangle(x + widthM, y, 8, depthM)], 0, topM, role));
    }
  }
  return blocks;
}
