import {
  measureOverlap,
  sharedHeightM,
  toBlockFootprint,
  type BlockFootprint,
} from './block-footprint.ts';
import { describeFootprint } from './footprint-key.ts';
import type { MassingBlock } from './massing-block.ts';
import { createPlaneAround } from './measure-massing.ts';

/** What a comparison says of a block in one revision. */
export interface ComparedBlock {
  baseM: number;
  topM: number;
  /** Null where the footprint is too tangled to be measured. */
  footprintM2: number | null;
}

export interface BlockChange {
  /** The block's id in the later revision, or in the earlier one where it was removed. */
  id: string;
  change: 'added' | 'removed' | 'changed' | 'same';
  before: ComparedBlock | null;
  after: ComparedBlock | null;
}

/** A block that lost its id is still known when its footprint keeps this share of both together. */
const leastSharedFootprint = 0.5;
/** Heights closer than this are the same: metres. */
const sameHeightM = 0.001;

/**
 * What changed from one massing to another, block by block: in the later one's order, then what was removed.
 * Blocks are matched by id, then by the best overlapping footprint of the same role at shared heights. `same`
 * means same role, footprint (to a centimetre), base and top; names and storeys are not compared.
 */
export function compareMassings(
  before: readonly MassingBlock[],
  after: readonly MassingBlock[],
): BlockChange[] {
  const plane = createPlaneAround([...before, ...after]);
  const earlier = before.map((block) => toBlockFootprint(block, plane));
  const later = after.map((block) => toBlockFootprint(block, plane));
  const matches = matchBlocks(earlier, later);
  const matched = new Set(matches.values());
  return [
    ...later.map((footprint) => describeChange(matches.get(footprint) ?? null, footprint)),
    ...earlier
      .filter((footprint) => !matched.has(footprint))
      .map((footprint): BlockChange => ({
        id: footprint.block.id,
        change: 'removed',
        before: present(footprint),
        after: null,
      })),
  ];
}

/** The earlier footprint of each later one that has one. */
function matchBlocks(
  earlier: readonly BlockFootprint[],
  later: readonly BlockFootprint[],
): Map<BlockFootprint, BlockFootprint> {
  const matches = new Map<BlockFootprint, BlockFootprint>();
  const byId = new Map(earlier.map((footprint) => [footprint.block.id, footprint]));
  for (const footprint of later) {
    const match = byId.get(footprint.block.id);
    if (match === undefined) continue;
    matches.set(footprint, match);
    byId.delete(footprint.block.id);
  }
  const candidates = later
    .filter((footprint) => !matches.has(footprint))
    .flatMap((a) => [...byId.values()].flatMap((b) => rateMatch(b, a)))
    .sort((one, other) => other.sharedM3 - one.sharedM3);
  for (const { a, b } of candidates) {
    if (matches.has(a) || !byId.has(b.block.id)) continue;
    matches.set(a, b);
    byId.delete(b.block.id);
  }
  return matches;
}

/** How much space an earlier block and a later one share, if that is enough to take them for the same block. */
function rateMatch(
  b: BlockFootprint,
  a: BlockFootprint,
): { a: BlockFootprint; b: BlockFootprint; sharedM3: number }[] {
  if (a.block.role !== b.block.role || a.areaM2 === null || b.areaM2 === null) return [];
  const sharedM2 = measureOverlap(a, b)?.areaM2 ?? 0;
  const sharedM3 = sharedM2 * sharedHeightM(a.block, b.block);
  const isEnough = sharedM2 >= leastSharedFootprint * (a.areaM2 + b.areaM2 - sharedM2);
  return isEnough && sharedM3 > 0 ? [{ a, b, sharedM3 }] : [];
}

function describeChange(before: BlockFootprint | null, after: BlockFootprint): BlockChange {
  return {
    id: after.block.id,
    change: before === null ? 'added' : isSame(before.block, after.block) ? 'same' : 'changed',
    before: before === null ? null : present(before),
    after: present(after),
  };
}

function isSame(a: MassingBlock, b: MassingBlock): boolean {
  return (
    a.role === b.role &&
    Math.abs(a.baseM - b.baseM) < sameHeightM &&
    Math.abs(a.topM - b.topM) < sameHeightM &&
    describeFootprint(a.geometry) === describeFootprint(b.geometry)
  );
}

function present({ block, areaM2 }: BlockFootprint): ComparedBlock {
  return { baseM: block.baseM, topM: block.topM, footprintM2: areaM2 };
}
