import type { Content } from 'pdfmake/interfaces';
import { palette } from '../../../../shared/drawing/palette.ts';
import { sayByStreet } from './addresses.ts';
import type { NotMetReceptor } from './not-met.ts';
import { hairlineTable, label } from './report-look.ts';
import { nameReceptorClass, nameReceptors, type ReportScene } from './report-scene.ts';

/** Up to so many, for their figures. */
const mostWithFigures = 24;
/** Up to so many, for a list in columns; more are set street by street as running text. */
const mostInColumns = 96;

/** The receptors that don't meet a clause, in the fullest form for which the first page has room. */
export function listFailing(
  failing: NotMetReceptor[],
  clause: string,
  scene: ReportScene,
): Content {
  const total = scene.notMet.length;
  if (total <= mostWithFigures) return figuresTable(failing, clause, scene);
  if (total <= mostInColumns) return inColumns(failing);
  return runningList(failing);
}

function figuresTable(failing: NotMetReceptor[], clause: string, scene: ReportScene): Content {
  const { figures, time } = scene;
  return {
    table: {
      widths: [16, '*', 56, 36, 58, 58, 58],
      headerRows: 1,
      body: [
        [
          label('No.'),
          label('Where'),
          label('Kind'),
          label('Day'),
          rightLabel('Now'),
          rightLabel('With it'),
          rightLabel('Lost'),
        ],
        ...failing.flatMap((one) =>
          one.rows
            .filter((row) => row.clause === clause)
            .map((row): Content[] => [
              { text: String(one.number), style: 'strong', color: palette.madder },
              { text: one.label, style: 'strong' },
              nameReceptorClass(one.class),
              row.day === null ? 'all' : time.shortMonthAndDay(row.day),
              { text: figures.inUnit(row.before, row.unit), style: 'figure' },
              { text: figures.inUnit(row.after, row.unit), style: 'figure' },
              { text: figures.inUnit(row.lost, row.unit), style: 'figure' },
            ]),
        ),
      ],
    },
    layout: { ...hairlineTable, paddingTop: () => 1.5, paddingBottom: () => 0.9 },
    style: 'cell',
    margin: [0, 0, 0, 4],
  };
}

function rightLabel(text: string): Content {
  return { stack: [label(text)], alignment: 'right' };
}

function inColumns(failing: NotMetReceptor[]): Content {
  const columns = 3;
  const perColumn = Math.ceil(failing.length / columns);
  return {
    columns: Array.from({ length: columns }, (_, column) => ({
      stack: failing.slice(column * perColumn, (column + 1) * perColumn).map((one) => ({
        text: [
          { text: `${one.number}  `, style: 'strong', color: palette.madder },
          `${one.label} (${nameReceptorClass(one.class)})`,
        ],
      })),
    })),
    columnGap: 12,
    fontSize: 7.5,
    lineHeight: 1.2,
  };
}

/** The shortest form that still has every address: kind by kind, street by street. */
function runningList(failing: NotMetReceptor[]): Content {
  const kinds = [...new Set(failing.map((one) => one.class))];
  return {
    stack: kinds.map((kind) => ({
      text: [
        { text: `${nameReceptors(kind)}: `, style: 'strong' },
        `${sayByStreet(failing.filter((one) => one.class === kind).map((one) => one.label))}.`,
      ],
    })),
    fontSize: 7,
    lineHeight: 1.15,
  };
}
