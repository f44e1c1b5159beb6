import { createHash } from 'node:crypto';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { Request } from 'express';
import { AppError } from '../errors.ts';
import { IdempotencyKey } from './idempotency-key.entity.ts';
import { requestIdOf } from './request-log.ts';

interface RepeatableWrite {
  em: EntityManager;
  request: Request;
  /** The person's id, or `public`. */
  scope: string;
  fileBytes: Buffer | null;
  status: number;
}

const keyPattern = /^[\x21-\x7e]{8,200}$/;

/**
 * Runs a write once for each `Idempotency-Key`. The key, the effect and the answer are one
 * transaction: a repetition that comes in the middle waits for it, a failed write frees the key.
 */
export async function runOnce(
  { em, request, scope, fileBytes, status }: RepeatableWrite,
  write: (em: EntityManager) => Promise<unknown>,
): Promise<unknown> {
  const key = request.get('idempotency-key');
  if (key === undefined) return write(em);
  if (!keyPattern.test(key)) {
    throw new AppError('INPUT_INVALID', {
      errors: [{ path: 'Idempotency-Key', message: 'Use 8 to 200 visible characters.' }],
    });
  }
  const requestId = requestIdOf(request);
  const fingerprint = fingerprintOf(request, fileBytes);
  return em.transactional(async (tx) => {
    await tx.upsert(
      IdempotencyKey,
      { scope, key, requestId, fingerprint, createdAt: new Date() },
      { onConflictAction: 'ignore', onConflictFields: ['scope', 'key'] },
    );
    const taken = await tx.findOneOrFail(IdempotencyKey, { scope, key }, { refresh: true });
    if (taken.requestId !== requestId) {
      if (taken.fingerprint !== fingerprint) throw new AppError('IDEMPOTENCY_KEY_REUSED');
      return taken.body;
    }
    const body = await write(tx);
    taken.status = status;
    taken.body = body;
    return body;
  });
}

function fingerprintOf(request: Request, fileBytes: Buffer | null): string {
  const hash = createHash('sha256');
  hash.update(`${request.method} ${request.path}\n${JSON.stringify(request.body ?? null)}\n`);
  if (fileBytes !== null) hash.update(fileBytes);
  return hash.digest('hex');
}
