import { describe, expect, it } from 'vitest';
import { tileLayers } from '../../../shared/contracts/base-data.ts';
import {
  choiceFilters,
  layerVisibility,
  overlaySources,
  pickLayers,
  shadowLayers,
} from '../../../web/map/case-layers.ts';
import { buildMapStyle } from '../../../web/map/map-style.ts';
import { volumeVisibility } from '../../../web/map/volume-layers.ts';

const style = buildMapStyle('https://town.example/api/tiles/{layer}/{z}/{x}/{y}.mvt');
const layerIds = style.layers.map((layer) => layer.id);

describe('the map’s style', () => {
  it('gives every layer a name of its own', () => {
    expect(new Set(layerIds).size).toBe(layerIds.length);
  });

  it('draws from sources that exist', () => {
    for (const layer of style.layers) {
      if (layer.type === 'background') continue;
      expect(Object.keys(style.sources)).toContain(layer.source);
    }
  });

  it('shows every tile layer of the server and every overlay', () => {
    const drawn = new Set(
      style.layers.flatMap((layer) => ('source' in layer ? [layer.source] : [])),
    );
    for (const source of [...Object.keys(tileLayers), ...overlaySources]) {
      expect([...drawn]).toContain(source);
    }
  });

  it('asks our own server for tiles, with MapLibre’s places for z, x and y', () => {
    expect(style.sources['street-lines']).toMatchObject({
      tiles: ['https://town.example/api/tiles/street-lines/{z}/{x}/{y}.mvt'],
    });
  });

  it('draws shadows over the ground, buildings over shadows, the proposal over buildings', () => {
    const order = ['streets', 'shadow-after', 'shadow-net-new', 'buildings', 'proposal', 'site'];
    const places = order.map((id) => layerIds.indexOf(id));
    expect(places).toEqual(places.toSorted((a, b) => a - b));
    expect(places).not.toContain(-1);
  });

  it('switches and filters only layers that exist', () => {
    const switched = [
      ...shadowLayers.flatMap((layer) => Object.keys(layerVisibility(layer))),
      ...Object.keys(volumeVisibility(true, false)),
    ];
    const filtered = Object.keys(choiceFilters('a', ['b']));
    for (const id of [...switched, ...filtered, ...Object.values(pickLayers)]) {
      expect(layerIds).toContain(id);
    }
  });
});

describe('layerVisibility', () => {
  const shown = (layer: (typeof shadowLayers)[number]) =>
    Object.entries(layerVisibility(layer)).flatMap(([id, isVisible]) => (isVisible ? [id] : []));

  it('shows before without the proposal and its net new shadow', () => {
    expect(shown('before')).toContain('shadow-before');
    expect(shown('before').some((id) => /after|net-new|^proposal/.test(id))).toBe(false);
  });

  it('shows after with the net new part hatched over it', () => {
    expect(shown('after')).toEqual(expect.arrayContaining(['shadow-after', 'shadow-net-new']));
    expect(shown('after')).not.toContain('shadow-before');
  });

  it('shows the difference alone', () => {
    const fills = shown('net-new').filter((id) => id.startsWith('shadow'));
    expect(fills).toEqual(['shadow-net-new', 'shadow-net-new-outline']);
  });
});

describe('volumeVisibility', () => {
  const standing = (isTilted: boolean, isBefore: boolean) =>
    Object.entries(volumeVisibility(isTilted, isBefore)).flatMap(([id, isShown]) =>
      isShown ? [id] : [],
    );

  it('shows volumes in the tilted view alone', () => {
    expect(standing(false, false)).toEqual([]);
    expect(standing(false, true)).toEqual([]);
  });

  it('shows the proposal after, and what it replaces before', () => {
    expect(standing(true, false)).toEqual(['surroundings-volume', 'proposal-volume']);
    expect(standing(true, true)).toEqual(['surroundings-volume', 'existing-volume']);
  });
});
