import { z } from 'zod';
import { caseReferenceSchema } from '../../../shared/contracts/cases.ts';
import {
  findingPageSchema,
  findingsSummarySchema,
  instantShadowsSchema,
  listFindingsQuerySchema,
  receptorDetailSchema,
  shadowsQuerySchema,
  studyDetailSchema,
  studyListSchema,
} from '../../../shared/contracts/studies.ts';
import type { StudyDetail } from '../../../shared/contracts/studies.ts';
import { defineEndpoint, defineRawEndpoint } from '../../endpoint.ts';
import { cancelStudy } from './cancel-study.ts';
import { describeStudy } from './describe-study.ts';
import { getReceptor } from './get-receptor.ts';
import { getStudyShadows } from './get-study-shadows.ts';
import { getFinishedStudy, getStudy, listStudies } from './get-study.ts';
import { readStoredInput } from './read-evidence.ts';
import { renderFindingsCsv } from './render-findings-csv.ts';
import { renderFindingsGeojson } from './render-findings-geojson.ts';
import { requestStudy } from './request-study.ts';
import { pageFindingRows, selectFindingRows } from './select-finding-rows.ts';
import { streamStudyProgress } from './stream-study-progress.ts';
import type { Study } from './study.entity.ts';
import { summariseFindings } from './summarise-findings.ts';

const caseParams = z.object({ number: caseReferenceSchema });
const studyParams = z.object({ id: z.uuid() });
const exportQuery = listFindingsQuerySchema.omit({ page: true, pageSize: true });

/** `2026-0001-r2`, to begin the name of a file about this study. */
function fileStem({ reviewCase, massing }: Study): string {
  return `${reviewCase.number ?? reviewCase.draftKey}-r${massing.revision}`;
}

