import { extentOnPlane } from '../../../../shared/drawing/frame.ts';
import { drawNorth, drawScaleBar } from '../../../../shared/drawing/north-and-scale.ts';
import { drawPlan } from '../../../../shared/drawing/plan-drawing.ts';
import { svgDocument } from '../../../../shared/drawing/svg.ts';
import {
  drawTitleBlock,
  measureTitleBlock,
  titleBlockRows,
} from '../../../../shared/drawing/title-block.ts';
import { createLocalPlane } from '../../../../shared/geometry/local-plane.ts';
import type { ReportInstant } from '../report-payload.ts';
import type { ReportScene } from './report-scene.ts';

/**
 * A plan of the case with names, heights, true north, scale bar and title block.
 *
 * @param instant whose shadows are drawn; null for the plan alone
 * @param width points
 */
export function drawSheet(
  scene: ReportScene,
  instant: ReportInstant | null,
  width: number,
): string {
  return drawPlan(withShadows(scene, instant), {
    ...sheetOptions(scene, instant, width),
    titleBlock: titleRows(scene, instant),
  });
}

/** A plan with the marks of receptors alone; title block, true north and scale bar stand beside it. */
export function drawKeyedPlan(scene: ReportScene, instant: ReportInstant, width: number): string {
  return drawPlan(withShadows(scene, instant), {
    ...sheetOptions(scene, instant, width),
    detail: 'keyed',
    titleBlock: [],
  });
}

/** True north and the scale bar of plans of a width, by themselves. */
export function drawNorthAndScale(scene: ReportScene, planWidth: number): string {
  return svgDocument({ width: 130, height: 40 }, 'True north and scale', [
    drawNorth([20, 38], 26, 6.5),
    drawScaleBar([48, 32], pointsToAMetre(scene, planWidth), 60, 6.5, scene.figures),
  ]);
}

/** The scale of plans of a width. */
export function pointsToAMetre({ origin, payload }: ReportScene, planWidth: number): number {
  const plane = createLocalPlane(origin.longitude, origin.latitude);
  const extent = extentOnPlane(payload.mapExtent, plane);
  return planWidth / (extent.eastM - extent.westM);
}

/** A title block by itself, in smaller letters where it would be wider than its column. */
export function drawTitle(scene: ReportScene, instant: ReportInstant, columnWidth: number): string {
  const rows = titleRows(scene, instant);
  const largest = 7.5;
  const fit = (columnWidth - 1) / measureTitleBlock(rows, largest).width;
  const fontSize = largest * Math.min(1, fit);
  const { width, height } = measureTitleBlock(rows, fontSize);
  return svgDocument({ width: width + 1, height: height + 1 }, rows.flat().join(', '), [
    drawTitleBlock(rows, [0.5, 0.5], fontSize),
  ]);
}

/** The same plan without any words, for a row of hours. */
export function drawSmallPlan(scene: ReportScene, instant: ReportInstant, width: number): string {
  return drawPlan(withShadows(scene, instant), {
    origin: scene.origin,
    extent: scene.payload.mapExtent,
    width,
    label: `Shadows on ${scene.time.dateAndClock(instant.at)}`,
    figures: scene.figures,
    detail: 'small',
    titleBlock: [],
  });
}

function withShadows({ plan }: ReportScene, instant: ReportInstant | null) {
  return {
    ...plan,
    shadows: instant === null ? null : { standing: instant.before, netNew: instant.netNew },
  };
}

function sheetOptions(scene: ReportScene, instant: ReportInstant | null, width: number) {
  const { payload, time, figures, origin } = scene;
  const when = instant === null ? '' : ` on ${time.dateAndClock(instant.at)}`;
  return {
    origin,
    extent: payload.mapExtent,
    width,
    label: `Plan of the site and its neighbours${when}`,
    figures,
    detail: 'sheet' as const,
  };
}

function titleRows({ payload, time, figures }: ReportScene, instant: ReportInstant | null) {
  return titleBlockRows(
    {
      caseReference: payload.reviewCase.number,
      revision: payload.revision.revision,
      studyDigest: payload.study.digest,
      at: instant?.at ?? null,
      azimuthDeg: instant?.azimuthDeg ?? null,
      altitudeDeg: instant?.altitudeDeg ?? null,
    },
    time,
    figures,
  );
}
