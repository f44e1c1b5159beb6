import { UniqueConstraintViolationException } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { CreateRuleVersionInput } from '../../../shared/contracts/rules.ts';
import { AppError } from '../../errors.ts';
import { RuleVersion } from './rule-version.entity.ts';

/** Writes the next version of the municipality's one rule; earlier versions stay as they are. */
export async function createRuleVersion(
  em: EntityManager,
  { rule, inForceFrom }: CreateRuleVersionInput,
  today: string,
): Promise<RuleVersion> {
  try {
    return await em.transactional(async (tx) => {
      const latest = await tx.findOne(
        RuleVersion,
        { version: { $gt: 0 } },
        { orderBy: { version: 'desc' } },
      );
      const nextVersion = (latest?.version ?? 0) + 1;
      if (rule.version !== nextVersion) {
        refuse('rule.version', `The next version is ${nextVersion}.`);
      }
      if (latest !== null && rule.id !== latest.ruleId) {
        refuse('rule.id', `The rule of this municipality has the id ${latest.ruleId}.`);
      }
      if (inForceFrom !== null && inForceFrom < today) {
        refuse('inForceFrom', 'A version comes into force today at the earliest.');
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
    return refuse('rule.version', 'Somebody has written this version meanwhile.');
  }
}

function refuse(path: string, message: string): never {
  throw new AppError('INPUT_INVALID', { errors: [{ path, message }] });
}
