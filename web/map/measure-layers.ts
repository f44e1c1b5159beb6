import type { LayerSpecification } from 'maplibre-gl';
import { mapPalette as colour } from './map-palette.ts';

/** The line that a person measures along, and its points; over everything else. */
export const measureLayers: LayerSpecification[] = [
  {
    id: 'measured-line-edge',
    type: 'line',
    source: 'measure',
    paint: { 'line-color': colour.sheet, 'line-width': 5 },
  },
  {
    id: 'measured-line',
    type: 'line',
    source: 'measure',
    paint: { 'line-color': colour.ink, 'line-width': 2 },
  },
  {
    id: 'measured-points',
    type: 'circle',
    source: 'measure',
    paint: {
      'circle-radius': 4,
      'circle-color': colour.sheet,
      'circle-stroke-color': colour.ink,
      'circle-stroke-width': 2,
    },
  },
];
