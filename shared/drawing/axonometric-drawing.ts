import type { Polygonal } from '../geometry/geojson-schema.ts';
import { createLocalPlane } from '../geometry/local-plane.ts';
import { projectPolygon } from '../geometry/project-polygon.ts';
import { createPicture, listFaces, type Face, type Prism, type View } from './axonometric-faces.ts';
import type { FigureFormat } from './figure-format.ts';
import type { SheetPoint } from './frame.ts';
import { boxAround } from './label-placement.ts';
import { palette } from './palette.ts';
import { closedPath, segmentsPath } from './path-data.ts';
import { element, svgDocument, type Svg } from './svg.ts';
import { estimateTextWidth } from './text-width.ts';

export interface AxonometricBlock {
  geometry: Polygonal;
  baseM: number;
  topM: number;
  /** What stands around the site is drawn lighter and carries no heights. */
  role: 'context' | 'proposed';
}

export interface AxonometricOptions {
  /** Centre of the local plane. */
  origin: { longitude: number; latitude: number };
  width: number;
  height: number;
  view: View;
  /** What the drawing shows, for people who cannot see it. */
  label: string;
  figures: FigureFormat;
}

/**
 * Draws blocks as seen from above with parallel rays: lengths along each direction keep one scale,
 * hidden faces are hidden.
 *
 * @param ground drawn flat: the site's parcels, and hairlines of the lots around
 * @returns an SVG document; the same input gives the same text
 */
export function drawAxonometric(
  blocks: readonly AxonometricBlock[],
  ground: { site: readonly Polygonal[]; parcels: readonly Polygonal[] },
  options: AxonometricOptions,
): string {
  const plane = createLocalPlane(options.origin.longitude, options.origin.latitude);
  const prisms: Prism[] = blocks.map(({ geometry, baseM, topM }) => ({
    rings: projectPolygon(geometry, plane),
    baseM,
    topM,
  }));
  const picture = createPicture(options.view);
  const onGround = (geometries: readonly Polygonal[]) =>
    geometries.flatMap((geometry) =>
      projectPolygon(geometry, plane).map((ring) => ring.map(([x, y]) => picture(x, y, 0))),
    );
  const site = onGround(ground.site);
  const faces = listFaces(prisms, options.view);
  const fit = fitInto(
    [...site, ...faces.flatMap((face) => face.rings)].flat(),
    options.width,
    options.height,
  );
  const proposed = blocks.flatMap((block, index) => (block.role === 'proposed' ? [index] : []));

  return svgDocument({ width: options.width, height: options.height }, options.label, [
    element('path', {
      'data-part': 'parcels',
      d: closedPath(onGround(ground.parcels).map((ring) => ring.map(fit.place))),
      fill: 'none',
      stroke: palette.hairline,
      'stroke-width': 0.4,
    }),
    element('path', {
      'data-part': 'site',
      d: closedPath(site.map((ring) => ring.map(fit.place))),
      fill: 'none',
      stroke: palette.ink,
      'stroke-width': 1,
      'stroke-dasharray': '8 2.5 2 2.5',
    }),
    ...faces.flatMap((face) => drawFace(face, blocks[face.prism]?.role ?? 'context', fit.place)),
    ...drawHeights(proposed, faces, blocks, options.figures, fit.place),
    drawGroundNorth(options.view, [26, options.height - 24]),
  ]);
}

/** Walls turned to the viewer's right are darker, so that corners read without colour. */
function drawFace(
  face: Face,
  role: AxonometricBlock['role'],
  place: (point: SheetPoint) => SheetPoint,
): Svg[] {
  const tones =
    role === 'proposed'
      ? { roof: '#FFFFFF', left: '#F1EDE2', right: '#DAD5C8', line: palette.ink, width: 1 }
      : { roof: '#F1ECE0', left: '#E6E0D2', right: '#D6D0C1', line: '#8F8C84', width: 0.4 };
  const fill = face.kind === 'roof' ? tones.roof : face.facesRight > 0 ? tones.right : tones.left;
  return [
    element('path', {
      'data-part': `${role}-${face.kind}`,
      d: closedPath(face.rings.map((ring) => ring.map(place))),
      'fill-rule': 'evenodd',
      fill,
    }),
    element('path', {
      d: segmentsPath(face.edges.map(([from, to]) => [place(from), place(to)] as const)),
      fill: 'none',
      stroke: tones.line,
      'stroke-width': tones.width,
      'stroke-linejoin': 'round',
      'stroke-linecap': 'round',
    }),
  ];
}

