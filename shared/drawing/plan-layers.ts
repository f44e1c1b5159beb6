import type { Polygonal } from '../geometry/geojson-schema.ts';
import type { Frame } from './frame.ts';
import { hatchLines } from './hatch.ts';
import { palette } from './palette.ts';
import { closedPath, outlinePath, segmentsPath } from './path-data.ts';
import type { NamedArea } from './plan-labels.ts';
import type { Pen } from './plan-pens.ts';
import { element, group, type Svg } from './svg.ts';

interface Ground {
  streets: readonly NamedArea[];
  water: readonly NamedArea[];
  openSpace: readonly NamedArea[];
  parcels: readonly Polygonal[];
}

/** Streets, water, open space and lots. */
export function drawGround(content: Ground, frame: Frame, pen: Pen): Svg {
  const water = content.water.flatMap(({ geometry }) => frame.cutRings(geometry));
  return group({ 'data-part': 'ground' }, [
    areas('streets', content.streets.map(geometryOf), frame, { fill: palette.street }),
    // Water is ruled, because colour is kept for sun and shade.
    element('path', {
      'data-part': 'water',
      d: segmentsPath(hatchLines(water, pen.waterSpacing, 0)),
      fill: 'none',
      stroke: palette.hairline,
      'stroke-width': pen.parcel,
    }),
    element('path', {
      d: outlinePath(water, frame),
      fill: 'none',
      stroke: palette.buildingLine,
      'stroke-width': pen.building,
    }),
    outline('open-space', content.openSpace.map(geometryOf), frame, {
      stroke: palette.buildingLine,
      'stroke-width': pen.building,
      'stroke-dasharray': '1 2',
    }),
    outline('parcels', content.parcels, frame, {
      stroke: palette.hairline,
      'stroke-width': pen.parcel,
    }),
  ]);
}

/** The shadow that is there already, plain, and over it the net new shadow, hatched. */
export function drawShadows(
  shadows: { standing: Polygonal; netNew: Polygonal },
  frame: Frame,
  pen: Pen,
): Svg {
  const standing = frame.cutRings(shadows.standing);
  const netNew = frame.cutRings(shadows.netNew);
  return group({ 'data-part': 'shadows' }, [
    element('path', {
      'data-part': 'standing-shadow',
      d: closedPath(standing),
      'fill-rule': 'evenodd',
      fill: palette.shadow,
      'fill-opacity': 0.35,
    }),
    element('path', {
      d: outlinePath(standing, frame),
      fill: 'none',
      stroke: palette.shadow,
      'stroke-width': pen.shadowLine,
    }),
    element('path', {
      'data-part': 'net-new-shadow',
      d: closedPath(netNew),
      'fill-rule': 'evenodd',
      fill: palette.madder,
      'fill-opacity': 0.1,
    }),
    element('path', {
      'data-part': 'net-new-hatch',
      d: segmentsPath(hatchLines(netNew, pen.hatchSpacing, 45)),
      fill: 'none',
      stroke: palette.madder,
      'stroke-width': pen.hatch,
    }),
    element('path', {
      d: outlinePath(netNew, frame),
      fill: 'none',
      stroke: palette.madder,
      'stroke-width': pen.shadowLine * 0.8,
    }),
  ]);
}

/** Filled areas as one path. */
export function areas(
  part: string,
  geometries: readonly Polygonal[],
  frame: Frame,
  look: Record<string, string | number>,
): Svg {
  return element('path', {
    'data-part': part,
    d: closedPath(geometries.flatMap((geometry) => frame.cutRings(geometry))),
    'fill-rule': 'evenodd',
    ...look,
  });
}

/** Outlines as one path, open where the frame cuts them. */
export function outline(
  part: string,
  geometries: readonly Polygonal[],
  frame: Frame,
  look: Record<string, string | number>,
): Svg {
  return element('path', {
    'data-part': part,
    d: outlinePath(
      geometries.flatMap((geometry) => frame.cutRings(geometry)),
      frame,
    ),
    fill: 'none',
    stroke: palette.ink,
    ...look,
  });
}

function geometryOf(area: NamedArea): Polygonal {
  return area.geometry;
}
