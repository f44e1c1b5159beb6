import { labelBlock, placeAt } from '../block-label.ts';
import { createIssue } from '../issue-severities.ts';
import type { MassingBlock } from '../massing-block.ts';
import type { MassingIssue } from '../massing-issue.ts';
import { massingLimits } from '../massing-limits.ts';
import { findFirstCorner, type MassingCheck } from '../massing-scene.ts';

/**
 * Base and top are numbers, top lies above base, and neither is beyond what a building reaches; a block that stays
 * below the ground is said to cast no shadow.
 */
export const checkHeights: MassingCheck = ({ blocks }) =>
  blocks.flatMap((block) => checkBlock(block) ?? []);

function checkBlock(block: MassingBlock): MassingIssue | null {
  const { baseM, topM } = block;
  const label = labelBlock(block);
  const place = placeAt(label, findFirstCorner(block));
  if (!Number.isFinite(baseM) || !Number.isFinite(topM)) {
    return createIssue(
      'MASSING_HEIGHT_NOT_A_NUMBER',
      place,
      `${label.text} has a base or a top that is not a number.`,
      'Give base and top in metres above the ground.',
    );
  }
  if (topM > massingLimits.topM || baseM < -massingLimits.topM) {
    const [name, heightM] = topM > massingLimits.topM ? ['top', topM] : ['base', baseM];
    return createIssue(
      'MASSING_HEIGHT_OVER_LIMIT',
      place,
      `${label.text} has its ${name} at ${heightM} m; heights beyond ${massingLimits.topM} m are not taken.`,
      'Give base and top in metres above the ground at the site (not in millimetres).',
    );
  }
  if (topM <= baseM) {
    return createIssue(
      'MASSING_TOP_NOT_ABOVE_BASE',
      place,
      `${label.text} has its top at ${topM} m, not above its base at ${baseM} m.`,
      'Give both in metres above the ground: top is not the height of the block alone.',
    );
  }
  if (topM <= 0) {
    return createIssue(
      'MASSING_BLOCK_BELOW_GROUND',
      place,
      `${label.text} ends at ${topM} m, at or below the ground, so it casts no shadow on it.`,
      'Leave it in if the site lies lower than its surroundings; else check the heights.',
    );
  }
  return null;
}
