import { z } from 'zod';
import {
  caseDetailSchema,
  casePageSchema,
  caseReferenceSchema,
  createCaseInputSchema,
  listCasesQuerySchema,
  transitionInputSchema,
  updateCaseInputSchema,
} from '../../../shared/contracts/cases.ts';
import { defineEndpoint } from '../../endpoint.ts';
import { changeCaseState } from './change-case-state.ts';
import { createCase } from './create-case.ts';
import { getCaseDetail } from './get-case-detail.ts';
import { getCase } from './get-case.ts';
import { listCases } from './list-cases.ts';
import { updateCase } from './update-case.ts';

const caseParams = z.object({ number: caseReferenceSchema });

export const casesEndpoints = [
  defineEndpoint({
    method: 'get',
    path: '/api/cases',
    summary: 'Lists cases: the public ones, the own ones, or all that staff work on.',
    access: 'anybody',
    query: listCasesQuerySchema,
    response: casePageSchema,
    handler: ({ em, actor, query }) => listCases(em, actor, query),
  }),
  defineEndpoint({
    method: 'post',
    path: '/api/cases',
    summary: 'Starts an application as a draft.',
    access: ['applicant'],
    isRepeatable: true,
    body: createCaseInputSchema,
    status: 201,
    response: caseDetailSchema,
    handler: async ({ em, actor, body }) =>
      getCaseDetail(em, actor, await createCase(em, actor, body)),
  }),
  defineEndpoint({
    method: 'get',
    path: '/api/cases/:number',
    summary: 'One case with its history and what you may do with it.',
    access: 'anybody',
    params: caseParams,
    response: caseDetailSchema,
    handler: async ({ em, actor, params }) =>
      getCaseDetail(em, actor, await getCase(em, actor, params.number)),
  }),
  defineEndpoint({
    method: 'patch',
    path: '/api/cases/:number',
    summary: 'Changes what the applicant wrote, while it is a draft or sent back.',
    access: ['applicant'],
    params: caseParams,
    body: updateCaseInputSchema,
    response: caseDetailSchema,
    handler: async ({ em, actor, params, body }) =>
      getCaseDetail(em, actor, await updateCase(em, actor, params.number, body)),
  }),
  defineEndpoint({
    method: 'post',
    path: '/api/cases/:number/transitions',
    summary: 'Takes a case to its next state.',
    access: ['applicant', 'planner'],
    isRepeatable: true,
    params: caseParams,
    body: transitionInputSchema,
    response: caseDetailSchema,
    handler: async ({ em, actor, params, body }) =>
      getCaseDetail(em, actor, await changeCaseState(em, actor, params.number, body, new Date())),
  }),
];
