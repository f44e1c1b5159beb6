import { labelBlock, placeAt } from '../block-label.ts';
import { createIssue } from '../issue-severities.ts';
import type { MassingBlock } from '../massing-block.ts';
import type { MassingIssue } from '../massing-issue.ts';
import { findFirstCorner, type MassingCheck } from '../massing-scene.ts';

/** Gaps lower than this are drawing noise: metres. */
const leastGapM = 0.05;

/** A proposed block that begins above the ground stands, at least in part, on another one. */
export const checkFloatingBlocks: MassingCheck = ({ located, overlaps, isEveryPairCompared }) => {
  // Without all pairs a support may have been missed.
  if (!isEveryPairCompared) return [];
  return located.flatMap((footprint): MassingIssue[] => {
    const { block } = footprint;
    if (block.role !== 'proposed' || !(block.baseM > leastGapM)) return [];
    // Heights that make no block have their own issue.
    if (!(block.topM > block.baseM)) return [];
    const below = overlaps.flatMap(({ a, b }) => {
      if (a !== footprint && b !== footprint) return [];
      const other = a === footprint ? b.block : a.block;
      return other.role === 'proposed' && other.baseM < block.baseM ? [other] : [];
    });
    return checkSupport(block, below);
  });
};

function checkSupport(block: MassingBlock, below: readonly MassingBlock[]): MassingIssue[] {
  const highest = below.reduce<MassingBlock | null>(
    (best, other) => (best === null || other.topM > best.topM ? other : best),
    null,
  );
  const supportM = Math.max(0, highest?.topM ?? 0);
  const gapM = block.baseM - supportM;
  if (!(gapM > leastGapM)) return [];
  const label = labelBlock(block);
  const under = highest === null ? 'the ground' : `block ${highest.id}`;
  return [
    createIssue(
      'MASSING_BLOCK_FLOATS',
      placeAt(label, findFirstCorner(block)),
      `${label.text} begins ${gapM.toFixed(2)} m above ${under}, with nothing between.`,
      gapM > 50
        ? 'Give heights above the ground at the site, not above sea level.'
        : 'Set its base to the top of what it stands on, or leave it if it is meant to hang free.',
    ),
  ];
}
