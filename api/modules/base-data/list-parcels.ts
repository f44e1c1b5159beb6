import type { FilterQuery } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import type { listParcelsQuerySchema, ParcelPage } from '../../../shared/contracts/base-data.ts';
import { containsPattern, parseSort, toWindow } from '../../paging.ts';
import { Parcel } from './parcel.entity.ts';
import { presentParcel } from './parcel.presenter.ts';
import { listParcelNumbersAt, measureParcels } from './spatial-queries.ts';

/** Parcels by number or address, by a point, or by a list of numbers; conditions given together all hold. */
export async function listParcels(
  em: EntityManager,
  query: z.output<typeof listParcelsQuerySchema>,
): Promise<ParcelPage> {
  const { field, direction } = parseSort(query.sort, ['number', 'address', 'zone', 'use'], {
    field: 'number',
    direction: 'asc',
  });
  const conditions: FilterQuery<Parcel>[] = [];
  if (query.q !== undefined && query.q !== '') {
    const pattern = containsPattern(query.q);
    conditions.push({ $or: [{ number: { $ilike: pattern } }, { address: { $ilike: pattern } }] });
  }
  if (query.numbers !== undefined) conditions.push({ number: { $in: query.numbers } });
  if (query.at !== undefined) {
    conditions.push({ number: { $in: await listParcelNumbersAt(em, query.at) } });
  }
  const [parcels, total] = await em.findAndCount(
    Parcel,
    { $and: conditions },
    { ...toWindow(query), orderBy: [{ [field]: direction }, { number: 'asc' }] },
  );
  const areas = await measureParcels(
    em,
    parcels.map(({ number }) => number),
  );
  return {
    rows: parcels.map((parcel) => presentParcel(parcel, areas.get(parcel.number) ?? 0)),
    page: query.page,
    pageSize: query.pageSize,
    total,
  };
}