/** Each proposed block's top height at the end of a short line from its leftmost roof corner. */
function drawHeights(
  proposed: readonly number[],
  faces: readonly Face[],
  blocks: readonly AxonometricBlock[],
  figures: FigureFormat,
  place: (point: SheetPoint) => SheetPoint,
): Svg[] {
  const fontSize = 9;
  const lines = proposed.flatMap((prism) => {
    const roof = faces.find((face) => face.prism === prism && face.kind === 'roof');
    const corner = roof?.rings
      .flat()
      .map(place)
      .reduce((left, point) => (point[0] < left[0] ? point : left));
    const topM = blocks[prism]?.topM;
    return corner === undefined || topM === undefined ? [] : [{ corner, topM }];
  });
  lines.sort((a, b) => a.corner[1] - b.corner[1]);
  const usedY: number[] = [];
  return lines.map(({ corner, topM }) => {
    let y = corner[1];
    while (usedY.some((used) => Math.abs(used - y) < fontSize * 1.3)) y += fontSize * 1.3;
    usedY.push(y);
    const text = figures.height(topM);
    const endX = Math.max(corner[0] - 16, estimateTextWidth(text, fontSize) + 6);
    return element(
      'g',
      { 'data-part': 'height' },
      element('path', {
        d: segmentsPath([[corner, [endX, y]]]),
        fill: 'none',
        stroke: palette.ink,
        'stroke-width': 0.6,
      }),
      element('rect', {
        x: endX - 5 - estimateTextWidth(text, fontSize),
        y: y - fontSize * 0.65,
        width: estimateTextWidth(text, fontSize) + 4,
        height: fontSize * 1.3,
        fill: '#FFFFFF',
        'fill-opacity': 0.85,
      }),
      element(
        'text',
        {
          x: endX - 3,
          y: y + fontSize * 0.36,
          'font-size': fontSize,
          'text-anchor': 'end',
          fill: palette.ink,
        },
        text,
      ),
    );
  });
}

/** True north as it lies on the ground in this view. */
function drawGroundNorth(view: View, foot: SheetPoint): Svg {
  const picture = createPicture(view);
  const length = 24;
  const tip = picture(0, length, 0);
  const center: SheetPoint = [foot[0], foot[1] - 8];
  const [x, y]: SheetPoint = [center[0] + tip[0] / 2, center[1] + tip[1] / 2];
  const start: SheetPoint = [center[0] - tip[0] / 2, center[1] - tip[1] / 2];
  const side = picture(length * 0.18, 0, 0);
  return element(
    'g',
    { 'data-part': 'true-north' },
    element('path', {
      d: segmentsPath([
        [start, [x, y]],
        [
          [center[0] - side[0], center[1] - side[1]],
          [center[0] + side[0], center[1] + side[1]],
        ],
      ]),
      fill: 'none',
      stroke: palette.ink,
      'stroke-width': 0.9,
    }),
    element(
      'text',
      { x, y: y - 4, 'font-size': 7.5, 'text-anchor': 'middle', fill: palette.ink },
      'true north',
    ),
  );
}

function fitInto(
  points: readonly SheetPoint[],
  width: number,
  height: number,
): { place: (point: SheetPoint) => SheetPoint } {
  const around = boxAround([points]);
  const margin = { left: 64, right: 10, top: 10, bottom: 10 };
  const scale = Math.min(
    (width - margin.left - margin.right) / around.width,
    (height - margin.top - margin.bottom) / around.height,
  );
  const left = margin.left + (width - margin.left - margin.right - around.width * scale) / 2;
  const top = margin.top + (height - margin.top - margin.bottom - around.height * scale) / 2;
  return {
    place: ([x, y]) => [left + (x - around.x) * scale, top + (y - around.y) * scale],
  };
}
