import type { Content } from 'pdfmake/interfaces';
import { palette } from '../../../../shared/drawing/palette.ts';
import { heading, paragraphs } from './report-look.ts';
import type { ReportScene } from './report-scene.ts';

/** Published comments in full, in the order in which they came, and how many were withheld. */
export function commentsPart({ payload, time, figures }: ReportScene): Content[] {
  const { publishedComments, withheldComments } = payload;
  const withheld =
    withheldComments === 0
      ? 'None was withheld.'
      : `${figures.whole(withheldComments)} ${withheldComments === 1 ? 'was' : 'were'} withheld from publication; the case file keeps the text and the reason.`;
  return [
    heading('Comments from the public'),
    {
      text:
        publishedComments.length === 0
          ? `No comment had been published when this report was issued. ${withheld}`
          : `${figures.whole(publishedComments.length)} published when this report was issued, in the order in which they came. ${withheld}`,
      margin: [0, 0, 0, 8],
    },
    ...publishedComments.map((comment): Content => {
      const about = [
        time.dateAndClock(comment.receivedAt),
        ...(comment.revision === null ? [] : [`on revision ${comment.revision}`]),
        ...(comment.pin === null
          ? []
          : [`about the place ${degrees(comment.pin[1])}, ${degrees(comment.pin[0])}`]),
      ].join(', ');
      return {
        stack: [
          {
            text: [
              { text: comment.authorName, style: 'strong' },
              { text: `   ${about}`, fontSize: 8, color: palette.inkLight },
            ],
            margin: [0, 4, 0, 3],
            headlineLevel: 3,
          },
          ...paragraphs(comment.body),
        ],
      };
    }),
  ];
}

/** Latitude or longitude to a metre, signed as in the evidence file. */
function degrees(value: number): string {
  return `${value.toFixed(5).replace('-', '−')}°`;
}
