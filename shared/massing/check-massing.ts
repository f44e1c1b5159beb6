import { listRings } from './block-footprint.ts';
import { checkFloatingBlocks } from './checks/floating-blocks.ts';
import { checkFootprintSize } from './checks/footprint-size.ts';
import { checkHeights } from './checks/heights.ts';
import { checkOutlines } from './checks/outlines.ts';
import { checkOverlappingBlocks } from './checks/overlapping-blocks.ts';
import { checkProposed } from './checks/proposed.ts';
import { checkRepeatedBlocks } from './checks/repeated-blocks.ts';
import { checkWithinMunicipality } from './checks/within-municipality.ts';
import { checkWithinSite } from './checks/within-site.ts';
import { createIssue, limitIssues, wholeFile } from './issue-severities.ts';
import type { MassingBlock } from './massing-block.ts';
import type { MassingIssue } from './massing-issue.ts';
import { massingLimits } from './massing-limits.ts';
import { createMassingScene, type MassingCheck, type MassingSite } from './massing-scene.ts';

export type { MassingSite } from './massing-scene.ts';

const checks: readonly MassingCheck[] = [
  checkProposed,
  checkHeights,
  checkOutlines,
  checkFootprintSize,
  checkWithinMunicipality,
  checkWithinSite,
  checkRepeatedBlocks,
  checkOverlappingBlocks,
  checkFloatingBlocks,
];

/**
 * Checks blocks on their own, against the site and against each other. Lengths and areas are taken on a local
 * plane in metres around the municipality's place. A massing is sound when no issue is an `error`.
 */
export function checkMassing(blocks: readonly MassingBlock[], site: MassingSite): MassingIssue[] {
  const vertices = blocks.reduce((sum, { geometry }) => sum + listRings(geometry).flat().length, 0);
  if (vertices > massingLimits.vertices) {
    return [
      createIssue(
        'MASSING_TOO_MANY_VERTICES',
        wholeFile,
        `The massing has ${vertices} points; at most ${massingLimits.vertices} are checked.`,
        'Simplify it: one footprint for each block, curves as chords of about a metre.',
      ),
    ];
  }
  const scene = createMassingScene(blocks, site);
  return limitIssues(checks.flatMap((check) => check(scene)));
}
