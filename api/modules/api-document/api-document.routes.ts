import { z } from 'zod';
import { evidenceFileSchema } from '../../../shared/study/evidence-schema.ts';
import { defineEndpoint, defineRawEndpoint } from '../../endpoint.ts';
import type { Endpoint } from '../../endpoint.ts';
import { buildOpenApiDocument } from './build-openapi-document.ts';
import { docsPagePolicy, renderDocsPage } from './render-docs-page.ts';

const documentSchema = z.looseObject({});

/** An input has no results yet; everything that has a default may be left out. */
const studySchema = {
  title: 'A study as one file',
  ...z.toJSONSchema(evidenceFileSchema.partial({ engine: true, results: true, digest: true }), {
    io: 'input',
    unrepresentable: 'any',
  }),
};

/** The endpoints that describe all the others, and themselves. */
export function describeEndpoints(others: readonly Endpoint[], version: string): Endpoint[] {
  const all = () => [...others, ...own];
  let document: Record<string, unknown> | undefined;
  const own: Endpoint[] = [
    defineEndpoint({
      method: 'get',
      path: '/api/openapi.json',
      summary: 'This API as an OpenAPI 3.1 document.',
      access: 'anybody',
      response: documentSchema,
      handler: () => {
        document ??= buildOpenApiDocument(all(), { title: 'Noonmark', version });
        return Promise.resolve(document);
      },
    }),
    defineEndpoint({
      method: 'get',
      path: '/api/schemas/study.json',
      summary: 'The JSON Schema of the evidence file.',
      access: 'anybody',
      response: documentSchema,
      handler: () => Promise.resolve(studySchema),
    }),
    defineRawEndpoint({
      method: 'get',
      path: '/api/docs',
      summary: 'This API as a page to read.',
      access: 'anybody',
      produces: 'text/html',
      handler: ({ response }) => {
        response
          .set('Content-Security-Policy', docsPagePolicy)
          .type('html')
          .send(renderDocsPage(all(), 'Noonmark API'));
        return Promise.resolve();
      },
    }),
  ];
  return own;
}
