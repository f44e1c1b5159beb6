import type { LayerSpecification } from 'maplibre-gl';
import type { TileLayer } from '../../shared/contracts/base-data.ts';
import { mapPalette as colour } from './map-palette.ts';

export const mapFont = ['Public Sans'];

/** Text on the drawing: ink with an edge of paper, so that lines do not run through it. */
export const inkOnPaper = {
  'text-color': colour.ink,
  'text-halo-color': colour.sheet,
  'text-halo-width': 1.4,
};

/** Paper, water, streets, open space, under the shadows. */
export const groundLayers: LayerSpecification[] = [
  { id: 'paper', type: 'background', paint: { 'background-color': colour.sheet } },
  {
    id: 'open-space',
    type: 'fill',
    source: 'open-space',
    'source-layer': 'open-space',
    paint: { 'fill-color': colour.openSpace },
  },
  {
    id: 'water',
    type: 'fill',
    source: 'water',
    'source-layer': 'water',
    paint: { 'fill-color': colour.water },
  },
  {
    id: 'water-shore',
    type: 'line',
    source: 'water',
    'source-layer': 'water',
    paint: { 'line-color': colour.ink, 'line-opacity': 0.35, 'line-width': 0.8 },
  },
  {
    id: 'streets',
    type: 'fill',
    source: 'streets',
    'source-layer': 'streets',
    paint: { 'fill-color': colour.street },
  },
];

/** Lot lines and buildings, over the shadows as in a plan. */
export const lotLayers: LayerSpecification[] = [
  // Invisible, but the pointer finds the parcel under it here.
  {
    id: 'parcels-fill',
    type: 'fill',
    source: 'parcels',
    'source-layer': 'parcels',
    minzoom: 14,
    paint: { 'fill-color': colour.sheet, 'fill-opacity': 0 },
  },
  {
    id: 'parcels',
    type: 'line',
    source: 'parcels',
    'source-layer': 'parcels',
    minzoom: 14,
    paint: {
      'line-color': colour.ink,
      'line-opacity': ['interpolate', ['linear'], ['zoom'], 14, 0.12, 17, 0.3],
      'line-width': 0.8,
    },
  },
  {
    id: 'buildings',
    type: 'fill',
    source: 'buildings',
    'source-layer': 'buildings',
    paint: { 'fill-color': colour.building },
  },
  {
    id: 'buildings-outline',
    type: 'line',
    source: 'buildings',
    'source-layer': 'buildings',
    paint: {
      'line-color': colour.ink,
      'line-width': ['interpolate', ['linear'], ['zoom'], 13, 0.3, 17, 0.9],
    },
  },
];

/** The areas that carry names. */
export const namedTiles = ['parcels', 'open-space', 'water'] as const satisfies TileLayer[];

/** The source from which an area's names are taken; see map-style.ts. */
export function namesOf(layer: (typeof namedTiles)[number]): string {
  return `${layer}-names`;
}

/** House numbers and names; they lie over everything that the case draws. */
export const nameLayers: LayerSpecification[] = [
  {
    id: 'house-numbers',
    type: 'symbol',
    source: namesOf('parcels'),
    'source-layer': 'parcels',
    minzoom: 16.8,
    layout: {
      'text-field': ['slice', ['get', 'address'], 0, ['index-of', ' ', ['get', 'address']]],
      'text-font': mapFont,
      'text-size': 11,
      'text-padding': 4,
    },
    paint: { ...inkOnPaper, 'text-opacity': 0.85 },
  },
  {
    id: 'open-space-names',
    type: 'symbol',
    source: namesOf('open-space'),
    'source-layer': 'open-space',
    minzoom: 14.5,
    layout: { 'text-field': ['get', 'name'], 'text-font': mapFont, 'text-size': 12 },
    paint: inkOnPaper,
  },
  {
    id: 'water-names',
    type: 'symbol',
    source: namesOf('water'),
    'source-layer': 'water',
    layout: {
      'text-field': ['get', 'name'],
      'text-font': mapFont,
      'text-size': 13,
      'text-letter-spacing': 0.12,
    },
    paint: inkOnPaper,
  },
  {
    id: 'street-names',
    type: 'symbol',
    source: 'street-lines',
    'source-layer': 'street-lines',
    minzoom: 14.5,
    layout: {
      'symbol-placement': 'line',
      'text-field': ['get', 'name'],
      'text-font': mapFont,
      'text-size': 12,
      'text-letter-spacing': 0.04,
      'symbol-spacing': 320,
    },
    paint: inkOnPaper,
  },
];
