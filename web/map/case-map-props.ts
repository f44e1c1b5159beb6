import type { ReactNode } from 'react';
import type { InstantShadows } from '../../shared/contracts/studies.ts';
import type { LngLat, Polygonal } from '../../shared/geometry/geojson-schema.ts';
import type { Camera } from './camera-in-url.ts';
import type { ShadowLayer } from './case-layers.ts';
import type { Bounds, MapBlock, MapPin, MapReceptor, MapVolume } from './map-features.ts';

/** What lies under the place that a person pointed at. */
export interface MapPick {
  lngLat: LngLat;
  parcel: { number: string; address: string; use: string } | null;
  /** A building of the base map; heights in metres above the ground. */
  building: { baseM: number; topM: number } | null;
  /** The highest proposed block there. */
  proposal: { baseM: number; topM: number } | null;
  /** The topmost receptor, and all of them. */
  receptor: string | null;
  receptors: readonly string[];
  pin: string | null;
}

export interface CaseMapProps {
  /** What the map shows, in words. */
  label: string;
  /** The view while the person has not moved the map; new bounds frame it anew. */
  bounds: Bounds;
  /** Where the person has moved it, from `useCameraInUrl`. */
  camera?: Camera | null;
  onCameraChange?: (camera: Camera) => void;
  site?: Polygonal | null;
  blocks?: readonly MapBlock[];
  /** What stands around; with it the map can be tilted. */
  surroundings?: readonly MapVolume[];
  shadows?: InstantShadows | null;
  layer?: ShadowLayer;
  receptors?: readonly MapReceptor[];
  chosenReceptor?: string | null;
  /** Numbers of the parcels that are picked out, in marigold. */
  pickedParcels?: readonly string[];
  pins?: readonly MapPin[];
  /** `pick` shows a crosshair: the person is asked to point at something. */
  mode?: 'look' | 'pick';
  /** A click, or Enter and the space bar for the place in the middle. */
  onPick?: (pick: MapPick) => void;
  /** Offers to measure distances. */
  canMeasure?: boolean;
  /** The title block: laid over the map's corner, under it where that is narrow. */
  titleBlock?: ReactNode;
  /** Shown in place of the map where the browser cannot draw it; a plan drawing, a list. */
  fallback?: ReactNode;
  /** The words or the link that lead to the same as a table. */
  alternative?: ReactNode;
  /** The height; a telephone's screen keeps room to scroll by. */
  className?: string;
}
