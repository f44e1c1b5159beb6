import type { Content } from 'pdfmake/interfaces';
import { palette } from '../../../../shared/drawing/palette.ts';
import { element, svgDocument } from '../../../../shared/drawing/svg.ts';
import type { RuleClause } from '../../../../shared/rules/rule-schema.ts';
import { sayClause } from './clause-in-words.ts';
import { listFailing } from './failing-list.ts';
import { findingMark } from './finding-mark.ts';
import { drawKeyedPlan, drawNorthAndScale, drawTitle } from './plan-sheets.ts';
import { label, page, rule } from './report-look.ts';
import { findWorstInstant, isJudged, type ReportScene } from './report-scene.ts';

/**
 * The first page: which case, which study, whether the rule is met, and every receptor at which it
 * isn't, by address under its clause.
 */
export function summaryPage(scene: ReportScene): Content[] {
  const { payload } = scene;
  return [
    masthead(scene),
    {
      text: payload.reviewCase.title,
      style: 'title',
      fontSize: payload.reviewCase.title.length > 34 ? 17 : 25,
      margin: [0, 14, 0, 2],
    },
    { text: describeProposal(scene), fontSize: 10.5, margin: [0, 0, 0, 10] },
    caseFacts(scene),
    ...verdict(scene),
    ...payload.study.rule.clauses.flatMap((clause) => clauseSummary(scene, clause)),
    ...worstHour(scene),
  ];
}

function masthead({ payload }: ReportScene): Content {
  return {
    stack: [
      {
        columns: [
          { svg: drawNoonMark(), width: 12 },
          {
            text: [
              { text: payload.municipality.name, style: 'strong' },
              '   Staff report on sun and shadow',
            ],
            fontSize: 11,
            margin: [0, 1, 0, 0],
          },
          {
            text: payload.number,
            alignment: 'right',
            fontSize: 11,
            width: 120,
            margin: [0, 1, 0, 0],
          },
        ],
        columnGap: 6,
      },
      { stack: [rule(0.8)], margin: [0, 5, 0, 0] },
    ],
  };
}

/** A vertical hairline crossed by a short bar. */
function drawNoonMark(): string {
  return svgDocument({ width: 12, height: 16 }, 'Noonmark', [
    element('path', {
      d: 'M6 0V16M2 9.5H10',
      stroke: palette.ink,
      'stroke-width': 1.2,
      fill: 'none',
    }),
  ]);
}

function describeProposal({ payload, figures }: ReportScene): string {
  const { heightM, storeys } = payload.revision.figures;
  const size = [
    ...(storeys === null
      ? []
      : [`${figures.whole(storeys)} ${storeys === 1 ? 'storey' : 'storeys'}`]),
    ...(heightM === null ? [] : [`${figures.length(heightM)} high`]),
  ].join(', ');
  return [payload.reviewCase.address, size, `applicant ${payload.reviewCase.applicantName}`]
    .filter((part) => part !== '')
    .join(' · ');
}

function caseFacts({ payload, time }: ReportScene): Content {
  const { study } = payload;
  const fact = (term: string, said: Content): Content => ({
    stack: [label(term), { text: '', fontSize: 1.5 }, said],
  });
  const citation = study.rule.citation === '' ? '' : `, ${study.rule.citation}`;
  return {
    table: {
      widths: ['22%', '24%', '32%', '22%'],
      body: [
        [
          fact('Case', payload.reviewCase.number),
          fact('Report', payload.number),
          fact('Issued', time.date(payload.issuedAt)),
          fact('Massing', `revision ${payload.revision.revision}`),
        ],
        [
          {
            colSpan: 2,
            ...stackOf(
              fact('Rule', `${study.rule.title}, version ${study.rule.version}${citation}`),
            ),
          },
          {},
          fact('Issued by', payload.issuedByName),
          fact('Engine', study.engine),
        ],
        [
          {
            colSpan: 4,
            ...stackOf(
              fact('Digest of the study', {
                text: study.digest,
                fontSize: 8,
                characterSpacing: 0.15,
              }),
            ),
          },
          {},
          {},
          {},
        ],
      ],
    },
    layout: {
      hLineWidth: (row, node) => (row === 0 || row === node.table.body.length ? 0.8 : 0.4),
      vLineWidth: () => 0.4,
      hLineColor: palette.ink,
      vLineColor: palette.ink,
      paddingLeft: () => 6,
      paddingRight: () => 6,
      paddingTop: () => 4,
      paddingBottom: () => 3,
    },
    fontSize: 9.5,
    margin: [0, 0, 0, 12],
  };
}

