import { labelBlock, placeAt } from '../block-label.ts';
import { createIssue } from '../issue-severities.ts';
import type { MassingBlock } from '../massing-block.ts';
import type { MassingIssue } from '../massing-issue.ts';
import { findPositionOutside, type MassingCheck, type MassingSite } from '../massing-scene.ts';

/** Every block lies within the municipality; one that would, were its coordinates turned round, is told so. */
export const checkWithinMunicipality: MassingCheck = ({ blocks, site }) =>
  blocks.flatMap((block) => checkBlock(block, site.extent) ?? []);

function checkBlock(block: MassingBlock, extent: MassingSite['extent']): MassingIssue | null {
  const outside = findPositionOutside(block, extent);
  if (outside === null) return null;
  const label = labelBlock(block);
  const [west, south, east, north] = extent;
  // Turning the extent round is the same as turning every corner round.
  if (findPositionOutside(block, [south, west, north, east]) === null) {
    return createIssue(
      'MASSING_COORDINATES_SWAPPED',
      placeAt(label, [outside[1], outside[0]]),
      `${label.text} has its coordinates the wrong way round: [${outside.join(', ')}] is latitude before longitude.`,
      'Export it again with longitude first, as GeoJSON has it.',
    );
  }
  return createIssue(
    'MASSING_OUTSIDE_MUNICIPALITY',
    placeAt(label, outside),
    `${label.text} has a corner at ${outside[0].toFixed(5)}, ${outside[1].toFixed(5)} (longitude, latitude), outside the municipality.`,
    'Check that the drawing was georeferenced at the site before it was exported.',
  );
}
