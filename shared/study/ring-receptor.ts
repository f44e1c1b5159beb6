import { boxOfRings } from '../geometry/ring.ts';
import { sayRing } from '../rules/clause-words.ts';
import type { ReceptorRing, RuleClause } from '../rules/rule-schema.ts';
import type { Clipper } from '../shadow/clipper.ts';
import { offsetRings } from '../shadow/offset-rings.ts';
import { makeLitArea } from '../shadow/receptor-light.ts';
import type { IndexedBlocks } from '../shadow/shadow-layer.ts';
import { sunPositionAt } from '../solar/sun-position.ts';
import type { StudyInput } from './evidence-schema.ts';
import { openAreaOn, type SceneReceptor } from './scene-receptor.ts';
import type { Scene } from './scene.ts';

/** A shadow is not followed further than this beyond the site, metres. */
const furthestM = 2000;

/**
 * The band between two distances outside the site's boundary, as a receptor with the id
 * `ring:<clause>`. Without an outer distance it ends where no shadow of what changes on the site
 * reaches at any judged instant, and 2 km from the site at most.
 *
 * @param atMs the clause's judged instants
 * @param blocks what stands by the clause's baseline
 * @returns null where the study has no site, or the shadow does not reach the ring
 */
export function makeRingReceptor(
  clause: RuleClause,
  ring: ReceptorRing,
  scene: Scene,
  blocks: IndexedBlocks,
  input: StudyInput,
  atMs: readonly number[],
  clipper: Clipper,
): SceneReceptor | null {
  const { siteRings, measures } = scene;
  if (siteRings.length === 0) return null;
  const planeM = clause.receptors.plane ?? 0;
  const toM = ring.to ?? reachM(scene, blocks, input, atMs, planeM);
  if (toM <= ring.from) return null;
  const inner = ring.from > 0 ? offsetRings(clipper, siteRings, ring.from) : [];
  const area = makeLitArea(
    [
      ...offsetRings(clipper, siteRings, toM),
      // Turned round, what lies within the inner distance is counted out again.
      ...inner.map((one) => one.toReversed()),
    ],
    siteRings,
  );
  return {
    id: `ring:${clause.id}`,
    class: 'ring',
    label: sayRing(ring, ringFigures),
    planeM,
    tiltDeg: 0,
    facingDeg: 0,
    area,
    front: null,
    wholeAreaM2: measures.openArea(area, []),
    openAreaM2: openAreaOn(area, planeM, { blocks: scene.blocks, measures }),
    isOnSite: false,
  };
}

const ringFigures = { metres: (lengthM: number) => `${lengthM} m` };

/** How far beyond the site's boundary a shadow of what changes there can reach on a plane. */
function reachM(
  { siteRings }: Scene,
  { blocks }: IndexedBlocks,
  { place }: StudyInput,
  atMs: readonly number[],
  planeM: number,
): number {
  const site = boxOfRings(siteRings);
  const lowestDeg = atMs.reduce((lowest, at) => {
    const { altitudeDeg } = sunPositionAt(at, place.longitude, place.latitude);
    return altitudeDeg > 0 ? Math.min(lowest, altitudeDeg) : lowest;
  }, 90);
  const cotangent = 1 / Math.tan((lowestDeg * Math.PI) / 180);
  const furthest = blocks.reduce((most, { block: { role, box, topM } }) => {
    if (role === 'context' || topM <= planeM) return most;
    const beyondM = Math.hypot(
      Math.max(site.minX - box.minX, box.maxX - site.maxX, 0),
      Math.max(site.minY - box.minY, box.maxY - site.maxY, 0),
    );
    return Math.max(most, beyondM + (topM - planeM) * cotangent);
  }, 0);
  return Math.min(furthest, furthestM);
}
