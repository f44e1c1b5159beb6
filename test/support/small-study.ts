import type { z } from 'zod';
import { createLocalPlane } from '../../shared/geometry/local-plane.ts';
import type { PlanePoint, Ring } from '../../shared/geometry/ring.ts';
import type { StudyInput, studyInputSchema } from '../../shared/study/evidence-schema.ts';
import { readStudyInput } from '../../shared/study/read-study-input.ts';

export type StudyInputDraft = z.input<typeof studyInputSchema>;
type Block = StudyInputDraft['blocks']['features'][number];
type Receptor = StudyInputDraft['receptors']['features'][number];

/** An invented place on the meridian of Greenwich, so that solar and clock time nearly agree. */
export const smallPlace = {
  name: 'Brinewell',
  timezone: 'Etc/UTC',
  longitude: 0,
  latitude: 45,
  elevation: 0,
};

const plane = createLocalPlane(smallPlace.longitude, smallPlace.latitude);

/** A ring in metres around the place as a GeoJSON polygon. */
export function toPolygon(ring: Ring) {
  const lngLats = ring.map((point) => plane.toLngLat(point));
  const [first] = lngLats;
  if (first === undefined) throw new Error('A polygon needs points.');
  return { type: 'Polygon' as const, coordinates: [[...lngLats, first]] };
}

export function blockFeature(
  id: string,
  role: Block['properties']['role'],
  ring: Ring,
  base: number,
  top: number,
): Block {
  return { properties: { id, role, base, top }, geometry: toPolygon(ring) };
}

export function receptorFeature(
  id: string,
  ring: Ring,
  more: Partial<Receptor['properties']> = {},
): Receptor {
  return {
    properties: { id, class: 'yard', label: `${id} Netloft Lane`, ...more },
    geometry: toPolygon(ring),
  };
}

/** A window on its façade: one point, or a line, in metres around the place. */
export function windowFeature(
  id: string,
  points: readonly PlanePoint[],
  facing: number | undefined,
): Receptor {
  const lngLats = points.map((point) => plane.toLngLat(point));
  const [first] = lngLats;
  if (first === undefined) throw new Error('A window needs a point.');
  return {
    properties: { id, class: 'window', label: `${id} Netloft Lane`, facing },
    geometry:
      lngLats.length === 1
        ? { type: 'Point', coordinates: first }
        : { type: 'LineString', coordinates: lngLats },
  };
}

/** One clause on midwinter's noon hours; parts can be put in its place. */
export function clauseOf(more: Record<string, unknown> = {}) {
  return {
    id: 'midwinter',
    title: 'Sun at midwinter',
    receptors: { classes: ['yard'] },
    days: [{ event: 'winter-solstice' }],
    window: { basis: 'solar', from: '10:00', to: '14:00' },
    step: 10,
    measure: { kind: 'sun-hours' },
    limit: { atLeast: 2 },
    ...more,
  };
}

/** A study's input with one rule of the given clauses. */
export function studyInputOf(parts: {
  blocks: Block[];
  receptors: Receptor[];
  clauses?: Record<string, unknown>[];
  instants?: string[];
  site?: StudyInputDraft['site'];
}): unknown {
  return {
    format: 'noonmark-study/1',
    place: smallPlace,
    year: 2026,
    ...(parts.site === undefined ? {} : { site: parts.site }),
    blocks: { features: parts.blocks },
    receptors: { features: parts.receptors },
    instants: parts.instants ?? ['2026-12-21T12:00:00+00:00'],
    rule: {
      id: 'solar-access',
      version: 1,
      title: 'Sun kept for neighbours',
      clauses: parts.clauses ?? [clauseOf()],
    },
  };
}

/** What the engine makes of an input. @throws where it refuses it */
export function readInput(value: unknown): StudyInput {
  const result = readStudyInput(value);
  if (!result.ok) throw new Error(JSON.stringify(result.issues));
  return result.input;
}
