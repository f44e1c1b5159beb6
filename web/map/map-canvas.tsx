import * as maplibregl from 'maplibre-gl';
import 'maplibre-gl/dist/maplibre-gl.css';
import workerUrl from 'maplibre-gl/dist/maplibre-gl-worker.mjs?worker&url';
import { useEffect, useEffectEvent, useRef, useState, type KeyboardEvent } from 'react';
import { formatCamera, mostTiltDeg, type Camera } from './camera-in-url.ts';
import type { CaseMapProps } from './case-map-props.ts';
import { MapControls } from './map-controls.tsx';
import { middleOf } from './map-features.ts';
import { drawMapImages, imagePixelRatio } from './map-images.ts';
import { metresPerPixel } from './map-scale.ts';
import { buildMapStyle } from './map-style.ts';
import { MeasurePanel } from './measure-panel.tsx';
import { NorthAndScale } from './north-and-scale.tsx';
import { pickAt } from './pick-at.ts';
import { useMapContents } from './use-map-contents.ts';
import { useMeasuring } from './use-measuring.ts';

maplibregl.setWorkerUrl(workerUrl);

/** The name of a move that the person asked for by a button of ours, as map events carry it. */
const byPerson = { isByPerson: true };
/** The whole is a plan again: seen from above, with north up. */
const fitOptions = { padding: 8, animate: false, pitch: 0, bearing: 0 } as const;
const tiltDeg = 55;

type MapCanvasProps = CaseMapProps & { onTilesMissing: () => void };

/** The drawing itself: creates the map once and carries every change of its props into it. */
export default function MapCanvas(props: MapCanvasProps) {
  const { label, bounds, camera = null, onCameraChange, mode = 'look', onPick } = props;
  const { surroundings, canMeasure = false } = props;
  const container = useRef<HTMLDivElement>(null);
  const [map, setMap] = useState<maplibregl.Map | null>(null);
  const [view, setView] = useState<Camera | null>(null);
  const [hasFocus, setHasFocus] = useState(false);
  const lastWritten = useRef<string | null>(null);
  const measuring = useMeasuring(map);
  const isTilted = view !== null && view.tiltDeg > 0;

  const reportCamera = useEffectEvent((moved: maplibregl.Map) => {
    const now = cameraOf(moved);
    lastWritten.current = formatCamera(now);
    onCameraChange?.(now);
  });
  const reportPick = useEffectEvent((picked: maplibregl.Map, point: maplibregl.Point) => {
    if (measuring.isMeasuring) measuring.add(lngLatAt(picked, point));
    else onPick?.(pickAt(picked, point));
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
      maxPitch: mostTiltDeg,
      // A closer view stretches the largest tile as a whole; cut up, each piece would carry its names.
      zoomLevelsToOverscale: 10,
      // A plan is seen from above with north up; the buttons tilt and turn it.
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
    const follow = () => setView(cameraOf(created));
    follow();
    created.on('move', follow);
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

  const hasCrosshair = mode === 'pick' || measuring.isMeasuring;
  useEffect(() => {
    const canvas = map?.getCanvas();
    canvas?.setAttribute('aria-label', label);
    canvas?.setAttribute('role', 'application');
    canvas?.setAttribute('aria-roledescription', 'map');
    if (canvas !== undefined) canvas.style.cursor = hasCrosshair ? 'crosshair' : '';
  }, [map, label, hasCrosshair]);

  useMapContents(map, props, isTilted);
  useChosenInView(map, props);

  const isPickable = onPick !== undefined || measuring.isMeasuring;
  const actOnKey = (event: KeyboardEvent) => {
    if (map === null || !hasFocus) return;
    if (measuring.isMeasuring && event.key === 'Escape') measuring.end();
    else if (measuring.isMeasuring && event.key === 'Backspace') measuring.takeBack();
    else if (isPickable && (event.key === 'Enter' || event.key === ' ')) {
      const middle = map.project(map.getCenter());
      if (measuring.isMeasuring) measuring.add(lngLatAt(map, middle));
      else onPick?.(pickAt(map, middle));
    } else return;
    event.preventDefault();
  };
  const move = (options: maplibregl.EaseToOptions) => map?.easeTo(options, byPerson);
  return (
    <div
      className="absolute inset-0"
      onFocus={(event) => setHasFocus(event.target instanceof HTMLCanvasElement)}
      onBlur={() => setHasFocus(false)}
      onKeyDown={actOnKey}
    >
      <div ref={container} className="size-full" />
      {hasFocus && isPickable ? <Cross /> : null}
      {measuring.isMeasuring ? (
        <MeasurePanel
          points={measuring.points}
          onTakeBack={measuring.takeBack}
          onDone={measuring.end}
        />
      ) : null}
      <MapControls
        onZoomIn={() => map?.zoomTo(map.getZoom() + 1, {}, byPerson)}
        onZoomOut={() => map?.zoomTo(map.getZoom() - 1, {}, byPerson)}
        onShowWhole={() => map?.fitBounds(bounds, fitOptions, byPerson)}
        tilt={
          surroundings === undefined
            ? null
            : {
                isTilted,
                onTilt: () => move(isTilted ? { pitch: 0, bearing: 0 } : { pitch: tiltDeg }),
                onTurn: (byDeg) => move({ bearing: (map?.getBearing() ?? 0) + byDeg }),
              }
        }
        measure={
          canMeasure
            ? {
                isMeasuring: measuring.isMeasuring,
                onMeasure: () => {
                  if (measuring.isMeasuring) measuring.end();
                  else measuring.begin();
                  map?.getCanvas().focus();
                },
              }
            : null
        }
      />
      {view === null ? null : (
        <div className="pointer-events-none absolute start-0 bottom-0 bg-sheet/80 p-2 pe-0">
          <NorthAndScale
            metresToPixel={metresPerPixel(view.zoom, view.latitude)}
            bearingDeg={(Math.round(view.bearingDeg) + 360) % 360}
            hasScale={!isTilted}
          />
        </div>
      )}
    </div>
  );
}

/** The middle of the map, where the keyboard points. */
function Cross() {
  return (
    <div
      className="pointer-events-none absolute inset-0 grid place-items-center"
      aria-hidden="true"
    >
      <svg width="36" height="36" stroke="var(--color-ink)" strokeWidth="1.5" fill="none">
        <path d="M18 2v12M18 22v12M2 18h12M22 18h12" />
      </svg>
    </div>
  );
}

/** Brings a chosen receptor that lies outside the view into its middle. */
function useChosenInView(
  map: maplibregl.Map | null,
  { chosenReceptor = null, receptors = [] }: CaseMapProps,
): void {
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

function lngLatAt(map: maplibregl.Map, point: maplibregl.Point): [number, number] {
  const { lng, lat } = map.unproject(point);
  return [lng, lat];
}

function cameraOf(map: maplibregl.Map): Camera {
  const { lng, lat } = map.getCenter();
  return {
    longitude: lng,
    latitude: lat,
    zoom: map.getZoom(),
    tiltDeg: map.getPitch(),
    bearingDeg: map.getBearing(),
  };
}

function toJump({ longitude, latitude, zoom, tiltDeg: pitch, bearingDeg }: Camera) {
  return {
    center: [longitude, latitude],
    zoom,
    pitch,
    bearing: bearingDeg,
  } satisfies maplibregl.JumpToOptions;
}
