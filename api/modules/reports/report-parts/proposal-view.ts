import type { Content } from 'pdfmake/interfaces';
import {
  drawAxonometric,
  type AxonometricBlock,
} from '../../../../shared/drawing/axonometric-drawing.ts';
import type { Polygonal } from '../../../../shared/geometry/geojson-schema.ts';
import { createLocalPlane } from '../../../../shared/geometry/local-plane.ts';
import { polygonsOf } from '../../../../shared/geometry/project-polygon.ts';
import { page } from './report-look.ts';
import type { ReportScene } from './report-scene.ts';

/** How far from the site the view shows what stands around, in metres. */
const drawnAroundM = 75;

/** The proposal in three dimensions among what stands around it. */
export function proposalView(scene: ReportScene): Content[] {
  return [
    {
      stack: [
        { svg: drawView(scene, page.textWidth, 235), width: page.textWidth },
        {
          text: 'The proposal, white, among what stands around it; seen from the south-south-east with parallel rays. Heights are above the ground of the site, which is taken as level.',
          style: 'small',
        },
      ],
      unbreakable: true,
      margin: [0, 4, 0, 0],
    },
  ];
}

function drawView(scene: ReportScene, width: number, height: number): string {
  const { payload } = scene;
  const plane = createLocalPlane(scene.origin.longitude, scene.origin.latitude);
  const pointsOf = (geometry: Polygonal) =>
    polygonsOf(geometry)
      .flat(2)
      .map((lngLat) => plane.toPlane(lngLat));
  const sitePoints = pointsOf(payload.site);
  const isNear = (geometry: Polygonal) =>
    pointsOf(geometry).some(([x, y]) =>
      sitePoints.some(([siteX, siteY]) => Math.hypot(x - siteX, y - siteY) < drawnAroundM),
    );
  const blocks: AxonometricBlock[] = [
    ...scene.around
      .filter(({ geometry }) => isNear(geometry))
      .map(({ geometry, baseM, topM }) => ({ geometry, baseM, topM, role: 'context' as const })),
    ...payload.revision.blocks
      .filter(({ properties }) => properties.role === 'proposed')
      .map(({ geometry, properties }) => ({
        geometry,
        baseM: properties.baseM,
        topM: properties.topM,
        role: 'proposed' as const,
      })),
  ];
  return drawAxonometric(
    blocks,
    {
      site: [payload.site],
      parcels: payload.surroundings.parcels
        .map(({ geometry }) => geometry)
        .filter((geometry) => isNear(geometry)),
    },
    {
      origin: scene.origin,
      width,
      height,
      view: { fromDeg: 155, altitudeDeg: 38 },
      label:
        'The proposal and what stands around it, seen from the south-south-east and from above',
      figures: scene.figures,
    },
  );
}
