import type { EntityManager } from '@mikro-orm/postgresql';
import type { Point } from 'geojson';
import type { Polygonal } from '../../../shared/geometry/geojson-schema.ts';
import { AppError } from '../../errors.ts';
import { Parcel } from '../base-data/parcel.entity.ts';
import { dissolveParcels } from '../base-data/spatial-queries.ts';

/** What a case keeps of the parcels that make up its site. */
export interface Site {
  siteParcels: string[];
  address: string;
  site: Polygonal;
  sitePoint: Point;
}

/** The site of these parcels. Throws INPUT_INVALID naming each one that is not in the register. */
export async function pickSite(em: EntityManager, numbers: readonly string[]): Promise<Site> {
  const siteParcels = [...new Set(numbers)];
  const parcels = await em.find(Parcel, { number: { $in: siteParcels } });
  const byNumber = new Map(parcels.map((parcel) => [parcel.number, parcel]));
  const errors = numbers.flatMap((number, index) =>
    byNumber.has(number)
      ? []
      : [{ path: `siteParcels.${index}`, message: `There is no parcel ${number}.` }],
  );
  if (errors.length > 0) throw new AppError('INPUT_INVALID', { errors });
  const dissolved = await dissolveParcels(em, siteParcels);
  if (dissolved === null) throw new Error('Parcels that exist have an area.');
  const addresses = siteParcels.map((number) => byNumber.get(number)?.address ?? '');
  return {
    siteParcels,
    address: [...new Set(addresses)].filter((address) => address !== '').join(', '),
    ...dissolved,
  };
}
