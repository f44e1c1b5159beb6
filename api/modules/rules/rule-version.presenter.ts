import type {
  RuleVersion as RuleVersionDetail,
  RuleVersionState,
} from '../../../shared/contracts/rules.ts';
import { abilitiesOnRule, mayReadRuleDrafts, type Actor } from '../../policy.ts';
import type { Person } from '../people/person.entity.ts';
import type { RuleVersion } from './rule-version.entity.ts';

/** What a version's state hangs on. */
export interface RuleCalendar {
  /** The civil day in the municipality. */
  today: string;
  /** The version that holds on it. */
  inForce: RuleVersion | null;
}

/** A version's state follows from its day, today and the version that holds. */
export function stateOfVersion(
  { id, inForceFrom }: Pick<RuleVersion, 'id' | 'inForceFrom'>,
  { today, inForce }: RuleCalendar,
): RuleVersionState {
  if (inForceFrom === null || inForceFrom === undefined) return 'draft';
  if (inForceFrom > today) return 'scheduled';
  return id === inForce?.id ? 'in-force' : 'retired';
}

/** Changes whenever the version does. */
export function stampOf({ createdAt, changedAt, enactedAt }: RuleVersion): string {
  return [createdAt, changedAt, enactedAt].map((at) => at?.getTime().toString(36) ?? '').join('.');
}

/** Who has done what is for staff alone. */
export function presentRuleVersion(
  version: RuleVersion,
  calendar: RuleCalendar,
  actor: Actor | null,
): RuleVersionDetail {
  const withNames = mayReadRuleDrafts(actor);
  const state = stateOfVersion(version, calendar);
  const nameOf = (by: Person | null | undefined) => (withNames ? (by?.name ?? null) : null);
  const deed = (at: Date | null | undefined, by: Person | null | undefined) =>
    at instanceof Date ? { at: at.toISOString(), by: nameOf(by) } : null;
  return {
    id: version.id,
    state,
    inForceFrom: version.inForceFrom ?? null,
    rule: version.rule,
    created: { at: version.createdAt.toISOString(), by: nameOf(version.createdBy) },
    changed: deed(version.changedAt, version.changedBy),
    enacted: deed(version.enactedAt, version.enactedBy),
    stamp: stampOf(version),
    abilities: abilitiesOnRule(actor, state),
  };
}
