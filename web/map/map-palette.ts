import { palette } from '../../shared/drawing/palette.ts';

/** The drawing's colours and the few tints that only the map on screen needs. */
export const mapPalette = {
  ...palette,
  sheet: '#FBF9F3',
  water: '#E3E6E4',
  netNewGround: '#F6E9E4E6',
  openSpace: '#EFF0E4',
  proposalVolume: '#FFFFFF',
} as const;
