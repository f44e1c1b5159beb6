import { LockMode } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import { CaseCounter } from './case-counter.entity.ts';

/**
 * The next case number of a year: `2026-0001`. Its counter stays locked until the transaction ends,
 * so that one that rolls back leaves no gap.
 */
export async function giveCaseNumber(tx: EntityManager, year: number): Promise<string> {
  await tx.upsert(
    CaseCounter,
    { year, lastNumber: 0 },
    { onConflictAction: 'ignore', onConflictFields: ['year'] },
  );
  const counter = await tx.findOneOrFail(
    CaseCounter,
    { year },
    { lockMode: LockMode.PESSIMISTIC_WRITE, refresh: true },
  );
  counter.lastNumber += 1;
  return `${year}-${String(counter.lastNumber).padStart(4, '0')}`;
}
