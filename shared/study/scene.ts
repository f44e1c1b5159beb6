import { flattenRings } from '../geometry/flat-rings.ts';
import type { Polygonal } from '../geometry/geojson-schema.ts';
import { createLocalPlane, type LocalPlane } from '../geometry/local-plane.ts';
import { projectPolygon } from '../geometry/project-polygon.ts';
import { boxOfRings, type Ring } from '../geometry/ring.ts';
import { createPointSampler, type PointSampler } from '../shadow/point-light.ts';
import { createLightMeasures, type LightMeasures } from '../shadow/receptor-light.ts';
import {
  indexBlocks,
  type IndexedBlocks,
  type SceneBlock,
  type ShadowRole,
} from '../shadow/shadow-layer.ts';
import { createWindingSweep } from '../shadow/winding-sweep.ts';
import type { EvidenceBlock, StudyInput } from './evidence-schema.ts';
import { makeSceneReceptor, type SceneReceptor } from './scene-receptor.ts';

export type { SceneReceptor };

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
  sampler: PointSampler;
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
  const indexed = indexBlocks(blocks);
  const surroundings = {
    plane,
    siteRings,
    measures,
    blocks: indexed,
    gridM: input.settings.gridM,
  };
  return {
    plane,
    blocks: indexed,
    cumulativeBlocks:
      approved.length === 0
        ? null
        : indexBlocks([...blocks, ...approved.map((block) => standing(block, 'context'))]),
    receptors: input.receptors.features.map((feature) => makeSceneReceptor(feature, surroundings)),
    siteRings,
    measures,
    sampler: createPointSampler(),
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

/** A block of a study's input on the local plane, in a role of its own. */
export function makeBlock(block: EvidenceBlock, role: ShadowRole, plane: LocalPlane): SceneBlock {
  const rings = projectPolygon(block.geometry, plane);
  return {
    role,
    rings,
    box: boxOfRings(rings),
    baseM: block.properties.base,
    topM: block.properties.top,
  };
}
