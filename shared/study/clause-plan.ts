import { needsSamples, measuresOf } from '../rules/measure-kinds.ts';
import { expandDays, type DayGroup } from '../rules/rule-days.ts';
import type { RuleClause } from '../rules/rule-schema.ts';
import { instantsOfSpan, windowSpans } from '../rules/rule-window.ts';
import type { Clipper } from '../shadow/clipper.ts';
import { makeLitArea } from '../shadow/receptor-light.ts';
import { sampleArea } from '../shadow/sample-grid.ts';
import type { SamplePoints } from '../shadow/sample-points.ts';
import { createBaselineBlocks, type ClauseBlocks } from './baseline-blocks.ts';
import type { StudyInput } from './evidence-schema.ts';
import { makeRingReceptor } from './ring-receptor.ts';
import { footprintsThrough, openAreaOn, type SceneReceptor } from './scene-receptor.ts';
import type { Scene } from './scene.ts';

/** A receptor as a clause judges it: on the clause's plane, of its open or whole area. */
export interface JudgedReceptor {
  receptor: SceneReceptor;
  planeM: number;
  /** m²; 1 for a window. */
  areaM2: number;
  /** Where its light is taken point by point; null where no measure asks for it. */
  samples: SamplePoints | null;
}

/** What one clause needs: its days, the judged instants of each, its receptors, and what stands. */
export interface ClausePlan extends ClauseBlocks {
  clause: RuleClause;
  groups: DayGroup[];
  /** For each date, the instants of each stretch of its window. */
  spansOfDate: Map<string, number[][]>;
  receptors: JudgedReceptor[];
  /** The ring that it judges, shown like any other receptor. */
  ring: SceneReceptor | null;
}

/** Below this a receptor is built over and has nothing to judge, m². */
const leastAreaM2 = 0.01;
/** No receptor is sampled at more points; a ring, which stands alone in its clause, at ten times as many. */
const mostPoints = 10_000;

/** Works out what each clause of a rule judges in a scene, and makes its rings. */
export function planClauses(input: StudyInput, scene: Scene, clipper: Clipper): ClausePlan[] {
  const blocksBy = createBaselineBlocks(input, scene);
  return input.rule.clauses.map((clause) => {
    const groups = expandDays(clause.days, input.year, input.place);
    const dates = [...new Set(groups.flatMap((group) => group.dates))].sort();
    const spansOfDate = new Map(
      dates.map((date) => [
        date,
        windowSpans(clause, date, input.place).map((span) => instantsOfSpan(span, clause.step)),
      ]),
    );
    const standing = blocksBy(clause.baseline);
    const { ring, classes } = clause.receptors;
    const instants = [...spansOfDate.values()].flat(2);
    const ringReceptor =
      ring === undefined
        ? null
        : makeRingReceptor(clause, ring, scene, standing.blocks, input, instants, clipper);
    const receptors =
      ringReceptor === null
        ? scene.receptors.filter((receptor) => isOfClass(receptor, classes))
        : [ringReceptor];
    return {
      ...standing,
      clause,
      groups,
      spansOfDate,
      ring: ringReceptor,
      receptors: receptors.flatMap((receptor) =>
        judgeOn(receptor, clause, scene, standing, input.settings.gridM),
      ),
    };
  });
}

function isOfClass({ class: own }: SceneReceptor, classes: readonly string[]): boolean {
  return classes.includes(own);
}

function judgeOn(
  receptor: SceneReceptor,
  clause: RuleClause,
  scene: Scene,
  { hasContext }: ClauseBlocks,
  gridM: number,
): JudgedReceptor[] {
  if (receptor.isOnSite) return [];
  const planeM = clause.receptors.plane ?? receptor.planeM;
  const isSampled = measuresOf(clause).some(({ kind }) => needsSamples(kind));
  if (receptor.front !== null) {
    return [{ receptor, planeM, areaM2: 1, samples: isSampled ? receptor.front.points : null }];
  }
  const isOpen = clause.receptors.of === 'open';
  const areaM2 = !isOpen
    ? receptor.wholeAreaM2
    : planeM === receptor.planeM
      ? receptor.openAreaM2
      : openAreaOn(receptor.area, planeM, scene);
  if (areaM2 < leastAreaM2) return [];
  const { rings, siteRings, box } = receptor.area;
  const footprints = isOpen ? footprintsThrough(scene.blocks, planeM, box) : [];
  const outside = [...siteRings, ...footprints];
  return [
    {
      // Context that casts no shadow would leave what it stands on in sun.
      receptor:
        hasContext || footprints.length === 0
          ? receptor
          : { ...receptor, area: makeLitArea(rings, outside) },
      planeM,
      areaM2,
      samples: isSampled
        ? sampleArea({
            rings,
            outside,
            areaM2,
            gridM,
            mostPoints: receptor.class === 'ring' ? mostPoints * 10 : mostPoints,
            withBorder: measuresOf(clause).some(({ kind }) => kind === 'worst-shade-hours'),
          })
        : null,
    },
  ];
}
