import type { EntityManager } from '@mikro-orm/postgresql';
import { z } from 'zod';
import { tryRuleInputSchema } from '../../../shared/contracts/rule-trials.ts';
import {
  changeRuleDraftInputSchema,
  createRuleVersionInputSchema,
  discardRuleDraftQuerySchema,
  enactRuleVersionInputSchema,
  ruleVersionListSchema,
  ruleVersionSchema,
} from '../../../shared/contracts/rules.ts';
import { defineEmptyEndpoint, defineEndpoint, defineRawEndpoint } from '../../endpoint.ts';
import { AppError } from '../../errors.ts';
import { mayReadRuleDrafts, ruleTriers, ruleWriters, type Actor } from '../../policy.ts';
import { changeRuleDraft, discardRuleDraft, enactRuleVersion } from './change-rule-draft.ts';
import { createRuleVersion } from './create-rule-version.ts';
import { readRuleCalendar } from './find-rule-in-force.ts';
import { RuleVersion } from './rule-version.entity.ts';
import { presentRuleVersion, stateOfVersion } from './rule-version.presenter.ts';
import { streamRuleTrial } from './stream-rule-trial.ts';

const ruleParams = z.object({ id: z.uuid() });
const who = ['createdBy', 'changedBy', 'enactedBy'] as const;

export const rulesEndpoints = [
  defineEndpoint({
    method: 'get',
    path: '/api/rules',
    summary: 'Lists the versions of the rule, the latest first.',
    access: 'anybody',
    response: ruleVersionListSchema,
    handler: async ({ em, actor }) => {
      const calendar = await readRuleCalendar(em);
      const isStaff = mayReadRuleDrafts(actor);
      const versions = await em.findAll(RuleVersion, {
        orderBy: { version: 'desc' },
        populate: [...who],
      });
      const seen = versions.filter((one) => isStaff || !isToCome(stateOfVersion(one, calendar)));
      return {
        rows: seen.map((one) => presentRuleVersion(one, calendar, actor)),
        mayWrite: ruleWriters.some((role) => role === actor?.role),
      };
    },
  }),
  defineEndpoint({
    method: 'get',
    path: '/api/rules/:id',
    summary: 'One version of the rule.',
    access: 'anybody',
    params: ruleParams,
    response: ruleVersionSchema,
    handler: async ({ em, actor, params }) => {
      const calendar = await readRuleCalendar(em);
      const isStaff = mayReadRuleDrafts(actor);
      const version = await em.findOne(RuleVersion, params.id, { populate: [...who] });
      if (version === null || (isToCome(stateOfVersion(version, calendar)) && !isStaff)) {
        throw new AppError('NOT_FOUND');
      }
      return presentRuleVersion(version, calendar, actor);
    },
  }),
  defineEndpoint({
    method: 'post',
    path: '/api/rules',
    summary: 'Writes the next version of the rule, in force from a day; earlier ones stay.',
    access: ruleWriters,
    isRepeatable: true,
    body: createRuleVersionInputSchema,
    status: 201,
    response: ruleVersionSchema,
    handler: async ({ em, actor, body }) => {
      const { today } = await readRuleCalendar(em);
      return present(em, actor, await createRuleVersion(em, actor, body, today));
    },
  }),
  defineEndpoint({
    method: 'put',
    path: '/api/rules/:id',
    summary: 'Writes a version anew that has not come into force.',
    access: ruleWriters,
    params: ruleParams,
    body: changeRuleDraftInputSchema,
    response: ruleVersionSchema,
    handler: async ({ em, actor, params, body }) =>
      present(em, actor, await changeRuleDraft(em, actor, params.id, body)),
  }),
  defineEmptyEndpoint({
    method: 'delete',
    path: '/api/rules/:id',
    summary: 'Throws a version away that has not come into force.',
    access: ruleWriters,
    params: ruleParams,
    query: discardRuleDraftQuerySchema,
    handler: ({ em, params, query }) => discardRuleDraft(em, params.id, query.seen),
  }),
  defineEndpoint({
    method: 'post',
    path: '/api/rules/:id/enactment',
    summary: 'Sets the day from which a version holds, or takes it back before it has come.',
    access: ruleWriters,
    params: ruleParams,
    body: enactRuleVersionInputSchema,
    response: ruleVersionSchema,
    handler: async ({ em, actor, params, body }) =>
      present(em, actor, await enactRuleVersion(em, actor, params.id, body)),
  }),
  defineRawEndpoint({
    method: 'post',
    path: '/api/rules/trials',
    summary:
      'Judges the case of a finished study by a rule beside the version in force and stores nothing: lines of JSON with the progress, then the result.',
    access: ruleTriers,
    limit: 'heavy',
    body: tryRuleInputSchema,
    produces: 'application/x-ndjson',
    handler: ({ em, actor, body, request, response }) =>
      streamRuleTrial(em, actor, body, { request, response }),
  }),
];

/** Only staff may see it. */
function isToCome(state: ReturnType<typeof stateOfVersion>): boolean {
  return state === 'draft' || state === 'scheduled';
}

async function present(em: EntityManager, actor: Actor, version: RuleVersion) {
  return presentRuleVersion(version, await readRuleCalendar(em), actor);
}
