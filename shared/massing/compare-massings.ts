import { boxesOverlap } from '../geometry/ring.ts';
import {
  countCorners,
  measureOverlap,
  mostComparedEdges,
  sharedHeightM,
  toBlockFootprint,
  type BlockFootprint,
} from './block-footprint.ts';
import { describeFootprint } from './footprint-key.ts';
import type { MassingBlock } from './massing-block.ts';
import { createPlaneAround } from './measure-massing.ts';
import { isNumberedId } from './name-blocks.ts';

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
 * Blocks are matched by id (unless it is a mere number in the file), then by the best overlapping footprint of the
 * same role at shared heights. `same` means same role, footprint (to a centimetre), base and top; names and storeys are not compared.
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
  const laterIds = new Set(after.map(({ id }) => id));
  return [
    ...later.map((footprint) => describeChange(matches.get(footprint) ?? null, footprint)),
    ...earlier
      .filter((footprint) => !matched.has(footprint))
      .map((footprint): BlockChange => ({
        // A numbered id can stand for another block later on.
        id: laterIds.has(footprint.block.id)
          ? `${footprint.block.id} (earlier revision)`
          : footprint.block.id,
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
  const unmatched = new Set(earlier);
  const match = (a: BlockFootprint, b: BlockFootprint | undefined) => {
    if (b === undefined || matches.has(a) || !unmatched.has(b)) return;
    matches.set(a, b);
    unmatched.delete(b);
  };

  const byId = new Map(earlier.map((footprint) => [footprint.block.id, footprint]));
  for (const footprint of later) {
    const { id } = footprint.block;
    if (!isNumberedId(id)) match(footprint, byId.get(id));
  }
  const open = later.filter((footprint) => !matches.has(footprint));
  for (const { a, b } of listCandidates(open, [...unmatched])) match(a, b);
  return matches;
}

interface Candidate {
  a: BlockFootprint;
  b: BlockFootprint;
  /** The space that both fill. */
  sharedM3: number;
}

/** Pairs of blocks that may be the same one, the likeliest first. */
function listCandidates(
  later: readonly BlockFootprint[],
  earlier: readonly BlockFootprint[],
): Candidate[] {
  const candidates: Candidate[] = [];
  let edges = 0;
  for (const a of later) {
    for (const b of earlier) {
      if (!boxesOverlap(a.box, b.box)) continue;
      edges += countCorners(a) + countCorners(b);
      // What is left then counts as added and removed.
      if (edges > mostComparedEdges) return sortCandidates(candidates);
      const sharedM3 = measureLikeness(a, b);
      if (sharedM3 > 0) candidates.push({ a, b, sharedM3 });
    }
  }
  return sortCandidates(candidates);
}

function sortCandidates(candidates: Candidate[]): Candidate[] {
  return candidates.sort((one, other) => other.sharedM3 - one.sharedM3);
}

/** The space that two blocks share, in m³, if it is enough to take them for the same block; else 0. */
function measureLikeness(a: BlockFootprint, b: BlockFootprint): number {
  if (a.block.role !== b.block.role || a.areaM2 === null || b.areaM2 === null) return 0;
  const sharedM2 = measureOverlap(a, b)?.areaM2 ?? 0;
  const isEnough = sharedM2 >= leastSharedFootprint * (a.areaM2 + b.areaM2 - sharedM2);
  return isEnough ? sharedM2 * sharedHeightM(a.block, b.block) : 0;
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