function stackOf(content: Content) {
  return { stack: [content] };
}

function verdict({ payload, notMet, figures }: ReportScene): Content[] {
  const receptors = new Set(payload.findingRows.map(({ receptor }) => receptor)).size;
  const count = (finding: string) =>
    figures.whole(payload.findingRows.filter((row) => row.finding === finding).length);
  const { met } = payload.study.findings;
  return [
    {
      columns: [
        { ...stackOf(findingMark(met ? 'met' : 'not-met', 15)), width: met ? 56 : 80 },
        {
          text: met
            ? `at all of the ${figures.whole(receptors)} receptors judged`
            : `at ${figures.whole(notMet.length)} of ${figures.whole(receptors)} receptors judged`,
          fontSize: 15,
          width: '*',
        },
      ],
      margin: [0, 0, 0, 4],
    },
    {
      text: `Findings: ${count('not-met')} not met, ${count('met')} met, ${count('disregarded')} disregarded, ${count('not-affected')} not affected. Loss index ${figures.decimal(payload.study.findings.lossIndex)} on a scale from 0 to 100: the share of the sun's energy that is lost where any is lost.`,
      margin: [0, 0, 0, 6],
    },
  ];
}

function clauseSummary(scene: ReportScene, clause: RuleClause): Content[] {
  const judged = scene.payload.study.judgedDays.find((one) => one.clause === clause.id)?.days ?? [];
  const failing = scene.notMet.filter(({ rows }) => rows.some((row) => row.clause === clause.id));
  const { figures } = scene;
  const finding = scene.payload.study.findings.clauses.find(
    (one) => one.clause === clause.id,
  )?.finding;
  const words =
    failing.length > 0
      ? `Not met at ${figures.whole(failing.length)}:`
      : finding === 'no-receptor'
        ? 'No receptor of this kind lies within reach.'
        : 'Met everywhere.';
  return [
    {
      text: [
        { text: `${clause.title}: `, style: 'strong' },
        `asked for is ${sayClause(clause, judged, scene.time, figures).limit}. `,
        words,
      ],
      margin: [0, 4, 0, 3],
    },
    ...(failing.length === 0 ? [] : [listFailing(failing, clause.id, scene)]),
  ];
}

/** Points: what the first page has left below its list if that has no line, what a line takes, and the smallest map that can be read. */
const room = { withoutLines: 330, aLine: 14, aClause: 46, leastWidth: 205, mostWidth: 340 };

function worstHour(scene: ReportScene): Content[] {
  const worst = findWorstInstant(scene);
  const { clauses } = scene.payload.study.rule;
  const lines = scene.notMet.flatMap(({ rows }) => rows).length;
  const height = room.withoutLines - lines * room.aLine - (clauses.length - 1) * room.aClause;
  const [west, south, east, north] = scene.payload.mapExtent;
  const widthToHeight =
    ((east - west) * Math.cos((scene.origin.latitude * Math.PI) / 180)) / (north - south);
  const width = Math.min(height * widthToHeight, room.mostWidth);
  if (worst === null || width < room.leastWidth) return [];
  const { figures } = scene;
  return [
    {
      columns: [
        { svg: drawKeyedPlan(scene, worst, width), width },
        {
          stack: [
            label(
              `${isJudged(scene.payload, worst.at) ? 'The judged hour' : 'The hour'} with the most net new shadow`,
            ),
            {
              svg: drawTitle(scene, worst, page.textWidth - width - 12),
              margin: [0, 4, 0, 6],
            },
            { svg: drawNorthAndScale(scene, width), margin: [0, 0, 0, 6] },
            {
              text: `${figures.area(worst.netNewM2)} of ground in shadow that has sun now: hatched. Plain: shadow that is there already.${scene.notMet.length === 0 ? '' : ' The numbers are those of the list above.'} Every hour of every key date follows further on.`,
            },
          ],
          style: 'small',
          width: page.textWidth - width - 12,
        },
      ],
      columnGap: 12,
      unbreakable: true,
      margin: [0, 8, 0, 0],
    },
  ];
}
