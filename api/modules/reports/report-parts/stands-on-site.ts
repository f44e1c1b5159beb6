import { boxAround, isInside } from '../../../../shared/drawing/label-placement.ts';
import type { Polygonal } from '../../../../shared/geometry/geojson-schema.ts';
import { polygonsOf } from '../../../../shared/geometry/project-polygon.ts';

/** Sample points along each side of the box around a building. */
const samples = 12;

/**
 * Whether a building belongs to the site: more than half of its footprint lies in it. Sampled on a
 * grid, for drawing alone; the study decides by exact areas.
 */
export function standsOnSite(building: Polygonal, site: Polygonal): boolean {
  const footprint = polygonsOf(building).flat();
  const ground = polygonsOf(site).flat();
  const box = boxAround(footprint);
  let inBuilding = 0;
  let inBoth = 0;
  for (let row = 0; row < samples; row += 1) {
    for (let column = 0; column < samples; column += 1) {
      const point = [
        box.x + (box.width * (column + 0.5)) / samples,
        box.y + (box.height * (row + 0.5)) / samples,
      ] as const;
      if (!isInside(point, footprint)) continue;
      inBuilding += 1;
      if (isInside(point, ground)) inBoth += 1;
    }
  }
  return inBoth > inBuilding / 2;
}
