import type { Clipper } from '../shadow/clipper.ts';
import { planClauses } from './clause-plan.ts';
import { crossCheckReceptors, type CrossCheck } from './cross-check.ts';
import { digestOf } from './digest.ts';
import { drawInstant, type InstantShadowPolygons } from './draw-instant.ts';
import { engineVersion } from './engine-version.ts';
import type { EvidenceFile, ReceptorResult, StudyInput, StudyInstant } from './evidence-schema.ts';
import { areaChangesOnGround } from './ground-change.ts';
import { lightAtInstant, type InstantLight } from './instant-light.ts';
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
  { clipper, onProgress }: ComputeStudyOptions,
): Promise<ComputedStudy> {
  const scene = buildScene(input);
  const plans = planClauses(input, scene);
  const judge = createStudyJudge(plans, input);
  const cumulativeJudge = scene.cumulativeBlocks === null ? null : createStudyJudge(plans, input);
  const listed = listedInstants(input);
  const byInstant = instantsByMs(listed, plans);
  const check: CrossCheck = { largestDifferenceM2: 0, at: null, receptor: null };
  const shadows: InstantShadowPolygons[] = [];
  const instants = new Map<string, StudyInstant>();
  const receptorRows = scene.receptors.map((): ReceptorResult['instants'] => []);

  let done = 0;
  for (const [atMs, wanted] of byInstant) {
    const instant = lightAtInstant(scene, scene.blocks, input, atMs);
    for (const date of wanted.judgedDates) judge.take(date, instant);
    if (cumulativeJudge !== null && scene.cumulativeBlocks !== null) {
      const cumulative = lightAtInstant(scene, scene.cumulativeBlocks, input, atMs);
      for (const date of wanted.judgedDates) cumulativeJudge.take(date, cumulative);
    }
    for (const at of wanted.listed) {
      instants.set(at, studyInstant(at, instant, scene));
      scene.receptors.forEach((receptor, index) => {
        receptorRows[index]?.push(receptorInstant(at, instant, receptor));
      });
    }
    const [firstListed] = wanted.listed;
    if (firstListed !== undefined) {
      const drawn = drawInstant(clipper, scene, instant, firstListed);
      if (drawn !== null) {
        shadows.push(drawn.shadows);
        crossCheckReceptors(clipper, scene, instant, firstListed, drawn.polygons, check);
      }
    }
    done += 1;
    await onProgress?.(done, byInstant.size);
  }

  const { results, findings } = judge.judge();
  const inputOrder = new Map(listed.map((at, index) => [at, index]));
  const inOrder = <Row extends { at: string }>(rows: Row[]) =>
    rows.sort((a, b) => (inputOrder.get(a.at) ?? 0) - (inputOrder.get(b.at) ?? 0));
  const evidence = {
    ...input,
    engine: engineVersion,
    instants: listed,
    results: {
      instants: inOrder([...instants.values()]),
      receptors: scene.receptors.map((receptor, index) => ({
        id: receptor.id,
        openArea: roundArea(receptor.openAreaM2),
        instants: inOrder(receptorRows[index] ?? []),
        clauses: results.get(receptor.id) ?? [],
      })),
      findings,
      ...(cumulativeJudge === null ? {} : { cumulative: cumulativeJudge.judge().findings }),
      check,
    },
  };
  return { evidence: { ...evidence, digest: digestOf(evidence) }, shadows };
}

function listedInstants(input: StudyInput): string[] {
  return [...new Set(input.instants ?? defaultInstants(input))];
}

interface WantedInstant {
  /** The listed texts of the instant: the same one can be written with two offsets. */
  listed: string[];
  judgedDates: string[];
}

/** Every instant to compute, once, in the order of time. */
function instantsByMs(
  listed: readonly string[],
  plans: ReturnType<typeof planClauses>,
): Map<number, WantedInstant> {
  const wanted = new Map<number, { listed: Set<string>; judgedDates: Set<string> }>();
  const at = (atMs: number) => {
    const found = wanted.get(atMs) ?? { listed: new Set(), judgedDates: new Set() };
    wanted.set(atMs, found);
    return found;
  };
  for (const text of listed) at(Date.parse(text)).listed.add(text);
  for (const plan of plans) {
    for (const [date, spans] of plan.spansOfDate) {
      for (const atMs of spans.flat()) at(atMs).judgedDates.add(date);
    }
  }
  return new Map(
    [...wanted]
      .sort(([a], [b]) => a - b)
      .map(([atMs, one]) => [atMs, { listed: [...one.listed], judgedDates: [...one.judgedDates] }]),
  );
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
  const light = instant.lightOn(receptor, receptor.planeM);
  return { at, sunBefore: roundArea(light.sunBeforeM2), sunAfter: roundArea(light.sunAfterM2) };
}
