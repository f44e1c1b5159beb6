import { isPolygonal } from '../geometry/geojson-schema.ts';
import type { LocalPlane } from '../geometry/local-plane.ts';
import { projectPolygon } from '../geometry/project-polygon.ts';
import {
  boxesOverlap,
  signedRingArea,
  type Box,
  type PlanePoint,
  type Ring,
} from '../geometry/ring.ts';
import type { JudgedClass } from '../rules/judged-class.ts';
import { makeLitArea, type LightMeasures, type LitArea } from '../shadow/receptor-light.ts';
import type { IndexedBlocks } from '../shadow/shadow-layer.ts';
import { makeWindowFront, type WindowFront } from '../shadow/window-front.ts';
import type { EvidenceReceptor } from './evidence-schema.ts';

/** A receptor on the local plane. */
export interface SceneReceptor {
  id: string;
  class: JudgedClass;
  label: string;
  planeM: number;
  tiltDeg: number;
  facingDeg: number;
  /** A window's holds no rings. */
  area: LitArea;
  /** Of a window: its light is in shares of it, and its two areas are 1. */
  front: WindowFront | null;
  /** m², less what lies on the site. */
  wholeAreaM2: number;
  /** m², less the site and the context that stands through the receptor's plane. */
  openAreaM2: number;
  /** More than half of it lies on the site: it is shown and not judged. */
  isOnSite: boolean;
}

/** What a receptor is made from besides itself. */
export interface ReceptorSurroundings {
  plane: LocalPlane;
  siteRings: readonly Ring[];
  /** With the context that takes from a receptor's open area. */
  blocks: IndexedBlocks;
  measures: LightMeasures;
  /** Metres: the widest sampling grid, halved once. */
  gridM: number;
}

/** Puts a receptor of a study's input on the local plane. */
export function makeSceneReceptor(
  { properties, geometry }: EvidenceReceptor,
  surroundings: ReceptorSurroundings,
): SceneReceptor {
  const { plane, siteRings, measures } = surroundings;
  const named = {
    id: properties.id,
    class: properties.class,
    label: properties.label === '' ? properties.id : properties.label,
    planeM: properties.plane,
    facingDeg: properties.facing ?? 0,
  };
  if (!isPolygonal(geometry)) {
    const line = geometry.type === 'Point' ? [geometry.coordinates] : geometry.coordinates;
    const front = makeWindowFront(
      line.map((lngLat) => plane.toPlane(lngLat)),
      named.facingDeg,
      surroundings.gridM,
    );
    return {
      ...named,
      tiltDeg: properties.tilt ?? 90,
      area: { ...makeLitArea([], []), box: front.points.box },
      front,
      wholeAreaM2: 1,
      openAreaM2: 1,
      isOnSite: liesOnSite(
        line.map((lngLat) => plane.toPlane(lngLat)),
        siteRings,
      ),
    };
  }
  const rings = projectPolygon(geometry, plane);
  const area = makeLitArea(rings, siteRings);
  const wholeAreaM2 = measures.openArea(area, []);
  return {
    ...named,
    tiltDeg: properties.tilt ?? 0,
    area,
    front: null,
    wholeAreaM2,
    openAreaM2: openAreaOn(area, named.planeM, surroundings),
    isOnSite: wholeAreaM2 < 0.5 * rings.reduce((sum, ring) => sum + signedRingArea(ring), 0),
  };
}

/** The area in m² less the site and the context that stands through a plane. */
export function openAreaOn(
  area: LitArea,
  planeM: number,
  { blocks, measures }: Pick<ReceptorSurroundings, 'blocks' | 'measures'>,
): number {
  return measures.openArea(area, footprintsThrough(blocks, planeM, area.box));
}

/** What context stands on within a box, of the blocks that reach through a plane. */
export function footprintsThrough(
  { blocks, index }: IndexedBlocks,
  planeM: number,
  box: Box,
): Ring[] {
  const found = index?.search(box.minX, box.minY, box.maxX, box.maxY) ?? [];
  return found
    .sort((a, b) => a - b)
    .flatMap((at) => {
      const block = blocks[at]?.block;
      if (block?.role !== 'context' || !boxesOverlap(block.box, box)) return [];
      return block.baseM <= planeM && planeM < block.topM ? block.rings : [];
    });
}

/** Whether more than half of a window's points lie on the site. */
function liesOnSite(line: readonly PlanePoint[], siteRings: readonly Ring[]): boolean {
  const onSite = line.filter((point) => windsAround(point, siteRings));
  return onSite.length > line.length / 2;
}

function windsAround([x, y]: PlanePoint, rings: readonly Ring[]): boolean {
  let winding = 0;
  for (const ring of rings) {
    ring.forEach(([fromX, fromY], index) => {
      const [toX, toY] = ring[(index + 1) % ring.length] ?? [fromX, fromY];
      if (fromY <= y === toY <= y) return;
      const crossingX = fromX + ((y - fromY) * (toX - fromX)) / (toY - fromY);
      if (crossingX > x) winding += toY > fromY ? 1 : -1;
    });
  }
  return winding !== 0;
}
