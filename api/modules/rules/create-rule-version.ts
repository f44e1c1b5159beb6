import { UniqueConstraintViolationException } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { CreateRuleVersionInput } from '../../../shared/contracts/rules.ts';
import { checkRule } from '../../../shared/rules/check-rule.ts';
import { AppError } from '../../errors.ts';
import { getMunicipality } from '../settings/get-municipality.ts';
import { placeOf } from '../studies/study-place.ts';
import { RuleVersion } from './rule-version.entity.ts';

/**
 * Writes the next version of the municipality's one rule; earlier versions stay as they are. One that
 * cannot be judged there in the year of its studies is refused.
 */
export async function createRuleVersion(
  em: EntityManager,
  { rule, inForceFrom }: CreateRuleVersionInput,
  today: string,
): Promise<RuleVersion> {
  const municipality = await getMunicipality(em);
  const issues = checkRule(rule, placeOf(municipality), municipality.studyYear);
  if (issues.length > 0) {
    refuse(...issues.map(({ path, message }) => ({ path: `rule.${path}`, message })));
  }
  try {
    return await em.transactional(async (tx) => {
      const latest = await tx.findOne(
        RuleVersion,
        { version: { $gt: 0 } },
        { orderBy: { version: 'desc' } },
      );
      const nextVersion = (latest?.version ?? 0) + 1;
      if (rule.version !== nextVersion) {
        refuse({ path: 'rule.version', message: `The next version is ${nextVersion}.` });
      }
      if (latest !== null && rule.id !== latest.ruleId) {
        refuse({
          path: 'rule.id',
          message: `The rule of this municipality has the id ${latest.ruleId}.`,
        });
      }
      if (inForceFrom !== null && inForceFrom < today) {
        refuse({
          path: 'inForceFrom',
          message: 'A version comes into force today at the earliest.',
        });
      }
      return tx.create(RuleVersion, {
        ruleId: rule.id,
        version: nextVersion,
        inForceFrom,
        rule,
        createdAt: new Date(),
      });
    });
  } catch (error) {
    if (!(error instanceof UniqueConstraintViolationException)) throw error;
    return refuse({
      path: 'rule.version',
      message: 'Somebody has written this version meanwhile.',
    });
  }
}

function refuse(...errors: { path: string; message: string }[]): never {
  throw new AppError('INPUT_INVALID', { errors });
}
