import type { SourceSpecification, StyleSpecification } from 'maplibre-gl';
import { type TileLayer } from '../../shared/contracts/base-data.ts';
import { groundLayers, lotLayers, namedTiles, nameLayers, namesOf } from './base-layers.ts';
import {
  markLayers,
  overlaySources,
  proposalLayers,
  receptorLayers,
  shadowFillLayers,
} from './case-layers.ts';
import { measureLayers } from './measure-layers.ts';
import { volumeLayers } from './volume-layers.ts';

const baseTiles: readonly TileLayer[] = [
  'open-space',
  'water',
  'streets',
  'street-lines',
  'parcels',
  'buildings',
];

/** A tile of zoom 16 resolves 0.1 m here; closer views stretch it. */
const deepestTileZoom = 16;
/** An area that is cut by a tile's edge would be named in each part: names come from large tiles. */
const nameTileZoom = 13;

/**
 * The whole drawing: the base from the municipality's own tiles, everything else from the page.
 *
 * @param tilesUrl absolute, with `{layer}` in it; MapLibre fills in z, x and y
 */
export function buildMapStyle(tilesUrl: string): StyleSpecification {
  const tileSource = (layer: TileLayer, maxzoom: number): SourceSpecification => ({
    type: 'vector',
    tiles: [tilesUrl.replace('{layer}', layer)],
    minzoom: 10,
    maxzoom,
  });
  const empty: SourceSpecification = {
    type: 'geojson',
    data: { type: 'FeatureCollection', features: [] },
    // Shadows and footprints are drawn to the vertex, not simplified.
    tolerance: 0,
  };
  return {
    version: 8,
    sources: {
      ...Object.fromEntries(baseTiles.map((layer) => [layer, tileSource(layer, deepestTileZoom)])),
      ...Object.fromEntries(
        namedTiles.map((layer) => [namesOf(layer), tileSource(layer, nameTileZoom)]),
      ),
      ...Object.fromEntries(overlaySources.map((source) => [source, empty])),
    },
    layers: [
      ...groundLayers,
      ...shadowFillLayers,
      ...lotLayers,
      ...proposalLayers,
      ...receptorLayers,
      ...volumeLayers,
      ...nameLayers,
      ...markLayers,
      ...measureLayers,
    ],
  };
}
