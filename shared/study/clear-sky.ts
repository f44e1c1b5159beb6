import { clearSkyBeamWm2, incidenceCosine, type ClearSky } from '../solar/clear-sky-beam.ts';
import type { SunPosition } from '../solar/sun-position.ts';
import type { StudyInput } from './evidence-schema.ts';
import type { SceneReceptor } from './scene-receptor.ts';

/** The clear sky of a date: what the beam depends on besides the sun. */
export function skyOf(date: string, input: StudyInput): ClearSky {
  const startOfYear = Date.parse(`${date.slice(0, 4)}-01-01`);
  return {
    dayOfYear: Math.round((Date.parse(date) - startOfYear) / 86_400_000) + 1,
    elevationM: input.place.elevation,
    linkeTurbidity: input.settings.beam.linkeTurbidity,
  };
}

/** Direct clear-sky irradiance on a receptor's own slope, W/m². */
export function beamOnReceptorWm2(
  sun: SunPosition,
  receptor: Pick<SceneReceptor, 'tiltDeg' | 'facingDeg'>,
  sky: ClearSky,
): number {
  return (
    clearSkyBeamWm2(sun.altitudeDeg, sky) *
    incidenceCosine(sun, receptor.tiltDeg, receptor.facingDeg)
  );
}
