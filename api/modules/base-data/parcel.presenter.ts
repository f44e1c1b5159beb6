import type { Parcel as ParcelDetail } from '../../../shared/contracts/base-data.ts';
import type { Parcel } from './parcel.entity.ts';

export function presentParcel(parcel: Parcel, areaM2: number): ParcelDetail {
  const { number, address, zone, use, geometry } = parcel;
  return { number, address, zone, use, areaM2: Math.round(areaM2 * 100) / 100, geometry };
}
