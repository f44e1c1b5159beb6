import type { Frame } from './frame.ts';

/** Widths and spacings of a plan's lines, in px or points. */
export interface Pen {
  parcel: number;
  building: number;
  shadowLine: number;
  hatch: number;
  hatchSpacing: number;
  waterSpacing: number;
  site: number;
  siteDashes: string;
  proposal: number;
  receptor: number;
  frame: number;
}

/** A smaller sheet has finer lines and smaller words, down to what can still be read on paper. */
export function sheetUnit(frame: Frame): number {
  return Math.min(Math.max(frame.width / 480, 0.7), 1);
}

export function sheetPen(unit: number): Pen {
  return {
    parcel: 0.5 * unit,
    building: 0.7 * unit,
    shadowLine: unit,
    hatch: 1.1 * unit,
    hatchSpacing: 5 * unit,
    waterSpacing: 4.5,
    site: 1.5 * unit,
    siteDashes: [10, 3, 2, 3].map((length) => (length * unit).toFixed(1)).join(' '),
    proposal: 2 * unit,
    receptor: 1.4 * unit,
    frame: 1.2,
  };
}

export const smallPen: Pen = {
  parcel: 0.25,
  building: 0.3,
  shadowLine: 0.4,
  hatch: 0.55,
  hatchSpacing: 2.4,
  waterSpacing: 4,
  site: 0.8,
  siteDashes: '4 1.2 0.8 1.2',
  proposal: 0.9,
  receptor: 0.7,
  frame: 0.8,
};
