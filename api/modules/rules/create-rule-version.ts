import { UniqueConstraintViolationException } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { CreateRuleVersionInput } from '../../../shared/contracts/rules.ts';
import type { Actor } from '../../policy.ts';
import { Person } from '../people/person.entity.ts';
import { checkRuleHere, refuse } from './check-rule-here.ts';
import { RuleVersion } from './rule-version.entity.ts';

/**
 * Writes the next version of the municipality's one rule; earlier versions stay as they are. One that
 * cannot be judged there in the year of its studies is refused.
 *
 * @param actor null where the server itself sets up the rule
 */
export async function createRuleVersion(
  em: EntityManager,
  actor: Actor | null,
  { rule, inForceFrom }: CreateRuleVersionInput,
  today: string,
): Promise<RuleVersion> {
  await checkRuleHere(em, rule);
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
      const by = actor === null ? null : await tx.findOneOrFail(Person, actor.id);
      const now = new Date();
      return tx.create(RuleVersion, {
        ruleId: rule.id,
        version: nextVersion,
        inForceFrom,
        rule,
        createdAt: now,
        createdBy: by,
        ...(inForceFrom === null ? {} : { enactedAt: now, enactedBy: by }),
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
