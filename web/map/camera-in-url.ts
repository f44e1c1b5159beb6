import { useCallback, useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';

/** What a map shows: its middle and zoom, and where a tilted view looks. */
export interface Camera {
  longitude: number;
  latitude: number;
  zoom: number;
  /** Degrees from straight above; 0 is a plan, and a plan has north up. */
  tiltDeg: number;
  /** What is up on the screen, degrees clockwise from true north. */
  bearingDeg: number;
}

const parameter = 'view';

/** Flatter views would show more sky than ground. */
export const mostTiltDeg = 60;

/** Decimals of a degree that still matter at a zoom: a tenth of a pixel. */
function decimalsAtZoom(zoom: number): number {
  return Math.max(2, Math.ceil((zoom * Math.LN2 + Math.log(512 / 360 / 0.1)) / Math.LN10));
}

/** `17.25/46.75012/-91.30021`: zoom, latitude, longitude; a tilted view adds its tilt and bearing. */
export function formatCamera({ zoom, latitude, longitude, tiltDeg, bearingDeg }: Camera): string {
  const decimals = decimalsAtZoom(zoom);
  const shortZoom = Number(zoom.toFixed(2));
  const plan = `${shortZoom}/${latitude.toFixed(decimals)}/${longitude.toFixed(decimals)}`;
  const [tilt, bearing] = [Math.round(tiltDeg), (Math.round(bearingDeg) + 360) % 360];
  return tilt === 0 ? plan : `${plan}/${tilt}/${bearing}`;
}

/** The camera in a search parameter's text, or null where the text holds none. */
export function parseCamera(text: string | null): Camera | null {
  const parts = text?.split('/') ?? [];
  if (![3, 5].includes(parts.length) || parts.some((part) => part.trim() === '')) return null;
  const [zoom, latitude, longitude, tiltDeg = 0, bearingDeg = 0] = parts.map(Number);
  if (zoom === undefined || latitude === undefined || longitude === undefined) return null;
  const isInside =
    zoom >= 0 &&
    zoom <= 24 &&
    Math.abs(latitude) <= 85 &&
    Math.abs(longitude) <= 180 &&
    tiltDeg >= 0 &&
    tiltDeg <= mostTiltDeg &&
    bearingDeg >= 0 &&
    bearingDeg < 360;
  return isInside ? { zoom, latitude, longitude, tiltDeg, bearingDeg } : null;
}

/**
 * The camera that the address asks for, and the one writer of it.
 * The map writes when a person has moved it; the address moves the map only at navigation.
 */
export function useCameraInUrl(): {
  camera: Camera | null;
  onCameraChange: (camera: Camera) => void;
} {
  const [searchParams, setSearchParams] = useSearchParams();
  const text = searchParams.get(parameter);
  const camera = useMemo(() => parseCamera(text), [text]);
  const onCameraChange = useCallback(
    (next: Camera) => {
      setSearchParams(
        () => {
          // The address bar, not the last render: the sun arc may have written meanwhile.
          const current = new URLSearchParams(window.location.search);
          current.set(parameter, formatCamera(next));
          return current;
        },
        { replace: true, preventScrollReset: true },
      );
    },
    [setSearchParams],
  );
  return { camera, onCameraChange };
}
