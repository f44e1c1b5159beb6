import type { EntityManager } from '@mikro-orm/postgresql';
import { checkRule } from '../../../shared/rules/check-rule.ts';
import type { Rule } from '../../../shared/rules/rule-schema.ts';
import { AppError } from '../../errors.ts';
import { getMunicipality } from '../settings/get-municipality.ts';
import { placeOf } from '../studies/study-place.ts';

/** Throws INPUT_INVALID, field by field, where the rule cannot be judged here in the year of the studies. */
export async function checkRuleHere(em: EntityManager, rule: Rule): Promise<void> {
  const municipality = await getMunicipality(em);
  const issues = checkRule(rule, placeOf(municipality), municipality.studyYear);
  if (issues.length > 0) {
    refuse(...issues.map(({ path, message }) => ({ path: `rule.${path}`, message })));
  }
}

/** Throws INPUT_INVALID for these fields. */
export function refuse(...errors: { path: string; message: string }[]): never {
  throw new AppError('INPUT_INVALID', { errors });
}