export const studyEndpoints = [
  defineEndpoint({
    method: 'post',
    path: '/api/cases/:number/studies',
    summary: 'Asks for a study of the current massing; a worker computes it.',
    access: ['planner'],
    params: caseParams,
    limit: 'heavy',
    isRepeatable: true,
    status: 202,
    response: studyDetailSchema,
    handler: async ({ em, actor, params, deps }) =>
      describeStudy(em, await requestStudy(em, deps.queue, actor, params.number)),
  }),
  defineEndpoint({
    method: 'get',
    path: '/api/cases/:number/studies',
    summary: 'Lists the studies of a case, the latest first.',
    access: 'anybody',
    params: caseParams,
    response: studyListSchema,
    handler: async ({ em, actor, params }) => {
      const rows: StudyDetail[] = [];
      for (const study of await listStudies(em, actor, params.number)) {
        rows.push(await describeStudy(em, study));
      }
      return { rows };
    },
  }),
  defineEndpoint({
    method: 'get',
    path: '/api/studies/:id',
    summary: 'One study: its progress, its rule, its findings and its instants.',
    access: 'anybody',
    params: studyParams,
    response: studyDetailSchema,
    handler: async ({ em, actor, params }) =>
      describeStudy(em, await getStudy(em, actor, params.id)),
  }),
  defineRawEndpoint({
    method: 'get',
    path: '/api/studies/:id/events',
    summary: 'The progress of a study as server-sent events, until it has ended.',
    access: 'anybody',
    params: studyParams,
    produces: 'text/event-stream',
    handler: async ({ em, actor, params, response }) => {
      const study = await getStudy(em, actor, params.id);
      await streamStudyProgress(em, study.id, response);
    },
  }),
  defineEndpoint({
    method: 'post',
    path: '/api/studies/:id/cancel',
    summary: 'Stops a study that waits or runs.',
    access: ['planner'],
    params: studyParams,
    response: studyDetailSchema,
    handler: async ({ em, actor, params }) =>
      describeStudy(em, await cancelStudy(em, actor, params.id)),
  }),
  defineEndpoint({
    method: 'get',
    path: '/api/studies/:id/shadows',
    summary: 'The shadows on the ground at one instant, before, after and net new.',
    access: 'anybody',
    params: studyParams,
    query: shadowsQuerySchema,
    limit: 'compute',
    response: instantShadowsSchema,
    handler: ({ em, actor, params, query, deps }) =>
      getStudyShadows(em, deps.clipper, actor, params.id, query.at),
  }),
  defineEndpoint({
    method: 'get',
    path: '/api/studies/:id/receptors',
    summary: 'The findings table: a row for each receptor under each clause.',
    access: 'anybody',
    params: studyParams,
    query: listFindingsQuerySchema,
    response: findingPageSchema,
    handler: async ({ em, actor, params, query }) => {
      const study = await getFinishedStudy(em, actor, params.id, ['findingRows']);
      return pageFindingRows(selectFindingRows(study.findingRows ?? [], query), query);
    },
  }),
  defineEndpoint({
    method: 'get',
    path: '/api/studies/:id/clauses',
    summary: 'The findings summed up, clause by clause.',
    access: 'anybody',
    params: studyParams,
    response: findingsSummarySchema,
    handler: async ({ em, actor, params }) => {
      const study = await getFinishedStudy(em, actor, params.id, ['findingRows']);
      const { findings, findingRows, ruleVersion } = study;
      return summariseFindings({ findings, findingRows, rule: ruleVersion.rule });
    },
  }),
  defineRawEndpoint({
    method: 'get',
    path: '/api/studies/:id/receptors.csv',
    summary: 'The findings table as CSV (RFC 4180).',
    access: 'anybody',
    params: studyParams,
    query: exportQuery,
    produces: 'text/csv',
    handler: async ({ em, actor, params, query, response }) => {
      const study = await getFinishedStudy(em, actor, params.id, ['findingRows']);
      response
        .attachment(`${fileStem(study)}-receptors.csv`)
        .type('text/csv; charset=utf-8; header=present')
        .set('Cache-Control', 'private, no-cache')
        .send(renderFindingsCsv(selectFindingRows(study.findingRows ?? [], query)));
    },
  }),
  defineRawEndpoint({
    method: 'get',
    path: '/api/studies/:id/receptors.geojson',
    summary: 'The findings table as GeoJSON (RFC 7946), with the outlines of the receptors.',
    access: 'anybody',
    params: studyParams,
    query: exportQuery,
    produces: 'application/geo+json',
    handler: async ({ em, actor, params, query, response }) => {
      const study = await getFinishedStudy(em, actor, params.id, ['findingRows', 'evidence']);
      const rows = selectFindingRows(study.findingRows ?? [], query);
      const { receptors } = readStoredInput(study);
      response
        .attachment(`${fileStem(study)}-receptors.geojson`)
        .type('application/geo+json')
        .set('Cache-Control', 'private, no-cache')
        .send(JSON.stringify(renderFindingsGeojson(rows, receptors)));
    },
  }),
  defineEndpoint({
    method: 'get',
    path: '/api/studies/:id/receptors/:receptor',
    summary: 'One receptor: its findings and its sun ledger on the key dates.',
    access: 'anybody',
    params: studyParams.extend({ receptor: z.string().min(1).max(100) }),
    limit: 'compute',
    response: receptorDetailSchema,
    handler: ({ em, actor, params }) => getReceptor(em, actor, params.id, params.receptor),
  }),
  defineRawEndpoint({
    method: 'get',
    path: '/api/studies/:id/evidence',
    summary: 'The evidence file: everything that is needed to compute the study again.',
    access: 'anybody',
    params: studyParams,
    produces: 'application/json',
    handler: async ({ em, actor, params, response }) => {
      const study = await getFinishedStudy(em, actor, params.id, ['evidence']);
      response
        .attachment(`${fileStem(study)}.study.json`)
        .type('application/json')
        .set('Cache-Control', 'private, no-cache')
        .send(study.evidence);
    },
  }),
];
