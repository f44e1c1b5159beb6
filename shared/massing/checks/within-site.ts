import type { PlanePoint, Ring } from '../../geometry/ring.ts';
import type { BlockFootprint } from '../block-footprint.ts';
import { labelBlock, placeAt } from '../block-label.ts';
import { sweepFootprints } from '../footprint-sweep.ts';
import { createIssue } from '../issue-severities.ts';
import type { MassingIssue } from '../massing-issue.ts';
import { leastAreaM2, type MassingCheck, type MassingScene } from '../massing-scene.ts';

/** Up to this far beyond the parcel's line is drawing tolerance: metres. */
const toleranceM = 0.5;

/** Proposed blocks stand on the site's parcels; existing ones do so for the greater part. */
export const checkWithinSite: MassingCheck = (scene) =>
  scene.siteRings.length === 0
    ? []
    : scene.located.flatMap((footprint) => checkBlock(footprint, scene) ?? []);

function checkBlock(footprint: BlockFootprint, scene: MassingScene): MassingIssue | null {
  const { block, areaM2 } = footprint;
  const outside = measureOutside(footprint, scene.siteRings);
  if (areaM2 === null || outside === null || outside.areaM2 < leastAreaM2) return null;
  const label = labelBlock(block);
  const place = placeAt(label, scene.toLngLat(outside.farthest));

  if (block.role === 'existing') {
    if (outside.areaM2 <= areaM2 / 2) return null;
    return createIssue(
      'MASSING_EXISTING_OUTSIDE_SITE',
      place,
      `${label.text} is given as existing, to be removed, but ${describe(outside.areaM2, areaM2)} of it lies outside the site's parcels.`,
      'Take it out unless it is removed with this proposal; neighbouring buildings are known already.',
    );
  }
  if (areaM2 - outside.areaM2 < leastAreaM2) {
    return createIssue(
      'MASSING_OUTSIDE_SITE',
      place,
      `${label.text} lies wholly outside the site's parcels.`,
      'Check that the drawing was georeferenced, and that the application names every parcel of the site.',
    );
  }
  if (outside.farthestM <= toleranceM) return null;
  return createIssue(
    'MASSING_PARTLY_OUTSIDE_SITE',
    place,
    `${label.text} reaches ${outside.farthestM.toFixed(1)} m beyond the site's parcels, with ${describe(outside.areaM2, areaM2)} of its footprint.`,
    'Pull the block back, or add the parcel that it stands on to the application.',
  );
}

interface Outside {
  areaM2: number;
  /** The place farthest from the parcels, and how far that is. */
  farthest: PlanePoint;
  farthestM: number;
}

/** The part of a footprint that no parcel holds; null where there is none or it can't be measured. */
function measureOutside({ rings }: BlockFootprint, siteRings: readonly Ring[]): Outside | null {
  const outside: Outside = { areaM2: 0, farthest: [NaN, NaN], farthestM: -1 };
  const isComplete = sweepFootprints(
    [rings, siteRings],
    ([inBlock, inSite], { areaM2, at, corners }) => {
      if (inBlock === 0 || inSite !== 0) return;
      outside.areaM2 += areaM2;
      for (const point of [at, ...corners()]) {
        const distanceM = distanceToRings(point, siteRings);
        if (distanceM <= outside.farthestM) continue;
        outside.farthest = point;
        outside.farthestM = distanceM;
      }
    },
  );
  return isComplete && outside.areaM2 > 0 ? outside : null;
}

function distanceToRings(point: PlanePoint, rings: readonly Ring[]): number {
  let leastM = Infinity;
  for (const ring of rings) {
    let previous = ring.at(-1);
    for (const corner of ring) {
      leastM = Math.min(leastM, distanceToSide(point, previous ?? corner, corner));
      previous = corner;
    }
  }
  return leastM;
}

function distanceToSide([x, y]: PlanePoint, [ax, ay]: PlanePoint, [bx, by]: PlanePoint): number {
  const [alongX, alongY] = [bx - ax, by - ay];
  const lengthM2 = alongX * alongX + alongY * alongY;
  const share = lengthM2 === 0 ? 0 : ((x - ax) * alongX + (y - ay) * alongY) / lengthM2;
  const nearest = Math.min(1, Math.max(0, share));
  return Math.hypot(x - ax - nearest * alongX, y - ay - nearest * alongY);
}

function describe(partM2: number, wholeM2: number): string {
  return `${partM2.toFixed(1)} m² (${Math.round((100 * partM2) / wholeM2)} %)`;
}
