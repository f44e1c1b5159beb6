import { boxOfRings } from '../geometry/ring.ts';
import type { ClauseBaseline } from '../rules/rule-schema.ts';
import { indexBlocks, type IndexedBlocks, type ShadowRole } from '../shadow/shadow-layer.ts';
import type { BlockRole, StudyInput } from './evidence-schema.ts';
import { makeBlock, type Scene } from './scene.ts';

/** What stands before and after by a clause's baseline. */
export interface ClauseBlocks {
  blocks: IndexedBlocks;
  /** The same with what is approved nearby standing in both; null where nothing is. */
  cumulativeBlocks: IndexedBlocks | null;
  /** Whether context stands in both states, so that it shades what it stands on. */
  hasContext: boolean;
}

/** The wall's foot lies below every plane: no light comes under it. */
const wallBaseM = -10_000;

/**
 * Makes what stands by each baseline of a study, each once. A block's role in a scene says in which
 * states it stands: `context` in both, `existing` before, `proposed` after.
 */
export function createBaselineBlocks(
  input: StudyInput,
  scene: Scene,
): (baseline: ClauseBaseline | undefined) => ClauseBlocks {
  const known = new Map<string, ClauseBlocks>();
  return (baseline) => {
    const { blocks, cumulativeBlocks } = scene;
    if (baseline === undefined) return { blocks, cumulativeBlocks, hasContext: true };
    const key = JSON.stringify(baseline);
    const found = known.get(key) ?? standingBy(baseline, input, scene);
    known.set(key, found);
    return found;
  };
}

function standingBy(baseline: ClauseBaseline, input: StudyInput, scene: Scene): ClauseBlocks {
  const roles = rolesBy(baseline);
  const standing = input.blocks.features.flatMap((block) => {
    const role = roles[block.properties.role];
    return role === undefined ? [] : [makeBlock(block, role, scene.plane)];
  });
  if (typeof baseline === 'object' && scene.siteRings.length > 0) {
    // Outside a site, a wall along its boundary shades what a solid of the same height would.
    standing.push({
      role: 'existing',
      rings: scene.siteRings,
      box: boxOfRings(scene.siteRings),
      baseM: wallBaseM,
      topM: baseline.wall,
    });
  }
  const approved = input.blocks.features
    .filter(({ properties }) => properties.role === 'approved')
    .map((block) => makeBlock(block, 'context', scene.plane));
  const countsApproved = approved.length > 0 && baseline !== 'proposal-alone';
  return {
    blocks: indexBlocks(standing),
    cumulativeBlocks:
      scene.cumulativeBlocks === null
        ? null
        : indexBlocks(countsApproved ? [...standing, ...approved] : standing),
    hasContext: roles.context === 'context',
  };
}

function rolesBy(baseline: ClauseBaseline): Partial<Record<BlockRole, ShadowRole>> {
  if (baseline === 'proposal-alone') return { proposed: 'proposed' };
  if (baseline === 'by-right') {
    return { context: 'context', 'by-right': 'existing', proposed: 'proposed' };
  }
  return {
    // Context that does not stand beside the wall stands after only, as the proposal does.
    context: baseline.with.includes('context') ? 'context' : 'proposed',
    ...(baseline.with.includes('existing') ? { existing: 'existing' } : {}),
    proposed: 'proposed',
  };
}
