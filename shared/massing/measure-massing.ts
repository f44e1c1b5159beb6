import { createLocalPlane, type LocalPlane } from '../geometry/local-plane.ts';
import { listRings, toBlockFootprint, type BlockFootprint } from './block-footprint.ts';
import { measureWhere } from './footprint-sweep.ts';
import type { MassingBlock } from './massing-block.ts';
import type { MassingFigures } from './massing-figures.ts';

/**
 * The figures of what is proposed:
 * - `heightM`: from the lowest base to the highest top;
 * - `storeys`: as given for the block that reaches highest (the largest, where several do), not derived;
 * - `footprintM2`: the ground that all proposed blocks cover in plan, counted once, overhangs included;
 * - `volumeM3`: gross, area times height of each block; where blocks overlap in space it is counted twice
 *   (a check warns of that).
 *
 * Areas are taken on a local plane in metres. Height, storeys are null where nothing says them; footprint and
 * volume are null where footprints cross too often to be measured.
 */
export function measureMassing(blocks: readonly MassingBlock[]): MassingFigures {
  const proposed = blocks.filter(({ role }) => role === 'proposed');
  const plane = createPlaneAround(proposed);
  const footprints = proposed.map((block) => toBlockFootprint(block, plane));
  const topM = Math.max(...proposed.map((block) => block.topM));
  const baseM = Math.min(...proposed.map((block) => block.baseM));
  return {
    proposedBlocks: proposed.length,
    existingBlocks: blocks.length - proposed.length,
    heightM: Number.isFinite(topM - baseM) ? topM - baseM : null,
    storeys: highestStoreys(proposed, topM),
    footprintM2: measureCovered(footprints),
    volumeM3: measureVolume(footprints),
  };
}

/** A plane in metres whose origin lies amid the blocks. */
export function createPlaneAround(blocks: readonly MassingBlock[]): LocalPlane {
  const [longitude, latitude] = middleOf(blocks);
  return createLocalPlane(longitude, latitude);
}

function middleOf(blocks: readonly MassingBlock[]): [number, number] {
  let [west, south, east, north] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const { geometry } of blocks) {
    for (const [lng = NaN, lat = NaN] of listRings(geometry).flat()) {
      west = Math.min(west, lng);
      south = Math.min(south, lat);
      east = Math.max(east, lng);
      north = Math.max(north, lat);
    }
  }
  const middle: [number, number] = [(west + east) / 2, (south + north) / 2];
  return middle.every(Number.isFinite) ? middle : [0, 0];
}

function highestStoreys(blocks: readonly MassingBlock[], topM: number): number | null {
  const given = blocks
    .filter((block) => block.topM === topM)
    .flatMap(({ storeys }) => (storeys === null ? [] : [storeys]));
  return given.length === 0 ? null : Math.max(...given);
}

function measureCovered(footprints: readonly BlockFootprint[]): number | null {
  // All outlines run counter-clockwise, so blocks over one another add up and never cancel out.
  const rings = footprints.flatMap((footprint) => footprint.rings);
  return measureWhere([rings], ([winding]) => winding !== 0)?.areaM2 ?? null;
}

function measureVolume(footprints: readonly BlockFootprint[]): number | null {
  let volumeM3 = 0;
  for (const { areaM2, block } of footprints) {
    if (areaM2 === null) return null;
    volumeM3 += areaM2 * Math.max(0, block.topM - block.baseM);
  }
  return Number.isFinite(volumeM3) ? volumeM3 : null;
}
