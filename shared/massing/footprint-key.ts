import type { MultiPolygon, Polygon, Position } from 'geojson';

/**
 * One text for one footprint, whatever corner its rings begin with, whichever way they run, and in whatever order
 * its holes and parts stand. Coordinates are compared to 7 decimals, about a centimetre.
 */
export function describeFootprint(geometry: Polygon | MultiPolygon): string {
  const parts = geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates;
  return parts
    .map(([outline = [], ...holes]) =>
      [describeRing(outline), ...holes.map(describeRing).toSorted()].join(' less '),
    )
    .toSorted()
    .join(' and ');
}

function describeRing(ring: readonly Position[]): string {
  const points = ring.map((position) => position.map((degrees) => degrees.toFixed(7)).join(','));
  if (points.length > 1 && points[0] === points.at(-1)) points.pop();
  const forward = startAtLeast(points).join(' ');
  const backward = startAtLeast(points.toReversed()).join(' ');
  return forward < backward ? forward : backward;
}

/** The same round, begun at its least point. */
function startAtLeast(points: readonly string[]): string[] {
  let least = 0;
  for (const [index, point] of points.entries()) {
    if (point < (points[least] ?? point)) least = index;
  }
  return [...points.slice(least), ...points.slice(0, least)];
}
