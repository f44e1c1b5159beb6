import { z } from 'zod';
import { caseReferenceSchema } from '../../../shared/contracts/cases.ts';
import {
  issueReportInputSchema,
  reportListSchema,
  reportNumberSchema,
  reportSchema,
} from '../../../shared/contracts/reports.ts';
import { defineEndpoint, defineRawEndpoint } from '../../endpoint.ts';
import { issueReport } from './issue-report.ts';
import { getReportPdf, listReports } from './list-reports.ts';
import { presentReport } from './report.presenter.ts';

const caseParams = z.object({ number: caseReferenceSchema });

export const reportEndpoints = [
  defineEndpoint({
    method: 'post',
    path: '/api/cases/:number/reports',
    summary: 'Issues the next staff report: draws it, numbers it and keeps it for ever.',
    access: ['planner'],
    params: caseParams,
    body: issueReportInputSchema,
    limit: 'heavy',
    isRepeatable: true,
    status: 201,
    response: reportSchema,
    handler: async ({ em, actor, params, body, deps }) => {
      const report = await issueReport(em, {
        actor,
        reference: params.number,
        input: body,
        publicUrl: deps.env.PUBLIC_URL,
      });
      return presentReport(report, false);
    },
  }),
  defineEndpoint({
    method: 'get',
    path: '/api/cases/:number/reports',
    summary: 'Lists the staff reports of a case, the latest first.',
    access: 'anybody',
    params: caseParams,
    response: reportListSchema,
    handler: async ({ em, actor, params }) => ({
      rows: await listReports(em, actor, params.number),
    }),
  }),
  defineRawEndpoint({
    method: 'get',
    path: '/api/reports/:number.pdf',
    summary: 'A staff report as PDF, as it was issued.',
    access: 'anybody',
    params: z.object({ number: reportNumberSchema }),
    produces: 'application/pdf',
    handler: async ({ em, actor, params, response }) => {
      const { pdf, sha256 } = await getReportPdf(em, actor, params.number);
      response
        .type('application/pdf')
        .set({
          'Content-Disposition': `inline; filename="${params.number}.pdf"`,
          'Cache-Control': 'private, no-cache',
          ETag: `"${sha256}"`,
        })
        .send(pdf);
    },
  }),
];
