import { sharedHeightM } from '../block-footprint.ts';
import { labelBlock, placeAt } from '../block-label.ts';
import { createIssue, wholeFile } from '../issue-severities.ts';
import type { MassingIssue } from '../massing-issue.ts';
import type { MassingCheck } from '../massing-scene.ts';
import { isSameBlock } from './repeated-blocks.ts';

/** Overlaps lower than this are drawing noise: metres. */
const leastHeightM = 0.01;

/** Blocks of one role fill no space twice. (A proposed block may of course stand where an existing one is removed.) */
export const checkOverlappingBlocks: MassingCheck = ({
  overlaps,
  isEveryPairCompared,
  toLngLat,
}) => {
  const issues = overlaps.flatMap(({ a, b, areaM2, at }): MassingIssue[] => {
    if (a.block.role !== b.block.role || isSameBlock(a.block, b.block)) return [];
    const heightM = sharedHeightM(a.block, b.block);
    if (!(heightM > leastHeightM)) return [];
    const label = labelBlock(b.block);
    return [
      createIssue(
        'MASSING_BLOCKS_OVERLAP',
        placeAt(label, toLngLat(at)),
        `${label.text} and block ${a.block.id} fill the same space: ${areaM2.toFixed(1)} m² over ${heightM.toFixed(2)} m of height.`,
        'Shadows are not counted twice, but the volume is; let the blocks meet without overlapping.',
      ),
    ];
  });
  if (isEveryPairCompared) return issues;
  return [
    ...issues,
    createIssue(
      'MASSING_NOT_ALL_COMPARED',
      wholeFile,
      'There are too many blocks over one another to compare each with each; overlapping and floating blocks may be missing here.',
      'Simplify the massing to the blocks that matter for shadows.',
    ),
  ];
};
