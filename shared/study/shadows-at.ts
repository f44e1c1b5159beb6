import type { Clipper } from '../shadow/clipper.ts';
import { drawInstant, type InstantShadowPolygons } from './draw-instant.ts';
import type { StudyInput } from './evidence-schema.ts';
import { lightAtInstant } from './instant-light.ts';
import { buildScene } from './scene.ts';

/**
 * The shadows of a study's input on the ground at any one instant; null with the sun down.
 *
 * @param at RFC 3339
 */
export function castShadowsAt(
  input: StudyInput,
  at: string,
  clipper: Clipper,
): InstantShadowPolygons | null {
  const scene = buildScene({ ...input, receptors: { ...input.receptors, features: [] } });
  const instant = lightAtInstant(scene, scene.blocks, input, Date.parse(at));
  return drawInstant(clipper, scene, instant, at)?.shadows ?? null;
}
