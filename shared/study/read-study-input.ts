import { isPolygonal, type Polygonal } from '../geometry/geojson-schema.ts';
import { createLocalPlane, type LocalPlane } from '../geometry/local-plane.ts';
import { polygonsOf } from '../geometry/project-polygon.ts';
import { signedRingArea } from '../geometry/ring.ts';
import { expandDays } from '../rules/rule-days.ts';
import { windowSpans } from '../rules/rule-window.ts';
import { studyInputSchema, type StudyInput } from './evidence-schema.ts';
import { backwardAreaM2 } from './scene.ts';

/** Where in a file something is wrong, and what was expected. */
export interface InputIssue {
  path: string;
  message: string;
}

export type ReadStudyInput = { ok: true; input: StudyInput } | { ok: false; issues: InputIssue[] };

/** An area that winds backwards and is larger than this is no rounding, m². */
const leastBackwardM2 = 1e-6;

/**
 * Reads a study's input: checks its form, fills in every default, and checks what the form cannot
 * say: footprints that cross themselves, a site that a clause needs, and windows without sun. Members
 * `results` and `digest` of an evidence file must be taken away first.
 */
export function readStudyInput(value: unknown): ReadStudyInput {
  const parsed = studyInputSchema.safeParse(value);
  if (!parsed.success) {
    return {
      ok: false,
      issues: parsed.error.issues.map(({ path, message }) => ({
        path: path.map(String).join('.'),
        message,
      })),
    };
  }
  const issues = [
    ...footprintIssues(parsed.data),
    ...siteIssues(parsed.data),
    ...windowIssues(parsed.data),
  ];
  return issues.length === 0 ? { ok: true, input: parsed.data } : { ok: false, issues };
}

function footprintIssues(input: StudyInput): InputIssue[] {
  const plane = createLocalPlane(input.place.longitude, input.place.latitude);
  const issuesOf = (geometry: Polygonal, path: string): InputIssue[] => {
    if (hasEmptyShell(geometry, plane)) {
      return [{ path, message: 'an outer ring encloses no area; send a valid polygon' }];
    }
    if (backwardAreaM2(geometry, plane) > leastBackwardM2) {
      return [
        {
          path,
          message:
            'a ring crosses itself or a hole lies outside its shell; send a valid polygon (OGC simple features)',
        },
      ];
    }
    return [];
  };
  const inCollection = (name: 'blocks' | 'receptors') =>
    input[name].features.flatMap(({ geometry }, index) =>
      isPolygonal(geometry) ? issuesOf(geometry, `${name}.features.${index}.geometry`) : [],
    );
  return [
    ...(input.site === undefined ? [] : issuesOf(input.site, 'site')),
    ...inCollection('blocks'),
    ...inCollection('receptors'),
  ];
}

/** As of a ring whose two halves, crossed, cancel each other. */
function hasEmptyShell(geometry: Polygonal, plane: LocalPlane): boolean {
  return polygonsOf(geometry).some(
    ([shell = []]) =>
      Math.abs(signedRingArea(shell.map((lngLat) => plane.toPlane(lngLat)))) < leastBackwardM2,
  );
}

/** A wall and a ring are measured from the site's boundary. */
function siteIssues({ site, rule }: StudyInput): InputIssue[] {
  if (site !== undefined) return [];
  const clause = rule.clauses.find(
    ({ baseline, receptors }) => typeof baseline === 'object' || receptors.ring !== undefined,
  );
  return clause === undefined
    ? []
    : [
        {
          path: 'site',
          message: `clause ${clause.id} is measured from the site's boundary; send the site`,
        },
      ];
}

function windowIssues(input: StudyInput): InputIssue[] {
  return input.rule.clauses.flatMap((clause, index) => {
    const dates = expandDays(clause.days, input.year, input.place).flatMap((group) => group.dates);
    const hasSun = dates.some((date) => windowSpans(clause, date, input.place).length > 0);
    return hasSun
      ? []
      : [
          {
            path: `rule.clauses.${index}.window`,
            message: 'the sun does not stand in this window on any of its days',
          },
        ];
  });
}
