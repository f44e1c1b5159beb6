import { boxesOverlap, boxOfRings, type Box } from '../geometry/ring.ts';
import type { LedgerDay } from '../receptors/sun-ledger-schema.ts';
import { instantsOfSpan } from '../rules/rule-window.ts';
import type { Clipper } from '../shadow/clipper.ts';
import { castBlockContours } from '../shadow/shadow-contours.ts';
import { formatInstant } from '../solar/civil-time.ts';
import { keyDatesOfYear } from '../solar/key-dates.ts';
import { sunAboveSpans } from '../solar/sun-above.ts';
import type { SunPosition } from '../solar/sun-position.ts';
import { drawInstant, type InstantShadowPolygons } from './draw-instant.ts';
import type { ReceptorResult, StudyInput } from './evidence-schema.ts';
import { areaChangesOnGround } from './ground-change.ts';
import { lightAtInstant } from './instant-light.ts';
import { computeLedgerDay } from './receptor-ledger.ts';
import { roundArea } from './rounding.ts';
import { buildScene, type Scene, type SceneReceptor } from './scene.ts';

/** The shadows of one instant, with what changes on the ground outside the site, in m². */
export interface LiveInstant extends InstantShadowPolygons {
  netNewM2: number;
  removedM2: number;
}

/** The sun on a receptor through one day; see `ReceptorResult`. */
export type ReceptorHours = Pick<ReceptorResult, 'id' | 'openArea' | 'instants'>;

/** A study's input, opened once to be looked at freely: any instant, any date. It judges nothing. */
export interface LiveStudy {
  /**
   * The shadows on the ground at datum 0; null with the sun down.
   *
   * @param at RFC 3339
   */
  shadowsAt: (at: string) => LiveInstant | null;
  /**
   * The account of one receptor on a civil date in steps of 5 minutes; null where the study has no
   * such receptor.
   */
  dayOf: (receptorId: string, date: string) => LedgerDay | null;
  /** The receptors that lose sun on a civil date, with their sun in m² every `losersStepMin` minutes. */
  losersOn: (date: string) => ReceptorHours[];
}

const dayStepMin = 5;
const losersStepMin = 15;
/** The share of a receptor's open area whose loss is more than rounding. */
const leastLostShare = 1e-6;

/** Builds the scene of a study's input once, so that each later question is quick. */
export function openLiveStudy(input: StudyInput, clipper: Clipper): LiveStudy {
  const scene = buildScene(input);
  const { timezone, longitude, latitude } = input.place;
  const receptors = new Map(scene.receptors.map((receptor) => [receptor.id, receptor]));
  const events = new Map(
    keyDatesOfYear(input.year, timezone).map(({ date, event }) => [date, event]),
  );
  return {
    shadowsAt: (at) => {
      const instant = lightAtInstant(scene, scene.blocks, input, Date.parse(at));
      const layer = instant.layerOn(0);
      const drawn = drawInstant(clipper, scene, instant, at);
      if (layer === null || drawn === null) return null;
      const { netNewM2, removedM2 } = areaChangesOnGround(scene, layer);
      return {
        ...drawn.shadows,
        netNewM2: roundArea(netNewM2),
        removedM2: roundArea(removedM2),
      };
    },
    dayOf: (receptorId, date) => {
      const receptor = receptors.get(receptorId);
      if (receptor === undefined) return null;
      const event = events.get(date) ?? null;
      return { event, ...computeLedgerDay(input, scene, receptor, date, dayStepMin) };
    },
    losersOn: (date) => {
      const instants = sunAboveSpans(date, timezone, longitude, latitude, 0)
        .flatMap((span) => instantsOfSpan(span, losersStepMin))
        .map((atMs) => ({
          at: formatInstant(atMs, timezone),
          light: lightAtInstant(scene, scene.blocks, input, atMs),
        }));
      const suns = instants.map(({ light }) => light.sun);
      return reachedByProposal(scene, suns).flatMap((receptor): ReceptorHours[] => {
        const rows = instants.map(({ at, light }) => {
          const { sunBeforeM2, sunAfterM2 } = light.lightOn(receptor, receptor.planeM);
          return { at, sunBefore: sunBeforeM2, sunAfter: sunAfterM2 };
        });
        const leastM2 = leastLostShare * receptor.openAreaM2;
        const losesSun = rows.some((row) => row.sunBefore - row.sunAfter > leastM2);
        const openArea = receptor.front === null ? receptor.openAreaM2 : null;
        return losesSun ? [{ id: receptor.id, openArea, instants: rows }] : [];
      });
    },
  };
}

/** The receptors on which a proposed block may cast a shadow under one of some suns: no other loses any. */
function reachedByProposal(scene: Scene, suns: readonly SunPosition[]): SceneReceptor[] {
  const proposed = scene.blocks.blocks
    .map(({ block }) => block)
    .filter(({ role }) => role === 'proposed');
  const shadowBoxes = new Map<number, Box[]>();
  const boxesOn = (planeM: number) => {
    const boxes =
      shadowBoxes.get(planeM) ??
      suns
        .filter(({ altitudeDeg }) => altitudeDeg > 0)
        .flatMap((sun) =>
          proposed.flatMap((block) => {
            const contours = castBlockContours(block, sun, planeM);
            return contours.length === 0 ? [] : [boxOfRings(contours)];
          }),
        );
    shadowBoxes.set(planeM, boxes);
    return boxes;
  };
  return scene.receptors.filter(({ area, planeM }) =>
    boxesOn(planeM).some((box) => boxesOverlap(box, area.box)),
  );
}
