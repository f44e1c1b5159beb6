import type { z } from 'zod';
import { loadClipper } from '../../api/clipper.ts';
import { createLocalPlane } from '../../shared/geometry/local-plane.ts';
import type { Ring } from '../../shared/geometry/ring.ts';
import type { ReceptorClass, RuleDay } from '../../shared/rules/rule-schema.ts';
import { ruleTemplates } from '../../shared/rules/templates/rule-templates.ts';
import { computeStudy } from '../../shared/study/compute-study.ts';
import type {
  BlockRole,
  ClauseResult,
  studyInputSchema,
} from '../../shared/study/evidence-schema.ts';
import { readStudyInput } from '../../shared/study/read-study-input.ts';
import { smallPlace } from './small-study.ts';

/** A block as its footprint and heights; a receptor as its outline, or a window as a point. */
export interface TemplateScene {
  place?: typeof smallPlace;
  blocks: { role: BlockRole; ring: Ring; base?: number; top: number }[];
  receptors?: { class: ReceptorClass; ring: Ring; plane?: number }[];
  windows?: { at: readonly [number, number]; facing: number; plane?: number }[];
  site?: Ring;
  gridM?: number;
  /** In place of the template's own days, so that a year takes no longer than a few of its days. */
  days?: RuleDay[];
  year?: number;
}

/** Looks a template up. @throws when there is none of that id */
export function templateOf(id: string) {
  const template = ruleTemplates.find((one) => one.id === id);
  if (template === undefined) throw new Error(`There is no template ${id}.`);
  return template;
}

/** Judges a scene by a template: the findings of its only receptor, or ring, in the rule's order. */
export async function judgeByTemplate(id: string, scene: TemplateScene): Promise<ClauseResult[]> {
  const place = scene.place ?? smallPlace;
  const plane = createLocalPlane(place.longitude, place.latitude);
  const polygon = (ring: Ring) => {
    const lngLats = ring.map((point) => plane.toLngLat(point));
    return { type: 'Polygon' as const, coordinates: [[...lngLats, ...lngLats.slice(0, 1)]] };
  };
  const { rule } = templateOf(id);
  const input: z.input<typeof studyInputSchema> = {
    format: 'noonmark-study/1',
    place,
    year: scene.year ?? 2026,
    ...(scene.site === undefined ? {} : { site: polygon(scene.site) }),
    blocks: {
      features: scene.blocks.map(({ role, ring, base = 0, top }, index) => ({
        properties: { id: `block ${index + 1}`, role, base, top },
        geometry: polygon(ring),
      })),
    },
    receptors: {
      features: [
        ...(scene.receptors ?? []).map((one, index) => ({
          properties: { id: `receptor ${index + 1}`, class: one.class, plane: one.plane ?? 0 },
          geometry: polygon(one.ring),
        })),
        ...(scene.windows ?? []).map(({ at, facing, plane: planeM = 0 }, index) => ({
          properties: {
            id: `window ${index + 1}`,
            class: 'window' as const,
            plane: planeM,
            facing,
          },
          geometry: { type: 'Point' as const, coordinates: plane.toLngLat(at) },
        })),
      ],
    },
    instants: [],
    settings: { gridM: scene.gridM ?? 1 },
    rule: {
      ...rule,
      clauses: rule.clauses.map((clause) => ({ ...clause, days: scene.days ?? clause.days })),
    },
  };
  const read = readStudyInput(input);
  if (!read.ok) throw new Error(JSON.stringify(read.issues));
  const { evidence } = await computeStudy(read.input, { clipper: await loadClipper() });
  return evidence.results.receptors.flatMap((receptor) => receptor.clauses);
}
