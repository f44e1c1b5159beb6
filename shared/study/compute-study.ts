import { joinBoxes } from '../geometry/ring.ts';
import type { Clipper } from '../shadow/clipper.ts';
import type { IndexedBlocks } from '../shadow/shadow-layer.ts';
import { planClauses, type ClausePlan } from './clause-plan.ts';
import { crossCheckReceptors, type CrossCheck } from './cross-check.ts';
import { digestOf } from './digest.ts';
import { drawInstant, type InstantShadowPolygons } from './draw-instant.ts';
import { engineVersion } from './engine-version.ts';
import type { EvidenceFile, ReceptorResult, StudyInput, StudyInstant } from './evidence-schema.ts';
import { areaChangesOnGround } from './ground-change.ts';
import { lightAtInstant, type InstantLight, type Reach } from './instant-light.ts';
import { createStudyJudge } from './judge-study.ts';
import { defaultInstants } from './key-date-instants.ts';
import { roundArea, roundMeasure } from './rounding.ts';
import { buildScene, type Scene } from './scene.ts';

export interface ComputeStudyOptions {
  clipper: Clipper;
  /** Called after each instant; whatever it throws ends the study. */
  onProgress?: (instantsDone: number, instantsTotal: number) => void | Promise<void>;
}

export interface ComputedStudy {
  evidence: EvidenceFile;
  /** What is drawn at each listed instant with the sun up, on the ground at datum 0. */
  shadows: InstantShadowPolygons[];
}

export type { InstantShadowPolygons };

/**
 * Computes a study: from the massing, the surroundings and the rule to the light on every receptor
 * at every listed instant, the findings under every clause, and one digest over all of it. The same
 * input gives the same output on every machine.
 *
 * The listed instants are drawn and listed; the judged ones come from the rule's own windows.
 */
export async function computeStudy(
  input: StudyInput,
  options: ComputeStudyOptions,
): Promise<ComputedStudy> {
  const builtScene = buildScene(input);
  const plans = planClauses(input, builtScene, options.clipper);
  const rings = plans.flatMap(({ ring }) => ring ?? []);
  const scene = { ...builtScene, receptors: [...builtScene.receptors, ...rings] };
  const judge = createStudyJudge(plans, input, scene.sampler, (plan) => plan.blocks);
  const cumulativeJudge =
    scene.cumulativeBlocks === null
      ? null
      : createStudyJudge(
          plans,
          input,
          scene.sampler,
          (plan) => plan.cumulativeBlocks ?? plan.blocks,
        );
  const listed = listedInstants(input);
  const reach = reachOfReceptors(scene, plans);
  const light = await computeLight(input, scene, reach, listed, plans, options, (instant) => {
    const lights = new Map([[scene.blocks, instant]]);
    const lightOf = (blocks: IndexedBlocks) => {
      const known = lights.get(blocks) ?? lightAtInstant(scene, blocks, input, instant.atMs, reach);
      lights.set(blocks, known);
      return known;
    };
    judge.take(instant.atMs, lightOf);
    cumulativeJudge?.take(instant.atMs, lightOf);
  });
  const { results, findings } = judge.judge();
  const evidence = {
    ...input,
    engine: engineVersion,
    instants: listed,
    results: {
      instants: light.instants,
      receptors: light.receptors.map((receptor) => ({
        ...receptor,
        clauses: results.get(receptor.id) ?? [],
      })),
      findings,
      ...(cumulativeJudge === null ? {} : { cumulative: cumulativeJudge.judge().findings }),
      check: light.check,
    },
  };
  return { evidence: { ...evidence, digest: digestOf(evidence) }, shadows: light.shadows };
}

/** The light of listed instants without any judgement, for a look at single instants. */
export interface ListedLight {
  instants: StudyInstant[];
  receptors: Omit<ReceptorResult, 'clauses'>[];
  shadows: InstantShadowPolygons[];
  check: CrossCheck;
}

/** Computes the listed instants of an input alone, in the order given; nothing is judged. */
export async function computeListedInstants(
  input: StudyInput,
  options: ComputeStudyOptions,
): Promise<ListedLight> {
  const scene = buildScene(input);
  const listed = listedInstants(input);
  const reach = reachOfReceptors(scene, []);
  return computeLight(input, scene, reach, listed, [], options, () => undefined);
}

