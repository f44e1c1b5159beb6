import type { EntityManager } from '@mikro-orm/postgresql';
import type { Request, Response } from 'express';
import type { z } from 'zod';
import type { Person, Role } from '../shared/contracts/people.ts';
import type { AppDeps } from './deps.ts';
import type { LimitName } from './middleware/rate-limits.ts';

/** Who may call an endpoint at all; what they may do with one case is decided in policy.ts. */
export type Access = 'anybody' | 'signed-in' | readonly Role[];

type ActorOf<Who extends Access> = Who extends 'anybody' ? Person | null : Person;

/** A file that came as multipart form data. */
export interface UploadedFile {
  fileName: string;
  bytes: Buffer;
}

/** What a handler gets: checked input, who acts, and a fork of the entity manager of its own. */
export interface EndpointContext<Params, Query, Body, Who = Person | null> {
  params: Params;
  query: Query;
  body: Body;
  /** Null where the endpoint takes no upload; where it does, the file is there. */
  file: UploadedFile | null;
  actor: Who;
  em: EntityManager;
  deps: AppDeps;
  request: Request;
  response: Response;
}

interface EndpointSpec<
  Params extends z.ZodType,
  Query extends z.ZodType,
  Body extends z.ZodType,
  Who extends Access,
> {
  method: 'get' | 'post' | 'patch' | 'put' | 'delete';
  /** In Express's form: `/api/cases/:number`. */
  path: `/api/${string}`;
  /** One sentence for the API's document. */
  summary: string;
  access: Who;
  params?: Params;
  query?: Query;
  body?: Body;
  /** Takes one file as multipart form data in this field. */
  upload?: { field: string; maxBytes: number };
  /** Beyond the limit on all writes. */
  limit?: LimitName;
  /** The write may be repeated with an `Idempotency-Key` and then has its effect once. */
  isRepeatable?: boolean;
}

interface JsonSpec<
  Params extends z.ZodType,
  Query extends z.ZodType,
  Body extends z.ZodType,
  Who extends Access,
  Answer extends z.ZodType,
> extends EndpointSpec<Params, Query, Body, Who> {
  status?: 200 | 201 | 202;
  /** What the handler returns passes through this schema: nothing else leaves the server. */
  response: Answer;
  handler(
    context: EndpointContext<z.output<Params>, z.output<Query>, z.output<Body>, ActorOf<Who>>,
  ): Promise<z.input<Answer>>;
}

interface EmptySpec<
  Params extends z.ZodType,
  Query extends z.ZodType,
  Body extends z.ZodType,
  Who extends Access,
> extends EndpointSpec<Params, Query, Body, Who> {
  handler(
    context: EndpointContext<z.output<Params>, z.output<Query>, z.output<Body>, ActorOf<Who>>,
  ): Promise<void>;
}

interface RawSpec<
  Params extends z.ZodType,
  Query extends z.ZodType,
  Body extends z.ZodType,
  Who extends Access,
> extends EmptySpec<Params, Query, Body, Who> {
  /** The content type of what the handler writes to `response` itself. */
  produces: string;
}

/** One endpoint as the routes and the API's document read it. */
export interface Endpoint extends EndpointSpec<z.ZodType, z.ZodType, z.ZodType, Access> {
  answer:
    | { kind: 'json'; status: number; schema: z.ZodType }
    | { kind: 'empty' }
    | { kind: 'raw'; produces: string };
  handler(context: EndpointContext<unknown, unknown, unknown>): Promise<unknown>;
}

/** An endpoint that answers with JSON. */
export function defineEndpoint<
  Answer extends z.ZodType,
  const Who extends Access,
  Params extends z.ZodType = z.ZodUnknown,
  Query extends z.ZodType = z.ZodUnknown,
  Body extends z.ZodType = z.ZodUnknown,
>(spec: JsonSpec<Params, Query, Body, Who, Answer>): Endpoint {
  const { response: schema, status = 200, ...rest } = spec;
  return { ...rest, answer: { kind: 'json', status, schema } };
}

/** An endpoint that answers 204 with no body. */
export function defineEmptyEndpoint<
  const Who extends Access,
  Params extends z.ZodType = z.ZodUnknown,
  Query extends z.ZodType = z.ZodUnknown,
  Body extends z.ZodType = z.ZodUnknown,
>(spec: EmptySpec<Params, Query, Body, Who>): Endpoint {
  return { ...spec, answer: { kind: 'empty' } };
}

/** An endpoint whose handler writes the answer itself: a file, a tile, a stream of events. */
export function defineRawEndpoint<
  const Who extends Access,
  Params extends z.ZodType = z.ZodUnknown,
  Query extends z.ZodType = z.ZodUnknown,
  Body extends z.ZodType = z.ZodUnknown,
>(spec: RawSpec<Params, Query, Body, Who>): Endpoint {
  const { produces, ...rest } = spec;
  return { ...rest, answer: { kind: 'raw', produces } };
}
