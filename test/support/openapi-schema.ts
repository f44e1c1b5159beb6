import { z } from 'zod';

/**
 * The form of an OpenAPI document, as far as this API uses it; a member that the specification does not
 * have is refused. From memory of the OpenAPI Specification 3.1.0, sections 4.8.1 to 4.8.27.
 */

/** JSON Schema 2020-12; whether it is sound shows when it is compiled. */
export type SchemaObject = Record<string, unknown>;
const schemaObjectSchema: z.ZodType<SchemaObject> = z.record(z.string(), z.unknown());

const mediaTypeName = z.string().regex(/^[a-z]+\/[a-z0-9.+-]+$/);
const contentSchema = z.record(mediaTypeName, z.strictObject({ schema: schemaObjectSchema }));

const parameterSchema = z.strictObject({
  name: z.string().min(1),
  in: z.enum(['path', 'query', 'header', 'cookie']),
  required: z.boolean(),
  description: z.string().optional(),
  schema: schemaObjectSchema,
});

const operationSchema = z.strictObject({
  operationId: z.string().regex(/^[a-z][a-zA-Z0-9-]*$/),
  summary: z.string().min(1),
  description: z.string().min(1),
  tags: z.array(z.string().min(1)).min(1),
  security: z.array(z.record(z.string(), z.array(z.string()))),
  parameters: z.array(parameterSchema).default([]),
  requestBody: z.strictObject({ required: z.boolean(), content: contentSchema }).optional(),
  responses: z.record(
    z.string().regex(/^(?:[1-5]\d\d|default)$/),
    z.strictObject({ description: z.string().min(1), content: contentSchema.optional() }),
  ),
});

const pathItemSchema = z.strictObject({
  get: operationSchema.optional(),
  put: operationSchema.optional(),
  post: operationSchema.optional(),
  patch: operationSchema.optional(),
  delete: operationSchema.optional(),
});

export const openApiSchema = z.strictObject({
  openapi: z.string().regex(/^3\.1\.\d+$/),
  info: z.strictObject({
    title: z.string().min(1),
    version: z.string().min(1),
    description: z.string(),
  }),
  paths: z.record(z.string().startsWith('/'), pathItemSchema),
  components: z.strictObject({
    schemas: z.record(z.string().regex(/^[a-zA-Z0-9._-]+$/), schemaObjectSchema),
    securitySchemes: z.record(
      z.string(),
      z.strictObject({ type: z.literal('apiKey'), in: z.literal('cookie'), name: z.string() }),
    ),
  }),
});
export type OpenApiDocument = z.output<typeof openApiSchema>;

/** Every operation of a document with its method and path. */
export function operationsOf(document: OpenApiDocument) {
  return Object.entries(document.paths).flatMap(([path, item]) =>
    Object.entries(item).map(([method, operation]) => ({ method, path, operation })),
  );
}

/** A schema of a document as one that checks; throws where it is no sound JSON Schema. */
export function compileSchema(document: OpenApiDocument, schema: SchemaObject): z.ZodType {
  const definitions = Object.entries(document.components.schemas);
  return z.fromJSONSchema({
    ...moveReferences(schema),
    $defs: Object.fromEntries(definitions.map(([name, one]) => [name, moveReferences(one)])),
  });
}

/** Definitions of JSON Schema stand under `$defs`, those of OpenAPI under `components`. */
function moveReferences(schema: SchemaObject): SchemaObject {
  const text = JSON.stringify(schema).replaceAll('"#/components/schemas/', '"#/$defs/');
  return schemaObjectSchema.parse(JSON.parse(text));
}
