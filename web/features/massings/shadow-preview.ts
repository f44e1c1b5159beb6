import { createLocalPlane } from '../../../shared/geometry/local-plane.ts';
import { projectPolygon } from '../../../shared/geometry/project-polygon.ts';
import { boxOfRings } from '../../../shared/geometry/ring.ts';
import type { PlanePoint, Ring } from '../../../shared/geometry/ring.ts';
import type { PlaneBlock } from '../../../shared/shadow/plane-block.ts';
import { castBlockContours } from '../../../shared/shadow/shadow-contours.ts';
import type { SunDirection } from '../../../shared/shadow/sun-frame.ts';
import { keyDatesOfYear, type KeyDate } from '../../../shared/solar/key-dates.ts';
import type { DrawnBlock } from './drawn-block.ts';

export interface PreviewBlock {
  role: DrawnBlock['role'];
  block: PlaneBlock;
}

/** The blocks on the plane around a place, in metres. */
export function planeBlocksOf(
  blocks: readonly DrawnBlock[],
  place: { longitude: number; latitude: number },
): PreviewBlock[] {
  const plane = createLocalPlane(place.longitude, place.latitude);
  return blocks.flatMap(({ role, geometry, baseM, topM }) => {
    const rings = projectPolygon(geometry, plane);
    return rings.length === 0
      ? []
      : [{ role, block: { rings, box: boxOfRings(rings), baseM, topM } }];
  });
}

/** The raw shadow contours on level ground of the blocks of one role; their NonZero fill is the shadow. */
export function shadowContours(
  blocks: readonly PreviewBlock[],
  role: DrawnBlock['role'],
  sun: SunDirection,
): Ring[] {
  return blocks
    .filter((one) => one.role === role)
    .flatMap(({ block }) => castBlockContours(block, sun, 0));
}

/** Closed SVG path data of contours; to be filled by the NonZero rule. */
export function contoursPath(
  contours: readonly Ring[],
  toSheet: (point: PlanePoint) => readonly [number, number],
): string {
  return contours
    .filter((ring) => ring.length > 2)
    .map((ring) => {
      const points = ring.map((point) => {
        const [x, y] = toSheet(point);
        return `${x.toFixed(1)} ${y.toFixed(1)}`;
      });
      return `M${points.join('L')}Z`;
    })
    .join('');
}

/** The next four key dates from a civil day on, the nearest first. */
export function nextKeyDates(today: string, timeZone: string): KeyDate[] {
  const year = Number(today.slice(0, 4));
  return [...keyDatesOfYear(year, timeZone), ...keyDatesOfYear(year + 1, timeZone)]
    .filter(({ date }) => date >= today)
    .slice(0, 4);
}
