import type { Polygonal } from '../geometry/geojson-schema.ts';
import { createLocalPlane } from '../geometry/local-plane.ts';
import type { FigureFormat } from './figure-format.ts';
import {
  createFrame,
  extentOnPlane,
  type Frame,
  type SheetPoint,
  type SheetRing,
} from './frame.ts';
import { drawNorth, drawScaleBar } from './north-and-scale.ts';
import { palette } from './palette.ts';
import { closedPath, outlinePath } from './path-data.ts';
import { drawAreaNames, drawBlockHeights, drawKeys, type NamedArea } from './plan-labels.ts';
import { areas, drawGround, drawShadows, outline } from './plan-layers.ts';
import { sheetPen, sheetUnit, smallPen } from './plan-pens.ts';
import { drawStreetNames, type StreetLine } from './street-names.ts';
import { element, svgDocument, type Svg } from './svg.ts';
import { drawTitleBlock, measureTitleBlock } from './title-block.ts';

/** What a plan shows; longitude and latitude throughout. Parts that are not wanted are left empty. */
export interface PlanContent {
  streets: readonly NamedArea[];
  streetLines: readonly StreetLine[];
  water: readonly NamedArea[];
  openSpace: readonly NamedArea[];
  parcels: readonly Polygonal[];
  /** What stands around the site. */
  buildings: readonly Polygonal[];
  /** The site's parcels. */
  site: readonly Polygonal[];
  /** What stands on the site and is removed by the proposal. */
  removed: readonly Polygonal[];
  proposal: readonly { geometry: Polygonal; topM: number }[];
  /** The shadow that is there without the proposal, and the shadow that only the proposal casts. */
  shadows: { standing: Polygonal; netNew: Polygonal } | null;
  /** The receptor that the reader has picked. */
  chosen: Polygonal | null;
  /** Receptors that don't meet a clause, each with its mark in a list; not drawn in a `small` plan. */
  notMet: readonly { geometry: Polygonal; mark: string }[];
}

export interface PlanOptions {
  /** Centre of the local plane. */
  origin: { longitude: number; latitude: number };
  /** West, south, east, north in degrees. */
  extent: readonly [number, number, number, number];
  /** px on screen, points on paper; the height follows. */
  width: number;
  /** What the drawing shows, for people who cannot see it. */
  label: string;
  figures: FigureFormat;
  /**
   * `sheet`: names, heights, true north, scale bar, title block;
   * `keyed`: of these the marks of receptors alone, where the rest stands beside the plan;
   * `small`: the drawing alone, in finer lines.
   */
  detail: 'sheet' | 'keyed' | 'small';
  /** Rows of the title block; empty for none. */
  titleBlock: readonly (readonly [string, string])[];
}

/** A plan with nothing on it, to be filled. */
export const emptyPlan: PlanContent = {
  streets: [],
  streetLines: [],
  water: [],
  openSpace: [],
  parcels: [],
  buildings: [],
  site: [],
  removed: [],
  proposal: [],
  shadows: null,
  chosen: null,
  notMet: [],
};

/**
 * Draws a plan to scale, true north upward: the site, what stands around it, the shadow that is
 * there already in plain slate blue, the net new shadow hatched in madder, and the proposal.
 *
 * @returns an SVG document; the same input gives the same text
 */