async function computeLight(
  input: StudyInput,
  scene: Scene,
  reach: Reach,
  listed: readonly string[],
  plans: readonly ClausePlan[],
  { clipper, onProgress }: ComputeStudyOptions,
  takeJudged: (instant: InstantLight) => void,
): Promise<ListedLight> {
  const byInstant = instantsByMs(listed, plans);
  const check: CrossCheck = { largestDifferenceM2: 0, at: null, receptor: null };
  const shadows: InstantShadowPolygons[] = [];
  const instants: StudyInstant[] = [];
  const receptorRows = scene.receptors.map((): ReceptorResult['instants'] => []);
  let done = 0;
  for (const [atMs, texts] of byInstant) {
    // What is drawn takes the whole scene; what is only judged takes what can shade a receptor.
    const within = texts.length > 0 ? undefined : reach;
    const instant = lightAtInstant(scene, scene.blocks, input, atMs, within);
    takeJudged(instant);
    for (const at of texts) {
      instants.push(studyInstant(at, instant, scene));
      scene.receptors.forEach((receptor, index) => {
        receptorRows[index]?.push(receptorInstant(at, instant, receptor));
      });
      const drawn = drawInstant(clipper, scene, instant, at);
      if (drawn === null) continue;
      shadows.push(drawn.shadows);
      crossCheckReceptors(clipper, scene, instant, at, drawn.polygons, check);
    }
    done += 1;
    await onProgress?.(done, byInstant.size);
  }
  const place = new Map(listed.map((at, index) => [at, index]));
  const inOrder = <Row extends { at: string }>(rows: Row[]) =>
    rows.sort((a, b) => (place.get(a.at) ?? 0) - (place.get(b.at) ?? 0));
  return {
    instants: inOrder(instants),
    receptors: scene.receptors.map((receptor, index) => ({
      id: receptor.id,
      openArea: receptor.front === null ? roundArea(receptor.openAreaM2) : null,
      instants: inOrder(receptorRows[index] ?? []),
    })),
    shadows: inOrder(shadows),
    check,
  };
}

/** The ground on which the receptors lie, and the lowest plane on which one is judged. */
function reachOfReceptors({ receptors }: Scene, plans: readonly ClausePlan[]): Reach {
  return {
    box: receptors
      .map(({ area }) => area.box)
      .reduce(joinBoxes, { minX: Infinity, minY: Infinity, maxX: -Infinity, maxY: -Infinity }),
    lowestPlaneM: [...receptors, ...plans.flatMap((plan) => plan.receptors)].reduce(
      (lowest, { planeM }) => Math.min(lowest, planeM),
      Infinity,
    ),
  };
}

function listedInstants(input: StudyInput): string[] {
  return [...new Set(input.instants ?? defaultInstants(input))];
}

/** Every instant to compute, once, in the order of time, with the listed texts of it: the same one can be written with two offsets. */
function instantsByMs(
  listed: readonly string[],
  plans: readonly ClausePlan[],
): Map<number, string[]> {
  const wanted = new Map<number, Set<string>>();
  const at = (atMs: number) => {
    const found = wanted.get(atMs) ?? new Set();
    wanted.set(atMs, found);
    return found;
  };
  for (const text of listed) at(Date.parse(text)).add(text);
  for (const { spansOfDate } of plans) {
    for (const atMs of [...spansOfDate.values()].flat(2)) at(atMs);
  }
  return new Map([...wanted].sort(([a], [b]) => a - b).map(([atMs, texts]) => [atMs, [...texts]]));
}

function studyInstant(at: string, instant: InstantLight, scene: Scene): StudyInstant {
  const position = {
    at,
    azimuth: roundMeasure(instant.sun.azimuthDeg),
    altitude: roundMeasure(instant.sun.altitudeDeg),
  };
  const layer = instant.layerOn(0);
  if (layer === null) return position;
  const { netNewM2, removedM2 } = areaChangesOnGround(scene, layer);
  return { ...position, netNew: roundArea(netNewM2), removed: roundArea(removedM2) };
}

function receptorInstant(
  at: string,
  instant: InstantLight,
  receptor: Scene['receptors'][number],
): ReceptorResult['instants'][number] {
  const { sunBeforeM2, sunAfterM2 } = instant.lightOn(receptor, receptor.planeM);
  const round = receptor.front === null ? roundArea : roundMeasure;
  return { at, sunBefore: round(sunBeforeM2), sunAfter: round(sunAfterM2) };
}
