import * as maplibregl from 'maplibre-gl';
import 'maplibre-gl/dist/maplibre-gl.css';
import workerUrl from 'maplibre-gl/dist/maplibre-gl-worker.mjs?worker&url';
import { useEffect, useEffectEvent, useRef, useState } from 'react';
import { useFormats } from '../lib/place-context.ts';
import { formatCamera, type Camera } from './camera-in-url.ts';
import { choiceFilters, layerVisibility, pickLayers, type OverlaySource } from './case-layers.ts';
import type { CaseMapProps, MapPick } from './case-map-props.ts';
import {
  blockFeatures,
  blockLabelFeatures,
  collect,
  middleOf,
  notMetFeatures,
  pinFeatures,
  receptorFeatures,
} from './map-features.ts';
import { drawMapImages, imagePixelRatio } from './map-images.ts';
import { metresPerPixel } from './map-scale.ts';
import { buildMapStyle } from './map-style.ts';
import { NorthAndScale } from './north-and-scale.tsx';

maplibregl.setWorkerUrl(workerUrl);

/** The name of a move that the person asked for by a button of ours, as map events carry it. */
const byPerson = { isByPerson: true };
const fitOptions = { padding: 8, animate: false } as const;

type MapCanvasProps = CaseMapProps & { onTilesMissing: () => void };

/** The drawing itself: creates the map once and carries every change of its props into it. */
export default function MapCanvas(props: MapCanvasProps) {
  const { label, bounds, camera = null, onCameraChange, mode = 'look', onPick } = props;
  const container = useRef<HTMLDivElement>(null);
  const [map, setMap] = useState<maplibregl.Map | null>(null);
  const [metresToPixel, setMetresToPixel] = useState<number | null>(null);
  const [hasFocus, setHasFocus] = useState(false);
  const lastWritten = useRef<string | null>(null);

  const reportCamera = useEffectEvent((moved: maplibregl.Map) => {
    const now = cameraOf(moved);
    lastWritten.current = formatCamera(now);
    onCameraChange?.(now);
  });
  const reportPick = useEffectEvent((picked: maplibregl.Map, point: maplibregl.Point) => {
    onPick?.(pickAt(picked, point));
  });
  const reportTilesMissing = useEffectEvent(() => props.onTilesMissing());
  const showFirstView = useEffectEvent((created: maplibregl.Map) => {
    if (camera === null) created.fitBounds(bounds, fitOptions);
    else created.jumpTo(toJump(camera));
    lastWritten.current = camera === null ? null : formatCamera(camera);
  });

  useEffect(() => {
    if (container.current === null) return;
    const created = new maplibregl.Map({
      container: container.current,
      style: buildMapStyle(`${window.location.origin}/api/tiles/{layer}/{z}/{x}/{y}.mvt`),
      minZoom: 11,
      maxZoom: 21,
      // A closer view stretches the largest tile as a whole; cut up, each piece would carry its names.
      zoomLevelsToOverscale: 10,
      // A plan is seen from above with north up.
      dragRotate: false,
      pitchWithRotate: false,
      touchPitch: false,
      // A finger that scrolls the page shall not be caught by the map.
      cooperativeGestures: window.matchMedia('(pointer: coarse)').matches,
      attributionControl: false,
    });
    created.touchZoomRotate.disableRotation();
    created.keyboard.disableRotation();
    showFirstView(created);
    const measure = () => {
      setMetresToPixel(metresPerPixel(created.getZoom(), created.getCenter().lat));
    };
    measure();
    created.on('move', measure);
    created.on('moveend', (event) => {
      const isByPerson = 'isByPerson' in event || event.originalEvent !== undefined;
      if (isByPerson) reportCamera(created);
    });
    created.on('click', (event) => reportPick(created, event.point));
    created.on('error', () => reportTilesMissing());
    created.on('style.load', () => {
      for (const [name, image] of drawMapImages()) {
        if (!created.hasImage(name)) {
          created.addImage(name, image, { pixelRatio: imagePixelRatio });
        }
      }
      // The sheet may have got its size only after the map was made.
      created.resize();
      setMap(created);
    });
    return () => {
      setMap(null);
      created.remove();
    };
  }, []);

  const cameraText = camera === null ? null : formatCamera(camera);
  const moveToAddress = useEffectEvent((moved: maplibregl.Map, text: string | null) => {
    if (text === lastWritten.current) return;
    lastWritten.current = text;
    if (camera === null) moved.fitBounds(bounds, fitOptions);
    else moved.jumpTo(toJump(camera));
  });
  useEffect(() => {
    if (map !== null) moveToAddress(map, cameraText);
  }, [map, cameraText]);

  const boundsText = bounds.join();
  const frameAgain = useEffectEvent((moved: maplibregl.Map) => {
    if (camera === null) moved.fitBounds(bounds, fitOptions);
  });
  useEffect(() => {
    if (map !== null) frameAgain(map);
  }, [map, boundsText]);

  useEffect(() => {
    const canvas = map?.getCanvas();
    canvas?.setAttribute('aria-label', label);
    canvas?.setAttribute('role', 'application');
    canvas?.setAttribute('aria-roledescription', 'map');
    if (canvas !== undefined) canvas.style.cursor = mode === 'pick' ? 'crosshair' : '';
  }, [map, label, mode]);

  useMapContents(map, props);
  useChosenInView(map, props);

  const zoomBy = (steps: number) => map?.zoomTo(map.getZoom() + steps, {}, byPerson);
  const isPickable = onPick !== undefined;
  return (
    <div
      className="absolute inset-0"
      onFocus={(event) => setHasFocus(event.target instanceof HTMLCanvasElement)}
      onBlur={() => setHasFocus(false)}
      onKeyDown={(event) => {
        if (map === null || !hasFocus || !isPickable) return;
        if (event.key !== 'Enter' && event.key !== ' ') return;
        event.preventDefault();
        onPick(pickAt(map, map.project(map.getCenter())));
      }}
    >
      <div ref={container} className="size-full" />
      {hasFocus && isPickable ? (
        <div
          className="pointer-events-none absolute inset-0 grid place-items-center"
          aria-hidden="true"
        >
          <svg width="36" height="36" stroke="var(--color-ink)" strokeWidth="1.5" fill="none">
            <path d="M18 2v12M18 22v12M2 18h12M22 18h12" />
          </svg>
        </div>
      ) : null}
      <div className="no-print absolute end-2 top-2 grid border border-ink bg-sheet">
        <MapButton label="Zoom in" onPress={() => zoomBy(1)}>
          +
        </MapButton>
        <MapButton label="Zoom out" onPress={() => zoomBy(-1)}>
          −
        </MapButton>
        <MapButton
          label="Show the whole again"
          onPress={() => map?.fitBounds(bounds, fitOptions, byPerson)}
        >
          <svg
            width="14"
            height="14"
            stroke="currentColor"
            strokeWidth="1.4"
            fill="none"
            aria-hidden="true"
          >
            <path d="M1 5V1h4M9 1h4v4M13 9v4H9M5 13H1V9" />
          </svg>
        </MapButton>
      </div>
      {metresToPixel === null ? null : (
        <div className="pointer-events-none absolute start-0 bottom-0 bg-sheet/80 p-2 pe-0">
          <NorthAndScale metresToPixel={metresToPixel} />
        </div>
      )}
    </div>
  );
}

