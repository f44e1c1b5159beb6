import type { RuleVersion as RuleVersionDetail } from '../../../shared/contracts/rules.ts';
import type { RuleVersion } from './rule-version.entity.ts';

/** `inForce` is the version that holds on `civilDate`; a version's state follows from the two. */
export function presentRuleVersion(
  ruleVersion: RuleVersion,
  inForce: RuleVersion | null,
  civilDate: string,
): RuleVersionDetail {
  const { id, rule } = ruleVersion;
  const inForceFrom = ruleVersion.inForceFrom ?? null;
  const isToCome = inForceFrom === null || inForceFrom > civilDate;
  const state = isToCome ? 'draft' : id === inForce?.id ? 'in-force' : 'retired';
  return { id, state, inForceFrom, rule };
}
