import type { Content } from 'pdfmake/interfaces';
import { palette } from '../../../../shared/drawing/palette.ts';
import { proposalView } from './proposal-view.ts';
import { heading, paragraphs, subheading } from './report-look.ts';
import type { ReportScene } from './report-scene.ts';

/** What is asked for, and what the planner wrote, kept apart from what was computed. */
export function requestAndRecommendation(scene: ReportScene): Content[] {
  const { narrative, recommendation, reviewCase, issuedByName } = scene.payload;
  return [
    heading('The request and staff’s recommendation'),
    subheading('What is asked for'),
    ...(reviewCase.description.trim() === ''
      ? [noText('The applicant gave no description.')]
      : paragraphs(reviewCase.description)),
    ...proposalView(scene),
    subheading('Analysis'),
    ...(narrative.trim() === ''
      ? [noText('Staff added no analysis to the computed findings.')]
      : paragraphs(narrative)),
    subheading('Recommendation'),
    ...(recommendation.trim() === ''
      ? [noText('Staff makes no recommendation in this report.')]
      : [
          {
            table: { widths: ['*'], body: [[{ stack: paragraphs(recommendation) }]] },
            layout: {
              hLineWidth: () => 0,
              vLineWidth: (column: number) => (column === 0 ? 2 : 0),
              vLineColor: () => palette.ink,
              paddingLeft: () => 10,
              paddingTop: () => 1,
              paddingBottom: () => 0,
            },
          },
        ]),
    {
      text: `The description is the applicant's; analysis and recommendation are those of ${issuedByName}. All other parts of this report are generated from the study and cannot be edited.`,
      style: 'small',
      margin: [0, 6, 0, 0],
    },
  ];
}

function noText(words: string): Content {
  return { text: words, color: palette.inkLight };
}
