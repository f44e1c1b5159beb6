import type { ExpressionSpecification, LayerSpecification } from 'maplibre-gl';
import { inkOnPaper, mapFont } from './base-layers.ts';
import { mapPalette as colour } from './map-palette.ts';

/** What is drawn of an instant: what is shaded now, what will be, or what is shaded only then. */
export const shadowLayers = ['before', 'after', 'net-new'] as const;
export type ShadowLayer = (typeof shadowLayers)[number];

/** The sources that the page fills with its own data. */
export const overlaySources = [
  'shadows',
  'site',
  'blocks',
  'surroundings',
  'block-labels',
  'receptors',
  'not-met',
  'pins',
  'measure',
] as const;
export type OverlaySource = (typeof overlaySources)[number];

/** Images that `map-images.ts` draws. */
export const mapImages = { hatch: 'net-new-hatch', cross: 'not-met-cross', pin: 'pin' } as const;

/** A chain-dotted line: long dash, gap, dot, gap, in widths of the line. */
const chainDotted = [7, 2, 1, 2];

const kindIs = (kind: string): ExpressionSpecification => ['==', ['get', 'kind'], kind];
const roleIs = (role: string): ExpressionSpecification => ['==', ['get', 'role'], role];

export const shadowFillLayers: LayerSpecification[] = [
  ...(['before', 'after'] as const).flatMap((kind): LayerSpecification[] => [
    {
      id: `shadow-${kind}`,
      type: 'fill',
      source: 'shadows',
      filter: kindIs(kind),
      paint: { 'fill-color': colour.shadow, 'fill-opacity': 0.35, 'fill-antialias': false },
    },
    {
      id: `shadow-${kind}-outline`,
      type: 'line',
      source: 'shadows',
      filter: kindIs(kind),
      paint: { 'line-color': colour.shadow, 'line-width': 1 },
    },
  ]),
  {
    id: 'shadow-net-new',
    type: 'fill',
    source: 'shadows',
    filter: kindIs('netNew'),
    paint: { 'fill-pattern': mapImages.hatch },
  },
  {
    id: 'shadow-net-new-outline',
    type: 'line',
    source: 'shadows',
    filter: kindIs('netNew'),
    paint: { 'line-color': colour.madder, 'line-width': 1 },
  },
];

export const proposalLayers: LayerSpecification[] = [
  {
    id: 'existing-blocks',
    type: 'fill',
    source: 'blocks',
    filter: roleIs('existing'),
    paint: { 'fill-color': colour.building },
  },
  {
    id: 'removed-blocks',
    type: 'fill',
    source: 'blocks',
    filter: roleIs('existing'),
    paint: { 'fill-color': colour.sheet },
  },
  {
    id: 'existing-blocks-outline',
    type: 'line',
    source: 'blocks',
    filter: roleIs('existing'),
    paint: { 'line-color': colour.ink, 'line-width': 0.9 },
  },
  {
    id: 'removed-blocks-outline',
    type: 'line',
    source: 'blocks',
    filter: roleIs('existing'),
    paint: { 'line-color': colour.ink, 'line-width': 1, 'line-dasharray': [3, 2] },
  },
  {
    id: 'proposal',
    type: 'fill',
    source: 'blocks',
    filter: roleIs('proposed'),
    paint: { 'fill-color': colour.sheet },
  },
  {
    id: 'proposal-outline',
    type: 'line',
    source: 'blocks',
    filter: roleIs('proposed'),
    layout: { 'line-join': 'miter' },
    paint: { 'line-color': colour.ink, 'line-width': 2 },
  },
  {
    id: 'site',
    type: 'line',
    source: 'site',
    paint: { 'line-color': colour.ink, 'line-width': 1.6, 'line-dasharray': chainDotted },
  },
];

