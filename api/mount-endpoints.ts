import type { Express, Request, RequestHandler, Response } from 'express';
import multer from 'multer';
import type { Person } from '../shared/contracts/people.ts';
import type { AppDeps } from './deps.ts';
import type { Access, Endpoint, UploadedFile } from './endpoint.ts';
import { AppError } from './errors.ts';
import { runOnce } from './middleware/idempotency.ts';
import { createRateLimits } from './middleware/rate-limits.ts';
import { isStorableText, validate } from './middleware/validate.ts';
import { findActor } from './modules/people/find-actor.ts';

/** Mounts every endpoint: limit → who → upload → validate → handle → present. */
export function mountEndpoints(app: Express, endpoints: readonly Endpoint[], deps: AppDeps): void {
  const rateLimits = createRateLimits();
  for (const endpoint of endpoints) {
    const limits = [
      ...(endpoint.method === 'get' ? [] : rateLimits.write),
      ...(endpoint.limit === undefined ? [] : rateLimits[endpoint.limit]),
    ];
    app[endpoint.method](endpoint.path, ...limits, serve(endpoint, deps));
  }
}

function serve(endpoint: Endpoint, deps: AppDeps): RequestHandler {
  const { answer } = endpoint;
  const receive = endpoint.upload === undefined ? null : receiveFile(endpoint.upload);
  return async (request, response) => {
    // Handed on by hand: an ambient context would be lost in stream parsers.
    const em = deps.orm.em.fork();
    const actor = await findActor(em, request.session.personId);
    requireAccess(endpoint.access, actor);
    const file = receive === null ? null : await receive(request, response);
    const input = validate(endpoint, request);
    const context = { ...input, file, actor, em, deps, request, response };

    if (answer.kind === 'raw') {
      await endpoint.handler(context);
      return;
    }
    if (answer.kind === 'empty') {
      await endpoint.handler(context);
      response.status(204).end();
      return;
    }
    const handle = async (own = em) =>
      answer.schema.parse(await endpoint.handler({ ...context, em: own }));
    const body = endpoint.isRepeatable
      ? await runOnce(
          {
            em,
            request,
            scope: actor?.id ?? 'public',
            fileBytes: file?.bytes ?? null,
            status: answer.status,
          },
          handle,
        )
      : await handle();
    // What a person sees depends on who asks.
    if (!response.hasHeader('Cache-Control')) response.set('Cache-Control', 'no-store');
    response.status(answer.status).json(body);
  };
}

function requireAccess(access: Access, actor: Person | null): void {
  if (access === 'anybody') return;
  if (actor === null) throw new AppError('NOT_SIGNED_IN');
  if (access !== 'signed-in' && !access.includes(actor.role)) throw new AppError('FORBIDDEN');
}

function receiveFile({ field, maxBytes }: { field: string; maxBytes: number }) {
  const parse = multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: maxBytes, files: 1, fields: 20, fieldSize: 10_000 },
    defParamCharset: 'utf8',
  }).single(field);
  const refuse = (message: string, path = field) =>
    new AppError('INPUT_INVALID', { errors: [{ path, message }] });
  const toAppError = (error: unknown): AppError => {
    // A form without its boundary, one that breaks off, a sender that has gone.
    if (!(error instanceof multer.MulterError)) {
      return refuse('The upload did not arrive whole. Send the file again, as form data.');
    }
    return error.code === 'LIMIT_FILE_SIZE'
      ? new AppError('UPLOAD_TOO_LARGE')
      : refuse(`Send one file, in the field ${field}.`, error.field);
  };
  return async (request: Request, response: Response): Promise<UploadedFile> => {
    await new Promise<void>((resolve, reject) => {
      parse(request, response, (error: unknown) => {
        if (error === undefined || error === null) resolve();
        else reject(toAppError(error));
      });
    });
    if (request.file === undefined) throw refuse('Choose a file.');
    const { originalname: fileName, buffer: bytes } = request.file;
    if (!isStorableText(fileName)) throw refuse('Give the file another name.');
    return { fileName, bytes };
  };
}
