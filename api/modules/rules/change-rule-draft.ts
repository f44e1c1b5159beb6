import { LockMode } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import type {
  ChangeRuleDraftInput,
  EnactRuleVersionInput,
} from '../../../shared/contracts/rules.ts';
import { AppError } from '../../errors.ts';
import type { Actor } from '../../policy.ts';
import { Person } from '../people/person.entity.ts';
import { checkRuleHere, refuse } from './check-rule-here.ts';
import { readRuleCalendar } from './find-rule-in-force.ts';
import { RuleVersion } from './rule-version.entity.ts';
import { stampOf, stateOfVersion, type RuleCalendar } from './rule-version.presenter.ts';

/** Writes a draft anew. Throws RULE_IS_KEPT, RULE_CHANGED_MEANWHILE or INPUT_INVALID. */
export async function changeRuleDraft(
  em: EntityManager,
  actor: Actor,
  id: string,
  { rule, seen }: ChangeRuleDraftInput,
): Promise<RuleVersion> {
  await checkRuleHere(em, rule);
  return em.transactional(async (tx) => {
    const { version } = await lockDraft(tx, id, seen);
    if (rule.version !== version.version) {
      refuse({ path: 'rule.version', message: `This is version ${version.version}.` });
    }
    if (rule.id !== version.ruleId) {
      refuse({
        path: 'rule.id',
        message: `The rule of this municipality has the id ${version.ruleId}.`,
      });
    }
    return tx.assign(version, {
      rule,
      changedAt: new Date(),
      changedBy: await tx.findOneOrFail(Person, actor.id),
    });
  });
}

/** Throws a draft away. Throws RULE_IS_KEPT or RULE_CHANGED_MEANWHILE. */
export async function discardRuleDraft(em: EntityManager, id: string, seen: string): Promise<void> {
  await em.transactional(async (tx) => {
    const { version } = await lockDraft(tx, id, seen);
    tx.remove(version);
  });
}

/**
 * Sets the day from which a version holds, or takes it back before it has come. Throws RULE_IS_KEPT,
 * RULE_CHANGED_MEANWHILE or INPUT_INVALID.
 */
export async function enactRuleVersion(
  em: EntityManager,
  actor: Actor,
  id: string,
  { inForceFrom, seen }: EnactRuleVersionInput,
): Promise<RuleVersion> {
  return em.transactional(async (tx) => {
    const { version, calendar } = await lockDraft(tx, id, seen);
    if (inForceFrom === null) {
      return tx.assign(version, { inForceFrom, enactedAt: null, enactedBy: null });
    }
    if (inForceFrom < calendar.today) {
      refuse({ path: 'inForceFrom', message: 'A version comes into force today at the earliest.' });
    }
    const other = await tx.findOne(
      RuleVersion,
      { inForceFrom, version: { $gt: version.version } },
      { orderBy: { version: 'desc' } },
    );
    if (other !== null) {
      refuse({
        path: 'inForceFrom',
        message: `Version ${other.version} comes into force on the same day and would hold in its place. Choose a later day.`,
      });
    }
    // The year of the studies may be another since it was written.
    await checkRuleHere(tx, version.rule);
    return tx.assign(version, {
      inForceFrom,
      enactedAt: new Date(),
      enactedBy: await tx.findOneOrFail(Person, actor.id),
    });
  });
}

/** A version that has not come into force, held against others for the time of the transaction. */
async function lockDraft(
  tx: EntityManager,
  id: string,
  seen: string,
): Promise<{ version: RuleVersion; calendar: RuleCalendar }> {
  const version = await tx.findOne(RuleVersion, id, { lockMode: LockMode.PESSIMISTIC_WRITE });
  if (version === null) throw new AppError('NOT_FOUND');
  const calendar = await readRuleCalendar(tx);
  const state = stateOfVersion(version, calendar);
  if (state !== 'draft' && state !== 'scheduled') throw new AppError('RULE_IS_KEPT');
  if (stampOf(version) !== seen) throw new AppError('RULE_CHANGED_MEANWHILE');
  await tx.populate(version, ['createdBy', 'changedBy', 'enactedBy']);
  return { version, calendar };
}
