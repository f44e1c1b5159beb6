import {
  createCivilTimeFormat,
  type CivilTimeFormat,
} from '../../../../shared/drawing/civil-time-format.ts';
import { createFigureFormat, type FigureFormat } from '../../../../shared/drawing/figure-format.ts';
import { emptyPlan, type PlanContent } from '../../../../shared/drawing/plan-drawing.ts';
import type { ReceptorClass } from '../../../../shared/rules/rule-schema.ts';
import type { ReportInstant, ReportPayload } from '../report-payload.ts';
import { listNotMet, type NotMetReceptor } from './not-met.ts';
import { standsOnSite } from './stands-on-site.ts';

/** What all parts of a report share: the payload, its place's forms of figures, and what follows from it. */
export interface ReportScene {
  payload: ReportPayload;
  time: CivilTimeFormat;
  figures: FigureFormat;
  /** Receptors that don't meet a clause, each with the number that marks it on maps and in tables. */
  notMet: NotMetReceptor[];
  /** The buildings that stand around the site; those on it are removed by the proposal. */
  around: ReportPayload['surroundings']['buildings'];
  /** The plan without shadows, to be drawn at any size. */
  plan: PlanContent;
  /** Centre of the local plane. */
  origin: { longitude: number; latitude: number };
}

export function createReportScene(payload: ReportPayload): ReportScene {
  const { municipality, surroundings, revision } = payload;
  const notMet = listNotMet(payload);
  const outlines = new Map(payload.receptors.map((one) => [one.id, one.geometry]));
  const onSite = surroundings.buildings.filter(({ geometry }) =>
    standsOnSite(geometry, payload.site),
  );
  const around = surroundings.buildings.filter((building) => !onSite.includes(building));
  return {
    payload,
    around,
    time: createCivilTimeFormat(municipality.locale, municipality.timeZone),
    figures: createFigureFormat(municipality.locale),
    notMet,
    origin: { longitude: municipality.longitude, latitude: municipality.latitude },
    plan: {
      ...emptyPlan,
      streets: surroundings.streets,
      streetLines: surroundings.streetLines.map(({ name, geometry }) => ({
        name,
        lines: geometry.type === 'LineString' ? [geometry.coordinates] : geometry.coordinates,
      })),
      water: surroundings.water,
      openSpace: surroundings.openSpace,
      parcels: surroundings.parcels.map(({ geometry }) => geometry),
      buildings: around.map(({ geometry }) => geometry),
      site: [payload.site],
      removed: [...blocksOf('existing'), ...onSite].map(({ geometry }) => geometry),
      proposal: blocksOf('proposed').map(({ geometry, properties }) => ({
        geometry,
        topM: properties.topM,
      })),
      notMet: notMet.flatMap(({ receptor, number }) => {
        const geometry = outlines.get(receptor);
        return geometry === undefined ? [] : [{ geometry, mark: String(number) }];
      }),
    },
  };

  function blocksOf(role: 'proposed' | 'existing') {
    return revision.blocks.filter(({ properties }) => properties.role === role);
  }
}

/** The judged instant with the most net new shadow; of all instants where none is judged; null without any. */
export function findWorstInstant({ payload }: ReportScene): ReportInstant | null {
  const judged = payload.instants.filter(({ at }) => isJudged(payload, at));
  const candidates = judged.length > 0 ? judged : payload.instants;
  return candidates.reduce<ReportInstant | null>(
    (worst, one) => (worst === null || one.netNewM2 > worst.netNewM2 ? one : worst),
    null,
  );
}

/** Whether an instant lies in a judged window of any clause. */
export function isJudged(payload: ReportPayload, at: string): boolean {
  const atMs = Date.parse(at);
  return payload.study.judgedDays.some(({ days }) =>
    days.some(({ fromAt, toAt }) => Date.parse(fromAt) <= atMs && atMs <= Date.parse(toAt)),
  );
}

/** The words for a kind of receptor; unknown kinds as they are written. */
export function nameReceptorClass(receptorClass: string): string {
  const words: Partial<Record<string, string>> = receptorClassWords;
  return words[receptorClass] ?? receptorClass;
}

/** The same for several of them, at the beginning of a line. */
export function nameReceptors(receptorClass: string): string {
  const word = nameReceptorClass(receptorClass);
  return `${word.charAt(0).toUpperCase()}${word.slice(1)}s`;
}

const receptorClassWords: Record<ReceptorClass, string> = {
  parcel: 'lot',
  yard: 'yard',
  'open-space': 'open space',
  collector: 'solar collector',
  walk: 'walk',
  window: 'window',
};
