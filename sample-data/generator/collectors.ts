import type { Building } from './building.ts';
import type { Random } from './random.ts';
import {
  add,
  centroidOf,
  distance,
  fitsInside,
  leftOf,
  minus,
  shapeOf,
  sidesOf,
  times,
  unit,
  type Point,
  type Shape,
} from './shape.ts';

export interface Collector {
  id: string;
  building: string;
  parcel: string;
  planeM: number;
  /** 0 lies flat. */
  tiltDeg: number;
  /** The way the plane faces, clockwise from true north. */
  facingDeg: number;
  shape: Shape;
}

const collectorCount = 20;

/** The outward direction of a building's sides that looks most to the south. */
function mostSouthern(shape: Shape): Point {
  const outward = sidesOf(shape.outer)
    .filter(([a, b]) => distance(a, b) > 4)
    .map(([a, b]) => times(leftOf(unit(minus(b, a))), -1));
  return outward.reduce((best, one) => (one[1] < best[1] ? one : best), [0, 1]);
}

const azimuthOf = (direction: Point): number =>
  Math.round((Math.atan2(direction[0], direction[1]) * 180) / Math.PI + 360) % 360;

/** Solar collectors on roofs all over town, each a rectangle within its roof. */
export function placeCollectors(buildings: readonly Building[], random: Random): Collector[] {
  const roofs = buildings.filter(
    (building) => building.kind !== 'garage' && building.baseM === 0 && building.topM > 4.9,
  );
  const everyNth = Math.floor(roofs.length / (collectorCount + 3));
  const collectors: Collector[] = [];
  for (
    let index = 5;
    index < roofs.length && collectors.length < collectorCount;
    index += everyNth
  ) {
    const roof = roofs[index];
    if (!roof) continue;
    const south = mostSouthern(roof.shape);
    const along = leftOf(south);
    const middle = add(centroidOf(roof.shape), times(south, 1.4));
    const halfWidthM = random.between(2.2, 3.2);
    const halfDepthM = random.between(1.2, 1.7);
    const corner = (a: number, b: number): Point =>
      add(middle, add(times(along, a), times(south, b)));
    const shape = shapeOf([
      corner(-halfWidthM, -halfDepthM),
      corner(halfWidthM, -halfDepthM),
      corner(halfWidthM, halfDepthM),
      corner(-halfWidthM, halfDepthM),
    ]);
    if (!fitsInside(shape, roof.shape, 0.4)) {
      index -= everyNth - 1;
      continue;
    }
    const isFlatRoof = roof.kind !== 'house';
    collectors.push({
      id: `S-${String(collectors.length + 1).padStart(2, '0')}`,
      building: roof.id,
      parcel: roof.parcel,
      planeM: roof.topM,
      tiltDeg: isFlatRoof ? 10 : random.pick([30, 35, 40]),
      facingDeg: azimuthOf(south),
      shape,
    });
  }
  return collectors;
}
