import type { Shape } from './shape.ts';

export type BuildingKind = 'house' | 'garage' | 'shop' | 'apartment' | 'civic' | 'warehouse';

/** One vertical prism; a building of several heights is several of them. */
export interface Building {
  id: string;
  parcel: string;
  kind: BuildingKind;
  storeys: number;
  baseM: number;
  topM: number;
  /** Where the height comes from and how good it is. */
  heightSource: string;
  shape: Shape;
}

/** A building before it has its number in the register. */
export type BuildingDraft = Omit<Building, 'id' | 'parcel'>;

export const heightSources = {
  lidar: 'Airborne laser scan 2024, ± 0.3 m, at the ridge',
  lidarFlat: 'Airborne laser scan 2024, ± 0.3 m, at the parapet',
  permit: 'Permit drawings, ± 0.1 m',
  storeys: 'Counted storeys × 3.0 m, ± 1.5 m',
} as const;

export const toDecimetre = (heightM: number): number => Math.round(heightM * 10) / 10;
