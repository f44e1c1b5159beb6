import type { PlanePoint, Ring } from '../../geometry/ring.ts';
import type { PlaneOutline } from '../block-footprint.ts';
import { labelBlock, placeAt } from '../block-label.ts';
import { sweepFootprints, type SweepCell } from '../footprint-sweep.ts';
import { createIssue, type IssueCode } from '../issue-severities.ts';
import type { MassingIssue } from '../massing-issue.ts';
import { findFirstCorner, type MassingCheck } from '../massing-scene.ts';
import { findRingCrossing } from '../ring-crossing.ts';

/** Narrower than this is rounding: metres. */
const roundingM = 1e-6;

/**
 * A footprint's rings enclose what they seem to: no ring crosses itself, holes lie within their outline and beside
 * each other. Told by winding numbers, which are 0 or 1 everywhere in a sound footprint, so that touching and
 * coincident edges do no harm.
 */
export const checkOutlines: MassingCheck = ({ located, toLngLat }) =>
  located.flatMap(({ block, outlines, rings }) => {
    const label = labelBlock(block);
    const say: Say = (code, at, message, suggestion) =>
      createIssue(
        code,
        placeAt(label, at === null ? findFirstCorner(block) : toLngLat(at)),
        `${label.text} ${message}`,
        suggestion,
      );
    const issues = outlines.flatMap((outline) => checkOutline(outline, say));
    return issues.length > 0 ? issues : checkParts(rings, say);
  });

type Say = (
  code: IssueCode,
  at: PlanePoint | null,
  message: string,
  suggestion: string,
) => MassingIssue;

function checkOutline(outline: PlaneOutline, say: Say): MassingIssue[] {
  const ringIssues = outline.flatMap((ring, index) => checkRing(ring, index === 0, say) ?? []);
  return ringIssues.length > 0 ? ringIssues : checkHoles(outline, say);
}

function checkRing(ring: Ring, isOutline: boolean, say: Say): MassingIssue | null {
  const what = isOutline ? 'an outline' : 'a hole';
  if (ring.length < 3) {
    return say(
      'MASSING_TOO_FEW_POINTS',
      ring[0] ?? null,
      `has ${what} of fewer than 3 corners, so it encloses nothing.`,
      'Draw it as a closed polygon.',
    );
  }
  const inside = isOutline ? 1 : -1;
  const wrong = findCell([[ring]], ([winding]) => winding !== 0 && winding !== inside);
  if (wrong === null) return null;
  return say(
    'MASSING_RING_CROSSES_ITSELF',
    findRingCrossing(ring) ?? wrong.at,
    `has ${what} that crosses itself.`,
    'Put its corners in order around the block, so that no two sides cross.',
  );
}

function checkHoles([outline, ...holes]: PlaneOutline, say: Say): MassingIssue[] {
  if (outline === undefined || holes.length === 0) return [];
  const isOutside = ([inOutline, inHoles]: readonly number[]) => inHoles !== 0 && inOutline === 0;
  const isTwice = ([, inHoles = 0]: readonly number[]) => inHoles < -1;
  // One look at all holes; only where something is wrong, each on its own.
  const outside = findCell([[outline], holes], isOutside);
  const twice = findCell([[outline], holes], isTwice);
  const issues: MassingIssue[] = [];
  if (outside !== null) {
    const wrong = holes.flatMap((hole) => {
      const beyond = findCell([[outline], [hole]], isOutside);
      return beyond === null ? [] : [{ hole, at: beyond.at }];
    });
    for (const { hole, at } of wrong) {
      const within = findCell([[outline], [hole]], (windings) => !windings.includes(0));
      issues.push(
        within === null
          ? say(
              'MASSING_HOLE_OUTSIDE',
              at,
              'has a hole that lies outside its outline.',
              'Take the hole out, or move it inside; a second part is a polygon of its own.',
            )
          : say(
              'MASSING_HOLE_CROSSES_OUTLINE',
              at,
              'has a hole that crosses its outline.',
              'Draw the hole wholly inside, or cut the outline back to it.',
            ),
      );
    }
  }
  if (twice !== null) {
    issues.push(
      say(
        'MASSING_HOLES_OVERLAP',
        twice.at,
        'has holes that lie over one another.',
        'Join the holes to one.',
      ),
    );
  }
  return issues;
}

function checkParts(rings: readonly Ring[], say: Say): MassingIssue[] {
  const twice = findCell([rings], ([winding = 0]) => winding > 1);
  if (twice === null) return [];
  return [
    say(
      'MASSING_PARTS_OVERLAP',
      twice.at,
      'has parts that lie over one another.',
      'Join them to one polygon; what lies twice is counted once.',
    ),
  ];
}

/** The largest cell in which the windings are wrong; null when there is none worth speaking of. */
function findCell(
  layers: readonly (readonly Ring[])[],
  isWrong: (windings: readonly number[]) => boolean,
): Pick<SweepCell, 'areaM2' | 'at'> | null {
  let largest: Pick<SweepCell, 'areaM2' | 'at'> = { areaM2: 0, at: [NaN, NaN] };
  const isComplete = sweepFootprints(layers, (windings, cell) => {
    if (cell.areaM2 <= largest.areaM2 || !isWrong(windings)) return;
    if (cell.widthM > roundingM && cell.heightM > roundingM) largest = cell;
  });
  if (largest.areaM2 > 0) return largest;
  // Edges that cross too often to be swept are a tangle, wherever it is.
  return isComplete ? null : { areaM2: 0, at: layers[0]?.[0]?.[0] ?? [NaN, NaN] };
}
