import type * as maplibregl from 'maplibre-gl';
import { useEffect } from 'react';
import { useFormats } from '../lib/place-context.ts';
import { choiceFilters, layerVisibility, type OverlaySource } from './case-layers.ts';
import type { CaseMapProps } from './case-map-props.ts';
import {
  blockFeatures,
  blockLabelFeatures,
  collect,
  notMetFeatures,
  pinFeatures,
  receptorFeatures,
  volumeFeatures,
} from './map-features.ts';
import { volumeVisibility } from './volume-layers.ts';

/** One empty array for all, so that an absent prop is no change. */
const none: readonly never[] = [];

/** The light of the tilted view comes from the sun of the instant, or from the north-west without one. */
const defaultLight = { azimuthDeg: 315, altitudeDeg: 45 };

/** Carries the page's data, choice and layer into the drawing whenever they change. */
export function useMapContents(
  map: maplibregl.Map | null,
  props: CaseMapProps,
  isTilted: boolean,
): void {
  const { site = null, shadows = null, layer = 'after', chosenReceptor = null } = props;
  const { blocks = none, receptors = none, pins = none, pickedParcels = none } = props;
  const { surroundings = none } = props;
  const { figure } = useFormats();

  useEffect(() => {
    const features =
      site === null ? [] : [{ type: 'Feature' as const, properties: {}, geometry: site }];
    fillSource(map, 'site', collect(features));
  }, [map, site]);
  useEffect(() => {
    fillSource(map, 'shadows', collect(shadows?.features ?? []));
  }, [map, shadows]);
  useEffect(() => {
    fillSource(map, 'blocks', blockFeatures(blocks));
    fillSource(map, 'block-labels', blockLabelFeatures(blocks, figure.height));
  }, [map, blocks, figure]);
  useEffect(() => {
    // A plan never pays for the volumes.
    if (isTilted) fillSource(map, 'surroundings', volumeFeatures(surroundings));
  }, [map, surroundings, isTilted]);
  useEffect(() => {
    fillSource(map, 'receptors', receptorFeatures(receptors));
    fillSource(map, 'not-met', notMetFeatures(receptors));
  }, [map, receptors]);
  useEffect(() => {
    fillSource(map, 'pins', pinFeatures(pins));
  }, [map, pins]);
  useEffect(() => {
    const shown = { ...layerVisibility(layer), ...volumeVisibility(isTilted, layer === 'before') };
    for (const [id, isVisible] of Object.entries(shown)) {
      map?.setLayoutProperty(id, 'visibility', isVisible ? 'visible' : 'none');
    }
  }, [map, layer, isTilted]);
  useEffect(() => {
    for (const [id, filter] of Object.entries(choiceFilters(chosenReceptor, pickedParcels))) {
      map?.setFilter(id, filter);
    }
  }, [map, chosenReceptor, pickedParcels]);
  const { azimuthDeg, altitudeDeg } = shadows ?? defaultLight;
  useEffect(() => {
    if (!isTilted) return;
    map?.setLight({
      anchor: 'map',
      position: [1.2, azimuthDeg, 90 - altitudeDeg],
      color: '#FFFFFF',
      intensity: 0.35,
    });
  }, [map, isTilted, azimuthDeg, altitudeDeg]);
}

/** Puts features into one of the sources that the page fills. */
export function fillSource(
  map: maplibregl.Map | null,
  source: OverlaySource,
  data: GeoJSON.FeatureCollection,
): void {
  void map?.getSource<maplibregl.GeoJSONSource>(source)?.setData(data);
}
