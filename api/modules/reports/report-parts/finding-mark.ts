import type { Content } from 'pdfmake/interfaces';
import { palette } from '../../../../shared/drawing/palette.ts';
import { element, svgDocument } from '../../../../shared/drawing/svg.ts';
import type { Finding } from '../../../../shared/study/evidence-schema.ts';

export const findingWords: Record<Finding, string> = {
  met: 'met',
  'not-met': 'not met',
  disregarded: 'disregarded',
  'not-affected': 'not affected',
};

/** A finding in words, with a tick or a cross before it: drawn, because the font has neither. */
export function findingMark(finding: Finding, fontSize = 8.5): Content {
  const words = findingWords[finding];
  if (finding === 'not-affected' || finding === 'disregarded') return { text: words, fontSize };
  const isMet = finding === 'met';
  return {
    columns: [
      { svg: drawMark(isMet), width: fontSize * 0.8, margin: [0, fontSize * 0.18, 0, 0] },
      {
        text: words,
        fontSize,
        width: 'auto',
        style: isMet ? 'plain' : 'strong',
        color: isMet ? palette.ink : palette.madder,
      },
    ],
    columnGap: fontSize * 0.4,
  };
}

function drawMark(isMet: boolean): string {
  const path = isMet ? 'M1 5.5L4 8.5L9 1.5' : 'M1.5 1.5L8.5 8.5M8.5 1.5L1.5 8.5';
  return svgDocument({ width: 10, height: 10 }, isMet ? 'met' : 'not met', [
    element('path', {
      d: path,
      fill: 'none',
      stroke: isMet ? palette.ink : palette.madder,
      'stroke-width': 1.7,
    }),
  ]);
}
