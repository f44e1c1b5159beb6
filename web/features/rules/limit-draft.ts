import type { LimitLeaf, RuleLimit, RuleMeasure } from '../../../shared/rules/rule-schema.ts';

/** How the requirements of a limit belong together. */
export type LimitJoint = 'one' | 'anyOf' | 'allOf';

type LimitGroup = Exclude<RuleLimit, LimitLeaf>;

export function isGroup(limit: RuleLimit): limit is LimitGroup {
  return 'anyOf' in limit || 'allOf' in limit;
}

/** The requirements of a limit; a single one is its own. */
export function membersOf(limit: RuleLimit): RuleLimit[] {
  if ('anyOf' in limit) return limit.anyOf;
  return 'allOf' in limit ? limit.allOf : [limit];
}

/** The same requirements under another joint; of several the first is kept as the one. */
export function combine(joint: LimitJoint, members: readonly RuleLimit[]): RuleLimit {
  if (joint === 'anyOf') return { anyOf: [...members] };
  if (joint === 'allOf') return { allOf: [...members] };
  return members[0] ?? { noWorse: true };
}

export type LeafKind =
  'atLeast' | 'atMost' | 'keeps' | 'losesAtMost' | 'losesAtMostShare' | 'noWorse';

export const leafChoices = [
  { id: 'atLeast', label: 'At least so much with the proposal' },
  { id: 'atMost', label: 'At most so much with the proposal' },
  { id: 'keeps', label: 'Keeps a share of what there is before' },
  { id: 'losesAtMost', label: 'Loses at most so much' },
  { id: 'losesAtMostShare', label: 'Loses at most a share' },
  { id: 'noWorse', label: 'No worse than before' },
] as const satisfies readonly { id: LeafKind; label: string }[];

export function kindOfLeaf(leaf: LimitLeaf): LeafKind {
  const found = leafChoices.find(({ id }) => id in leaf);
  if (found === undefined) throw new Error('This requirement asks for nothing.');
  return found.id;
}

/** A requirement of another kind, on the same measure; a figure must be written anew where it has another meaning. */
export function leafOfKind(kind: LeafKind, measure: RuleMeasure | undefined): LimitLeaf {
  const own = measure === undefined ? {} : { measure };
  switch (kind) {
    case 'atLeast':
      return { atLeast: Number.NaN, ...own };
    case 'atMost':
      return { atMost: Number.NaN, ...own };
    case 'keeps':
      return { keeps: 0.8, ...own };
    case 'losesAtMost':
      return { losesAtMost: Number.NaN, ...own };
    case 'losesAtMostShare':
      return { losesAtMostShare: 0.1, of: 'before', ...own };
    case 'noWorse':
      return { noWorse: true, ...own };
  }
}

/** The same requirement on a measure of its own, or on the clause's. */
export function withMeasure(leaf: LimitLeaf, measure: RuleMeasure | undefined): LimitLeaf {
  const { measure: _measure, ...rest } = leaf;
  return measure === undefined ? rest : { ...rest, measure };
}
