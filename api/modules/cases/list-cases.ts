import type { FilterQuery } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import { publicCaseStates } from '../../../shared/contracts/case-life.ts';
import type { CasePage, listCasesQuerySchema } from '../../../shared/contracts/cases.ts';
import { AppError } from '../../errors.ts';
import { containsPattern, parseSort, toWindow } from '../../paging.ts';
import { statesSeenBy } from '../../policy.ts';
import type { Actor } from '../../policy.ts';
import { loadCaseStandings } from './case-standing.ts';
import { presentCaseSummary } from './case.presenter.ts';
import { ReviewCase } from './review-case.entity.ts';

type CasesQuery = z.output<typeof listCasesQuerySchema>;

/** The cases that this person may see in this view, by number, title, address or parcel. */
export async function listCases(
  em: EntityManager,
  actor: Actor | null,
  query: CasesQuery,
): Promise<CasePage> {
  const { field, direction } = parseSort(
    query.sort,
    ['stateSince', 'number', 'title', 'address', 'state', 'applicantName'],
    { field: 'stateSince', direction: 'desc' },
  );
  const conditions = [viewCondition(actor, query.view)];
  if (query.state !== undefined) conditions.push({ state: query.state });
  if (query.q !== undefined && query.q !== '') {
    const pattern = { $ilike: containsPattern(query.q) };
    conditions.push({
      $or: [
        { number: pattern },
        { title: pattern },
        { address: pattern },
        { siteParcels: { $contains: [query.q] } },
      ],
    });
  }
  const [reviewCases, total] = await em.findAndCount(
    ReviewCase,
    { $and: conditions },
    {
      ...toWindow(query),
      populate: ['applicant'],
      orderBy: [
        field === 'applicantName' ? { applicant: { name: direction } } : { [field]: direction },
        { draftKey: 'asc' },
      ],
    },
  );
  const standings = await loadCaseStandings(em, reviewCases);
  return {
    rows: reviewCases.flatMap((reviewCase) => {
      const standing = standings.get(reviewCase.id);
      return standing === undefined ? [] : [presentCaseSummary(actor, reviewCase, standing)];
    }),
    page: query.page,
    pageSize: query.pageSize,
    total,
  };
}

function viewCondition(actor: Actor | null, view: CasesQuery['view']): FilterQuery<ReviewCase> {
  if (view === 'public') return { state: { $in: [...publicCaseStates] } };
  if (actor === null) throw new AppError('NOT_SIGNED_IN');
  if (view === 'mine') return { applicant: actor.id };
  if (actor.role === 'applicant') throw new AppError('FORBIDDEN');
  return { state: { $in: [...statesSeenBy(actor.role)] } };
}
