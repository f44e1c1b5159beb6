import type { Box, Ring } from '../geometry/ring.ts';

/** A vertical prism on the local plane: the footprint's rings, and heights in metres above one datum. */
export interface PlaneBlock {
  rings: readonly Ring[];
  /** The box around the footprint. */
  box: Box;
  baseM: number;
  topM: number;
}
