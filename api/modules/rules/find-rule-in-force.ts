import type { EntityManager } from '@mikro-orm/postgresql';
import { RuleVersion } from './rule-version.entity.ts';

/** The version that holds on this civil day, or null: the latest of those whose day has come. */
export async function findRuleInForce(
  em: EntityManager,
  civilDate: string,
): Promise<RuleVersion | null> {
  return em.findOne(
    RuleVersion,
    { inForceFrom: { $lte: civilDate } },
    { orderBy: { inForceFrom: 'desc', version: 'desc' } },
  );
}
