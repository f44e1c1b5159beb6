import type { EntityManager } from '@mikro-orm/postgresql';
import { civilDateIn, getMunicipality } from '../settings/get-municipality.ts';
import { RuleVersion } from './rule-version.entity.ts';
import type { RuleCalendar } from './rule-version.presenter.ts';

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

/** Today in the municipality, and the version that holds. */
export async function readRuleCalendar(em: EntityManager): Promise<RuleCalendar> {
  const today = civilDateIn(await getMunicipality(em), new Date());
  return { today, inForce: await findRuleInForce(em, today) };
}
