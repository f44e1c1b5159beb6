import { flattenRings } from '../geometry/flat-rings.ts';
import type { Polygonal } from '../geometry/geojson-schema.ts';
import { createLocalPlane, type LocalPlane } from '../geometry/local-plane.ts';
import { projectPolygon } from '../geometry/project-polygon.ts';
import { boxesOverlap, boxOfRings, signedRingArea, type Ring } from '../geometry/ring.ts';
import type { ReceptorClass } from '../rules/rule-schema.ts';
import {
  createLightMeasures,
  makeLitArea,
  type LightMeasures,
  type LitArea,
} from '../shadow/receptor-light.ts';
import {
  indexBlocks,
  type IndexedBlocks,
  type SceneBlock,
  type ShadowRole,
} from '../shadow/shadow-layer.ts';
import { createWindingSweep } from '../shadow/winding-sweep.ts';
import type { EvidenceBlock, StudyInput } from './evidence-schema.ts';

/** A receptor on the local plane. */
export interface SceneReceptor {
  id: string;
  class: ReceptorClass;
  label: string;
  planeM: number;
  tiltDeg: number;
  facingDeg: number;
  area: LitArea;
  /** m², less what lies on the site. */
  wholeAreaM2: number;
  /** m², less the site and the context that stands through the receptor's plane. */
  openAreaM2: number;
  /** More than half of it lies on the site: it is shown and not judged. */
  isOnSite: boolean;
}

/** A study's input on the local plane, ready to be computed. */
export interface Scene {
  plane: LocalPlane;
  /** Before is context and existing, after is context and proposed. */
  blocks: IndexedBlocks;
  /** The same with what is approved nearby standing in both; null where nothing is. */
  cumulativeBlocks: IndexedBlocks | null;
  receptors: SceneReceptor[];
  siteRings: Ring[];
  measures: LightMeasures;
}

/** Builds the scene of a study's input. Blocks `by-right` belong to a baseline alone and stay out. */
export function buildScene(input: StudyInput): Scene {
  const plane = createLocalPlane(input.place.longitude, input.place.latitude);
  const siteRings = input.site === undefined ? [] : projectPolygon(input.site, plane);
  const measures = createLightMeasures();
  const standing = (block: EvidenceBlock, role: ShadowRole) => makeBlock(block, role, plane);
  const blocks = input.blocks.features.flatMap((block) => {
    const { role } = block.properties;
    return role === 'approved' || role === 'by-right' ? [] : [standing(block, role)];
  });
  const approved = input.blocks.features.filter(({ properties }) => properties.role === 'approved');
  const context = blocks.filter(({ role }) => role === 'context');
  return {
    plane,
    blocks: indexBlocks(blocks),
    cumulativeBlocks:
      approved.length === 0
        ? null
        : indexBlocks([...blocks, ...approved.map((block) => standing(block, 'context'))]),
    receptors: input.receptors.features.map(({ properties, geometry }) => {
      const rings = projectPolygon(geometry, plane);
      const area = makeLitArea(rings, siteRings);
      const planeM = properties.plane;
      const wholeAreaM2 = measures.openArea(area, []);
      const standsOn = context.filter(
        (block) =>
          block.baseM <= planeM && planeM < block.topM && boxesOverlap(block.box, area.box),
      );
      return {
        id: properties.id,
        class: properties.class,
        label: properties.label === '' ? properties.id : properties.label,
        planeM,
        tiltDeg: properties.tilt ?? 0,
        facingDeg: properties.facing ?? 0,
        area,
        wholeAreaM2,
        openAreaM2: measures.openArea(
          area,
          standsOn.flatMap((block) => block.rings),
        ),
        isOnSite: wholeAreaM2 < 0.5 * rings.reduce((sum, ring) => sum + signedRingArea(ring), 0),
      };
    }),
    siteRings,
    measures,
  };
}

/**
 * The area in m² on which a polygon's rings wind backwards, as where a ring crosses itself or a
 * hole lies outside its shell: there its shadow could cancel another's.
 */
export function backwardAreaM2(geometry: Polygonal, plane: LocalPlane): number {
  const rings = projectPolygon(geometry, plane);
  const areas = new Float64Array(1);
  const sweep = createWindingSweep(1);
  sweep.start(boxOfRings(rings));
  // Each ring turned round, so that what wound backwards winds forwards.
  const turnedRound = flattenRings(rings.map((ring) => ring.toReversed()));
  for (const ring of turnedRound.rings) sweep.addRing(turnedRound.points, ring, 0);
  sweep.measure(Int8Array.of(-1, 0), areas);
  return areas[0] ?? 0;
}

function makeBlock(block: EvidenceBlock, role: ShadowRole, plane: LocalPlane): SceneBlock {
  const rings = projectPolygon(block.geometry, plane);
  return {
    role,
    rings,
    box: boxOfRings(rings),
    baseM: block.properties.base,
    topM: block.properties.top,
  };
}
