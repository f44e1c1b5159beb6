import { z } from 'zod';
import { caseReferenceSchema } from '../../../shared/contracts/cases.ts';
import {
  massingComparisonSchema,
  massingDetailSchema,
  massingLimits,
  massingListSchema,
} from '../../../shared/contracts/massings.ts';
import { defineEndpoint, defineRawEndpoint } from '../../endpoint.ts';
import { createMassing } from './create-massing.ts';
import { getMassing, listMassings } from './get-massing.ts';
import {
  presentMassingComparison,
  presentMassingDetail,
  presentMassingSummary,
} from './massing.presenter.ts';

const revisionSchema = z.coerce.number().int().min(1).max(1_000_000);
const caseParams = z.object({ number: caseReferenceSchema });
const revisionParams = caseParams.extend({ revision: revisionSchema });

export const massingEndpoints = [
  defineEndpoint({
    method: 'post',
    path: '/api/cases/:number/massings',
    summary: 'Stores a massing file as the next revision and tells what was read from it.',
    access: ['applicant'],
    params: caseParams,
    upload: { field: 'file', maxBytes: massingLimits.fileBytes },
    limit: 'heavy',
    isRepeatable: true,
    status: 201,
    response: massingDetailSchema,
    handler: async ({ em, actor, params, file }) => {
      if (file === null) throw new Error('The upload is missing.');
      return presentMassingDetail(await createMassing(em, actor, params.number, file));
    },
  }),
  defineEndpoint({
    method: 'get',
    path: '/api/cases/:number/massings',
    summary: 'Lists the massing revisions of a case, the latest first.',
    access: 'anybody',
    params: caseParams,
    response: massingListSchema,
    handler: async ({ em, actor, params }) => ({
      rows: (await listMassings(em, actor, params.number)).map(presentMassingSummary),
    }),
  }),
  defineEndpoint({
    method: 'get',
    path: '/api/cases/:number/massings/comparison',
    summary: 'Tells block by block what changed from one revision to another.',
    access: 'anybody',
    params: caseParams,
    query: z.object({ from: revisionSchema, to: revisionSchema }),
    response: massingComparisonSchema,
    handler: async ({ em, actor, params, query }) =>
      presentMassingComparison(
        await getMassing(em, actor, params.number, query.from, 'blocks'),
        await getMassing(em, actor, params.number, query.to, 'blocks'),
      ),
  }),
  defineEndpoint({
    method: 'get',
    path: '/api/cases/:number/massings/:revision',
    summary: 'One massing revision: its blocks, its figures and what is wrong with it.',
    access: 'anybody',
    params: revisionParams,
    response: massingDetailSchema,
    handler: async ({ em, actor, params }) =>
      presentMassingDetail(await getMassing(em, actor, params.number, params.revision, 'blocks')),
  }),
  defineRawEndpoint({
    method: 'get',
    path: '/api/cases/:number/massings/:revision/original',
    summary: 'The massing file, to the byte as it was sent.',
    access: 'anybody',
    params: revisionParams,
    produces: 'application/octet-stream',
    handler: async ({ em, actor, params, response }) => {
      const massing = await getMassing(em, actor, params.number, params.revision, 'original');
      response
        .attachment(massing.fileName)
        .type('application/octet-stream')
        .set('Cache-Control', 'private, no-cache')
        .send(massing.original);
    },
  }),
];
