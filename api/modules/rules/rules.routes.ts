import type { EntityManager } from '@mikro-orm/postgresql';
import { z } from 'zod';
import {
  createRuleVersionInputSchema,
  ruleVersionListSchema,
  ruleVersionSchema,
} from '../../../shared/contracts/rules.ts';
import { defineEndpoint } from '../../endpoint.ts';
import { AppError } from '../../errors.ts';
import { mayReadRuleDrafts } from '../../policy.ts';
import { civilDateIn, getMunicipality } from '../settings/get-municipality.ts';
import { createRuleVersion } from './create-rule-version.ts';
import { findRuleInForce } from './find-rule-in-force.ts';
import { RuleVersion } from './rule-version.entity.ts';
import { presentRuleVersion } from './rule-version.presenter.ts';

export const rulesEndpoints = [
  defineEndpoint({
    method: 'get',
    path: '/api/rules',
    summary: 'Lists the versions of the rule, the latest first.',
    access: 'anybody',
    response: ruleVersionListSchema,
    handler: async ({ em, actor }) => {
      const { today, inForce } = await readCalendar(em);
      const versions = await em.find(RuleVersion, {}, { orderBy: { version: 'desc' } });
      const rows = versions.map((one) => presentRuleVersion(one, inForce, today));
      return { rows: rows.filter(({ state }) => state !== 'draft' || mayReadRuleDrafts(actor)) };
    },
  }),
  defineEndpoint({
    method: 'get',
    path: '/api/rules/:id',
    summary: 'One version of the rule.',
    access: 'anybody',
    params: z.object({ id: z.uuid() }),
    response: ruleVersionSchema,
    handler: async ({ em, actor, params }) => {
      const { today, inForce } = await readCalendar(em);
      const version = await em.findOne(RuleVersion, params.id);
      const row = version === null ? null : presentRuleVersion(version, inForce, today);
      if (row === null || (row.state === 'draft' && !mayReadRuleDrafts(actor))) {
        throw new AppError('NOT_FOUND');
      }
      return row;
    },
  }),
  defineEndpoint({
    method: 'post',
    path: '/api/rules',
    summary: 'Writes the next version of the rule, in force from a day; earlier ones stay.',
    access: ['administrator'],
    isRepeatable: true,
    body: createRuleVersionInputSchema,
    status: 201,
    response: ruleVersionSchema,
    handler: async ({ em, body }) => {
      const { today } = await readCalendar(em);
      const version = await createRuleVersion(em, body, today);
      return presentRuleVersion(version, await findRuleInForce(em, today), today);
    },
  }),
];

/** Today in the municipality, and the version that holds. */
async function readCalendar(
  em: EntityManager,
): Promise<{ today: string; inForce: RuleVersion | null }> {
  const today = civilDateIn(await getMunicipality(em), new Date());
  return { today, inForce: await findRuleInForce(em, today) };
}
