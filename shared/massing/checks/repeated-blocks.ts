import { labelBlock, placeAt } from '../block-label.ts';
import { describeFootprint } from '../footprint-key.ts';
import { createIssue } from '../issue-severities.ts';
import type { MassingBlock } from '../massing-block.ts';
import type { MassingIssue } from '../massing-issue.ts';
import { findFirstCorner, type MassingCheck } from '../massing-scene.ts';

/** No block stands twice with the same footprint, heights and role. */
export const checkRepeatedBlocks: MassingCheck = ({ blocks }) => {
  const seen = new Map<string, MassingBlock>();
  const issues: MassingIssue[] = [];
  for (const block of blocks) {
    const key = keyOf(block);
    const first = seen.get(key);
    if (first === undefined) {
      seen.set(key, block);
      continue;
    }
    const label = labelBlock(block);
    issues.push(
      createIssue(
        'MASSING_BLOCK_REPEATED',
        placeAt(label, findFirstCorner(block)),
        `${label.text} is the same as block ${first.id}: same footprint, base and top.`,
        'Take one of them out.',
      ),
    );
  }
  return issues;
};

/** Whether two blocks are the same but for id, name and storeys. */
export function isSameBlock(a: MassingBlock, b: MassingBlock): boolean {
  return a.baseM === b.baseM && a.topM === b.topM && keyOf(a) === keyOf(b);
}

function keyOf({ role, baseM, topM, geometry }: MassingBlock): string {
  return `${role} ${baseM} ${topM} ${describeFootprint(geometry)}`;
}
