import { labelBlock, placeAt } from '../block-label.ts';
import { createIssue } from '../issue-severities.ts';
import { findFirstCorner, leastAreaM2, type MassingCheck } from '../massing-scene.ts';

/** A footprint covers some ground. */
export const checkFootprintSize: MassingCheck = ({ located }) =>
  located.flatMap(({ block, areaM2 }) => {
    if (areaM2 === null || areaM2 >= leastAreaM2) return [];
    const label = labelBlock(block);
    return createIssue(
      'MASSING_FOOTPRINT_TOO_SMALL',
      placeAt(label, findFirstCorner(block)),
      `${label.text} has a footprint of ${areaM2.toFixed(2)} m²; less than ${leastAreaM2} m² is no block.`,
      'Take it out, or draw its footprint anew if it was meant to be larger.',
    );
  });