export const receptorLayers: LayerSpecification[] = [
  {
    id: 'receptors-fill',
    type: 'fill',
    source: 'receptors',
    paint: { 'fill-color': colour.sheet, 'fill-opacity': 0 },
  },
  {
    id: 'receptors-not-met',
    type: 'line',
    source: 'receptors',
    filter: ['==', ['get', 'finding'], 'not-met'],
    paint: { 'line-color': colour.madder, 'line-width': 2 },
  },
  {
    id: 'picked-parcels',
    type: 'fill',
    source: 'parcels',
    'source-layer': 'parcels',
    filter: false,
    paint: { 'fill-color': colour.sunFill, 'fill-opacity': 0.3 },
  },
  {
    id: 'picked-parcels-outline',
    type: 'line',
    source: 'parcels',
    'source-layer': 'parcels',
    filter: false,
    paint: { 'line-color': colour.sunLine, 'line-width': 2.6 },
  },
  {
    id: 'chosen-receptor',
    type: 'line',
    source: 'receptors',
    filter: false,
    layout: { 'line-join': 'miter' },
    paint: { 'line-color': colour.sunLine, 'line-width': 3.2 },
  },
  {
    id: 'not-met-cross',
    type: 'symbol',
    source: 'not-met',
    layout: {
      'icon-image': mapImages.cross,
      'icon-size': ['interpolate', ['linear'], ['zoom'], 14, 0.6, 17, 1],
      'icon-allow-overlap': true,
    },
  },
];

/** Heights of the blocks, and pins. */
export const markLayers: LayerSpecification[] = [
  {
    id: 'block-heights',
    type: 'symbol',
    source: 'block-labels',
    minzoom: 15.5,
    layout: {
      'text-field': ['get', 'text'],
      'text-font': mapFont,
      'text-size': 12,
      'text-padding': 0,
    },
    paint: inkOnPaper,
  },
  {
    id: 'pins',
    type: 'symbol',
    source: 'pins',
    layout: {
      'icon-image': mapImages.pin,
      'icon-anchor': 'bottom',
      'icon-allow-overlap': true,
      'icon-size': ['case', ['get', 'isChosen'], 1.25, 1],
      'text-field': ['get', 'label'],
      'text-font': mapFont,
      'text-size': 13,
      'text-anchor': 'left',
      'text-offset': [0.9, -1],
      'text-max-width': 12,
      'text-justify': 'left',
      'text-optional': true,
    },
    paint: inkOnPaper,
  },
];

/** Where a click finds what lies under it, the topmost first. */
export const pickLayers = {
  pin: 'pins',
  receptor: 'receptors-fill',
  proposal: 'proposal',
  building: 'buildings',
  parcel: 'parcels-fill',
} as const;

/** The layers that depend on what of the instant is shown, and whether each is visible. */
export function layerVisibility(layer: ShadowLayer): Record<string, boolean> {
  const isBefore = layer === 'before';
  const isAfter = layer === 'after';
  return {
    'shadow-before': isBefore,
    'shadow-before-outline': isBefore,
    'shadow-after': isAfter,
    'shadow-after-outline': isAfter,
    'shadow-net-new': !isBefore,
    'shadow-net-new-outline': !isBefore,
    'existing-blocks': isBefore,
    'existing-blocks-outline': isBefore,
    'removed-blocks': !isBefore,
    'removed-blocks-outline': !isBefore,
    proposal: !isBefore,
    'proposal-outline': !isBefore,
    'block-heights': !isBefore,
  };
}

/** The filters that depend on what is chosen, by layer. */
export function choiceFilters(
  chosenReceptor: string | null,
  pickedParcels: readonly string[],
): Record<string, ExpressionSpecification> {
  const picked: ExpressionSpecification = [
    'in',
    ['get', 'number'],
    ['literal', [...pickedParcels]],
  ];
  return {
    'chosen-receptor': ['==', ['get', 'id'], chosenReceptor ?? ''],
    'picked-parcels': picked,
    'picked-parcels-outline': picked,
  };
}