export function drawPlan(content: PlanContent, options: PlanOptions): string {
  const plane = createLocalPlane(options.origin.longitude, options.origin.latitude);
  const frame = createFrame(plane, extentOnPlane(options.extent, plane), options.width);
  const isSmall = options.detail === 'small';
  const pen = isSmall ? smallPen : sheetPen(sheetUnit(frame));
  const proposal = content.proposal.map(({ geometry, topM }) => ({
    rings: frame.cutRings(geometry),
    topM,
  }));
  const streets = content.streetLines.map(({ name, lines }) => ({
    name,
    lines: lines.map((line) => line.map((lngLat) => frame.toSheet(plane.toPlane(lngLat)))),
  }));
  const keys = content.notMet.map(({ geometry, mark }) => ({
    rings: frame.cutRings(geometry),
    mark,
  }));

  return svgDocument({ width: frame.width, height: frame.height }, options.label, [
    element('rect', { width: frame.width, height: frame.height, fill: palette.paper }),
    drawGround(content, frame, pen),
    ...(content.shadows === null ? [] : [drawShadows(content.shadows, frame, pen)]),
    areas('buildings', content.buildings, frame, {
      fill: palette.building,
      stroke: palette.buildingLine,
      'stroke-width': pen.building,
    }),
    areas('removed', content.removed, frame, {
      fill: 'none',
      stroke: palette.ink,
      'stroke-width': pen.building,
      'stroke-dasharray': '2 2',
    }),
    outline('site', content.site, frame, {
      'stroke-width': pen.site,
      'stroke-dasharray': pen.siteDashes,
    }),
    ...proposal.map(({ rings }) =>
      element('path', {
        'data-part': 'proposal',
        d: closedPath(rings),
        'fill-rule': 'evenodd',
        fill: palette.paper,
        stroke: palette.ink,
        'stroke-width': pen.proposal,
      }),
    ),
    ...(isSmall ? [] : keys).map(({ rings }) =>
      element('path', {
        'data-part': 'not-met',
        d: outlinePath(rings, frame),
        fill: 'none',
        stroke: palette.madder,
        'stroke-width': pen.receptor,
      }),
    ),
    ...(content.chosen === null
      ? []
      : [
          outline('chosen', [content.chosen], frame, {
            stroke: palette.sunLine,
            'stroke-width': 2.4,
          }),
        ]),
    ...(options.detail === 'sheet'
      ? drawSheetText(content, streets, frame, proposal, keys, options)
      : []),
    ...(options.detail === 'keyed' ? drawKeys(keys, frame, [], 7.5 * sheetUnit(frame)).drawn : []),
    element('rect', {
      x: pen.frame / 2,
      y: pen.frame / 2,
      width: frame.width - pen.frame,
      height: frame.height - pen.frame,
      fill: 'none',
      stroke: palette.ink,
      'stroke-width': pen.frame,
    }),
  ]);
}

function drawSheetText(
  content: PlanContent,
  streetsOnSheet: { name: string; lines: SheetPoint[][] }[],
  frame: Frame,
  proposal: { rings: SheetRing[]; topM: number }[],
  keys: { rings: SheetRing[]; mark: string }[],
  options: PlanOptions,
): Svg[] {
  const unit = sheetUnit(frame);
  const fontSize = 8.5 * unit;
  const margin = 10 * unit;
  const block = measureTitleBlock(options.titleBlock, fontSize);
  const blockBox = {
    x: frame.width - margin - block.width,
    y: frame.height - margin - block.height,
    width: block.width,
    height: block.height,
  };
  const scaleBarLongest = 90 * unit;
  const northHeight = 67 * unit;
  const northBox = {
    x: 1,
    y: frame.height - northHeight - 1,
    width: scaleBarLongest + 84 * unit,
    height: northHeight,
  };
  const taken = [northBox, ...(options.titleBlock.length === 0 ? [] : [blockBox])];
  const heights = drawBlockHeights(proposal, frame, options.figures, taken, 8 * unit);
  const marks = drawKeys(keys, frame, [...taken, ...heights.boxes], 7.5 * unit);
  const streets = drawStreetNames(
    streetsOnSheet,
    frame,
    [...taken, ...heights.boxes, ...marks.boxes],
    7 * unit,
  );
  const names = drawAreaNames(
    [...content.water, ...content.openSpace],
    frame,
    [...taken, ...heights.boxes, ...marks.boxes, ...streets.boxes],
    7 * unit,
  );
  return [
    ...streets.drawn,
    ...names.drawn,
    ...marks.drawn,
    ...heights.drawn,
    element('rect', { ...northBox, fill: palette.paper, 'fill-opacity': 0.85 }),
    drawNorth([northBox.x + 24 * unit, frame.height - 16 * unit], 34 * unit, fontSize),
    drawScaleBar(
      [northBox.x + 60 * unit, frame.height - 18 * unit],
      frame.pxPerM,
      scaleBarLongest,
      fontSize,
      options.figures,
    ),
    ...(options.titleBlock.length === 0
      ? []
      : [drawTitleBlock(options.titleBlock, [blockBox.x, blockBox.y], fontSize)]),
  ];
}
