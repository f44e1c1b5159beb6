import type { Content, TableCell } from 'pdfmake/interfaces';
import type { FindingRow } from '../../../../shared/contracts/studies.ts';
import { palette } from '../../../../shared/drawing/palette.ts';
import type { RuleClause } from '../../../../shared/rules/rule-schema.ts';
import { compareAddresses, sayByStreet } from './addresses.ts';
import { sayClause } from './clause-in-words.ts';
import { findingMark } from './finding-mark.ts';
import { definitions, hairlineTable, heading, label, subheading } from './report-look.ts';
import { nameReceptorClass, nameReceptors, type ReportScene } from './report-scene.ts';

/** The rule in plain words, and beside each clause what was found under it. */
export function ruleAndFindings(scene: ReportScene): Content[] {
  const { rule } = scene.payload.study;
  const citation = rule.citation === '' ? '' : ` (${rule.citation})`;
  return [
    heading('The rule and the findings'),
    {
      text: `${rule.title}${citation}, version ${rule.version}, has ${rule.clauses.length === 1 ? 'one clause' : `${rule.clauses.length} clauses`}. The study keeps the version by which it was judged.`,
      margin: [0, 0, 0, 4],
    },
    {
      text: [
        'Now: what stands today. With it: what stands after the proposal. Limit and margin are those of the limit that decides; a negative margin misses it. Each figure is rounded by itself. ',
        'Close: within one step of the judged time, or one spacing of the sample points, of the limit. ',
        'A receptor is not affected where the proposal changes nothing at any judged instant.',
      ],
      style: 'small',
      margin: [0, 0, 0, 2],
    },
    ...rule.clauses.flatMap((clause) => clausePart(scene, clause)),
  ];
}

function clausePart(scene: ReportScene, clause: RuleClause): Content[] {
  const { payload, time, figures } = scene;
  const judged = payload.study.judgedDays.find((one) => one.clause === clause.id)?.days ?? [];
  const words = sayClause(clause, judged, time, figures);
  const rows = payload.findingRows.filter((row) => row.clause === clause.id);
  const affected = rows.filter((row) => row.finding !== 'not-affected');
  return [
    subheading(clause.title),
    definitions([
      ['Judged', words.receptors],
      ['Days', words.days],
      ['Hours', words.hours],
      ['Measure', words.measure],
      ['Asked for', { text: words.limit, style: 'strong' }],
      ...(words.disregard === null ? [] : [['Disregarded', words.disregard] as const]),
      ['Found', countFindings(rows, scene)],
    ]),
    ...(affected.length === 0 ? [] : [findingsTable(scene, affected)]),
    ...notAffected(scene, rows),
  ];
}

function countFindings(rows: readonly FindingRow[], { figures }: ReportScene): string {
  if (rows.length === 0) return 'No receptor of this kind lies within reach of the shadow.';
  const count = (finding: FindingRow['finding']) =>
    figures.whole(rows.filter((row) => row.finding === finding).length);
  return `${count('not-met')} not met, ${count('met')} met, ${count('disregarded')} disregarded, ${count('not-affected')} not affected`;
}

const order: Record<FindingRow['finding'], number> = {
  'not-met': 0,
  disregarded: 1,
  met: 2,
  'not-affected': 3,
};

function findingsTable(scene: ReportScene, rows: readonly FindingRow[]): Content {
  const sorted = [...rows].sort(
    (a, b) =>
      order[a.finding] - order[b.finding] || b.lost - a.lost || (a.label < b.label ? -1 : 1),
  );
  return {
    table: {
      headerRows: 1,
      dontBreakRows: true,
      keepWithHeaderRows: 1,
      widths: [13, '*', 31, 46, 46, 46, 46, 50, 46],
      body: [
        [
          label('No.'),
          label('Receptor'),
          label('Day'),
          right('Now'),
          right('With it'),
          right('Lost'),
          right('Limit'),
          right('Margin'),
          label('Finding'),
        ],
        ...sorted.map((row) => findingCells(scene, row)),
      ],
    },
    layout: {
      ...hairlineTable,
      paddingLeft: (column) => (column === 0 ? 0 : 3),
      paddingRight: (column) => (column === 8 ? 0 : 3),
    },
    style: 'cell',
  };
}

function findingCells(scene: ReportScene, row: FindingRow): TableCell[] {
  const { figures, time, notMet } = scene;
  const number = notMet.find((one) => one.receptor === row.receptor)?.number;
  const figure = (value: number): Content => ({
    text: figures.inUnit(value, row.unit),
    style: row.unit === 'h' ? 'figure' : 'longFigure',
  });
  return [
    { text: number === undefined ? '' : String(number), style: 'strong', color: palette.madder },
    {
      stack: [
        { text: row.label, style: row.finding === 'not-met' ? 'strong' : 'plain' },
        {
          text: [
            nameReceptorClass(row.class),
            ...(row.band === null ? [] : [`, ${row.band} loss`]),
          ].join(''),
          fontSize: 7,
          color: palette.inkLight,
        },
      ],
    },
    row.day === null ? 'all' : time.shortMonthAndDay(row.day),
    figure(row.before),
    figure(row.after),
    figure(row.lost),
    figure(row.limit),
    { text: sayMargin(row, scene), style: row.unit === 'h' ? 'figure' : 'longFigure' },
    {
      stack: [
        findingMark(row.finding),
        ...(row.close ? [{ text: 'close', fontSize: 7, color: palette.inkLight }] : []),
      ],
    },
  ];
}

/** A margin that rounds to nothing is still one: it says on which side of the limit the value lies. */
function sayMargin(row: FindingRow, { figures }: ReportScene): string {
  const text = figures.inUnit(row.margin, row.unit);
  if (row.unit === 'h' && row.margin !== 0 && Math.abs(row.margin) < 0.5 / 60) {
    return row.margin < 0 ? 'misses by < 1 min' : '< 1 min';
  }
  return text;
}

function notAffected({ payload, figures }: ReportScene, rows: readonly FindingRow[]): Content[] {
  const untouched = rows.filter((row) => row.finding === 'not-affected');
  if (untouched.length === 0) return [];
  const compare = compareAddresses(payload.municipality.locale);
  const byClass = new Map<string, string[]>();
  for (const row of untouched) {
    byClass.set(row.class, [...(byClass.get(row.class) ?? []), row.label]);
  }
  return [
    {
      text: `Not affected: ${figures.whole(untouched.length)}`,
      style: 'strong',
      fontSize: 8.5,
      margin: [0, 8, 0, 2],
    },
    ...[...byClass.entries()].map(([receptorClass, labels]) => ({
      text: [
        {
          text: `${nameReceptors(receptorClass)}, ${figures.whole(labels.length)}: `,
          style: 'strong',
        },
        `${sayByStreet(labels.sort(compare))}.`,
      ],
      style: 'small',
      fontSize: 7,
      margin: [0, 0, 0, 3] as [number, number, number, number],
    })),
  ];
}

function right(text: string): Content {
  return { stack: [label(text)], alignment: 'right' };
}
