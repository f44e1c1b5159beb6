import { z } from 'zod';
import { errorCodeSchema, problemSchema } from '../../../shared/contracts/problem.ts';
import type { Access, Endpoint } from '../../endpoint.ts';

type JsonObject = Record<string, unknown>;

interface DocumentInfo {
  title: string;
  version: string;
}

/** The OpenAPI 3.1 document of these endpoints; its schemas are those that validate the requests. */
export function buildOpenApiDocument(
  endpoints: readonly Endpoint[],
  info: DocumentInfo,
): JsonObject {
  const schemas = new SchemaCollection();
  const problemRef = schemas.add('Problem', problemSchema, 'output');
  const paths: Record<string, JsonObject> = {};
  for (const endpoint of endpoints) {
    const path = toOpenApiPath(endpoint.path);
    paths[path] = {
      ...paths[path],
      [endpoint.method]: describeOperation(endpoint, schemas, problemRef),
    };
  }
  return {
    openapi: '3.1.0',
    info: {
      ...info,
      description:
        'Errors are problem details (RFC 9457) with a code out of: ' +
        `${errorCodeSchema.options.join(', ')}. Sign in by POST /api/session; the session is a cookie.`,
    },
    paths,
    components: {
      schemas: schemas.all,
      securitySchemes: {
        session: { type: 'apiKey', in: 'cookie', name: 'noonmark.session' },
      },
    },
  };
}

/** Express writes `:number.pdf` where OpenAPI writes `{number}.pdf`. */
export function toOpenApiPath(path: string): string {
  return path.replace(/:(\w+)/g, '{$1}');
}

function describeOperation(
  endpoint: Endpoint,
  schemas: SchemaCollection,
  problemRef: JsonObject,
): JsonObject {
  const { answer, method, path } = endpoint;
  const id = operationId(method, path);
  const parameters = [
    ...describeParameters('path', endpoint.params, schemas, id),
    ...describeParameters('query', endpoint.query, schemas, id),
    ...(endpoint.isRepeatable === true ? [idempotencyParameter] : []),
  ];
  const body = describeBody(endpoint, schemas, id);
  return {
    operationId: id,
    summary: endpoint.summary,
    tags: [path.split('/')[2] ?? 'api'],
    description: describeAccess(endpoint.access),
    security: endpoint.access === 'anybody' ? [{}, { session: [] }] : [{ session: [] }],
    ...(parameters.length === 0 ? {} : { parameters }),
    ...(body === null ? {} : { requestBody: body }),
    responses: {
      ...describeAnswer(answer, schemas, id),
      default: {
        description: 'What went wrong, and what to do.',
        content: { 'application/problem+json': { schema: problemRef } },
      },
    },
  };
}

const idempotencyParameter = {
  name: 'Idempotency-Key',
  in: 'header',
  required: false,
  description: 'A key of your own; the write has its effect once however often it is sent with it.',
  schema: { type: 'string', minLength: 8, maxLength: 200 },
};

function describeParameters(
  place: 'path' | 'query',
  schema: z.ZodType | undefined,
  schemas: SchemaCollection,
  id: string,
): JsonObject[] {
  if (schema === undefined) return [];
  const { properties = {}, required = [] } = parameterObjectSchema.parse(
    schemas.inline(`${id}-${place}`, schema, 'input'),
  );
  return Object.entries(properties).map(([name, property]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    // What is read from a path or a query begins as text.
    schema: Object.keys(property).length === 0 ? { type: 'string' } : property,
  }));
}

const parameterObjectSchema = z.object({
  properties: z.record(z.string(), z.record(z.string(), z.unknown())).optional(),
  required: z.array(z.string()).optional(),
});

function describeBody(
  { upload, body }: Endpoint,
  schemas: SchemaCollection,
  id: string,
): JsonObject | null {
  if (upload !== undefined) {
    const file = { type: 'string', format: 'binary' };
    const schema = {
      type: 'object',
      properties: { [upload.field]: file },
      required: [upload.field],
    };
    return { required: true, content: { 'multipart/form-data': { schema } } };
  }
  if (body === undefined) return null;
  const schema = schemas.inline(`${id}-body`, body, 'input');
  return { required: true, content: { 'application/json': { schema } } };
}

function describeAnswer(
  answer: Endpoint['answer'],
  schemas: SchemaCollection,
  id: string,
): JsonObject {
  switch (answer.kind) {
    case 'empty':
      return { 204: { description: 'Done.' } };
    case 'raw': {
      // Files of JSON have a form of their own, which is published elsewhere.
      const isJson = /[/+]json$/.test(answer.produces);
      const schema = isJson ? { type: 'object' } : { type: 'string', format: 'binary' };
      return { 200: { description: 'Done.', content: { [answer.produces]: { schema } } } };
    }
    case 'json': {
      const schema = schemas.inline(`${id}-answer`, answer.schema, 'output');
      return {
        [answer.status]: { description: 'Done.', content: { 'application/json': { schema } } },
      };
    }
  }
}

function describeAccess(access: Access): string {
  if (access === 'anybody') return 'Open to everybody; what is shown depends on who asks.';
  if (access === 'signed-in') return 'For people who are signed in.';
  return `For: ${access.join(', ')}.`;
}

/** `get /api/cases/:number/massings` → `get-cases-number-massings`. */
function operationId(method: string, path: string): string {
  return [method, ...path.split(/[^\w-]+/).slice(2)].join('-');
}

/** Schemas as JSON Schema; those that refer to themselves stand under components. */
class SchemaCollection {
  readonly all: Record<string, unknown> = {};

  add(name: string, schema: z.ZodType, io: 'input' | 'output'): JsonObject {
    this.all[name] = this.inline(name, schema, io);
    return { $ref: `#/components/schemas/${name}` };
  }

  inline(name: string, schema: z.ZodType, io: 'input' | 'output'): JsonObject {
    const json = z.toJSONSchema(schema, { io, unrepresentable: 'any', cycles: 'ref' });
    const { $schema: _dialect, $defs: definitions = {}, ...root } = json;
    for (const [key, definition] of Object.entries(definitions)) {
      this.all[`${name}-${key}`] = moveReferences(definition, name);
    }
    return { ...(moveReferences(root, name) as JsonObject) };
  }
}

/** Points `#/$defs/x` at where the definition stands now. */
function moveReferences(value: unknown, name: string): unknown {
  if (Array.isArray(value)) return value.map((one) => moveReferences(one, name));
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value).map(([key, one]: [string, unknown]) => [
      key,
      key === '$ref' && typeof one === 'string'
        ? one.replace(/^#\/\$defs\//, `#/components/schemas/${name}-`)
        : moveReferences(one, name),
    ]),
  );
}