interface MapButtonProps {
  label: string;
  onPress: () => void;
  children: React.ReactNode;
}

function MapButton({ label, onPress, children }: MapButtonProps) {
  return (
    <button
      type="button"
      title={label}
      aria-label={label}
      onClick={onPress}
      className="grid size-8 cursor-pointer place-items-center border-b border-hairline text-lead leading-none last:border-b-0 hover:bg-ink/5"
    >
      {children}
    </button>
  );
}

/** Carries the page's data, choice and layer into the drawing whenever they change. */
function useMapContents(map: maplibregl.Map | null, props: CaseMapProps): void {
  const { site = null, shadows = null, layer = 'after', chosenReceptor = null } = props;
  const { blocks = none, receptors = none, pins = none, pickedParcels = none } = props;
  const { figure } = useFormats();

  useEffect(() => {
    const features =
      site === null ? [] : [{ type: 'Feature' as const, properties: {}, geometry: site }];
    fill(map, 'site', collect(features));
  }, [map, site]);
  useEffect(() => {
    fill(map, 'shadows', collect(shadows?.features ?? []));
  }, [map, shadows]);
  useEffect(() => {
    fill(map, 'blocks', blockFeatures(blocks));
    fill(map, 'block-labels', blockLabelFeatures(blocks, figure.height));
  }, [map, blocks, figure]);
  useEffect(() => {
    fill(map, 'receptors', receptorFeatures(receptors));
    fill(map, 'not-met', notMetFeatures(receptors));
  }, [map, receptors]);
  useEffect(() => {
    fill(map, 'pins', pinFeatures(pins));
  }, [map, pins]);
  useEffect(() => {
    for (const [id, isVisible] of Object.entries(layerVisibility(layer))) {
      map?.setLayoutProperty(id, 'visibility', isVisible ? 'visible' : 'none');
    }
  }, [map, layer]);
  useEffect(() => {
    for (const [id, filter] of Object.entries(choiceFilters(chosenReceptor, pickedParcels))) {
      map?.setFilter(id, filter);
    }
  }, [map, chosenReceptor, pickedParcels]);
}

/** Brings a chosen receptor that lies outside the view into its middle. */
function useChosenInView(map: maplibregl.Map | null, props: CaseMapProps): void {
  const { chosenReceptor = null, receptors = none } = props;
  const reveal = useEffectEvent((moved: maplibregl.Map, id: string) => {
    const chosen = receptors.find((receptor) => receptor.id === id);
    if (chosen === undefined) return;
    const middle = middleOf(chosen.geometry);
    if (!moved.getBounds().contains(middle)) moved.easeTo({ center: middle }, byPerson);
  });
  useEffect(() => {
    if (map !== null && chosenReceptor !== null) reveal(map, chosenReceptor);
  }, [map, chosenReceptor]);
}

/** One empty array for all, so that an absent prop is no change. */
const none: readonly never[] = [];

function fill(
  map: maplibregl.Map | null,
  source: OverlaySource,
  data: GeoJSON.FeatureCollection,
): void {
  void map?.getSource<maplibregl.GeoJSONSource>(source)?.setData(data);
}

function pickAt(map: maplibregl.Map, point: maplibregl.Point): MapPick {
  const { lng, lat } = map.unproject(point);
  const textOf = (layerId: string, property: string): string | null => {
    const [feature] = map.queryRenderedFeatures(point, { layers: [layerId] });
    const value: unknown = feature?.properties[property];
    return typeof value === 'string' ? value : null;
  };
  const number = textOf(pickLayers.parcel, 'number');
  return {
    lngLat: [lng, lat],
    parcel:
      number === null ? null : { number, address: textOf(pickLayers.parcel, 'address') ?? '' },
    receptor: textOf(pickLayers.receptor, 'id'),
    pin: textOf(pickLayers.pin, 'id'),
  };
}

function cameraOf(map: maplibregl.Map): Camera {
  const { lng, lat } = map.getCenter();
  return { longitude: lng, latitude: lat, zoom: map.getZoom() };
}

function toJump({ longitude, latitude, zoom }: Camera): maplibregl.JumpToOptions {
  return { center: [longitude, latitude], zoom };
}
