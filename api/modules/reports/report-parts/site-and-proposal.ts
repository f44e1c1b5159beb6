import type { Content } from 'pdfmake/interfaces';
import { drawLegend } from '../../../../shared/drawing/legend-drawing.ts';
import { drawSheet } from './plan-sheets.ts';
import { definitions, hairlineTable, heading, label, page, subheading } from './report-look.ts';
import type { ReportScene } from './report-scene.ts';

/** Where the site is, what is proposed on it, and from which file. */
export function siteAndProposal(scene: ReportScene): Content[] {
  const { payload, time, figures } = scene;
  const { revision, siteParcels } = payload;
  const size = revision.figures;
  return [
    heading('The site and the proposal'),
    { svg: drawSheet(scene, null, page.textWidth), width: page.textWidth },
    {
      svg: drawLegend(['proposal', 'removed', 'site', 'building', 'not-met'], page.textWidth),
      width: page.textWidth,
      margin: [0, 5, 0, 8],
    },
    definitions([
      [
        'Site',
        siteParcels
          .map(
            (one) => `${one.number}, ${one.address}, zone ${one.zone}, ${figures.area(one.areaM2)}`,
          )
          .join('; '),
      ],
      [
        'Massing',
        `revision ${revision.revision}, file ${revision.fileName}, received ${time.dateAndClock(revision.uploadedAt)}`,
      ],
      ['SHA-256 of the file', { text: revision.sha256, fontSize: 8 }],
      [
        'Size',
        [
          ...(size.heightM === null ? [] : [`${figures.length(size.heightM)} high`]),
          ...(size.storeys === null ? [] : [`${figures.whole(size.storeys)} storeys`]),
          ...(size.footprintM2 === null ? [] : [`footprint ${figures.area(size.footprintM2)}`]),
          ...(size.volumeM3 === null ? [] : [`volume ${figures.whole(size.volumeM3)} m³`]),
        ].join(', '),
      ],
      ['Heights around, with the number of buildings', sayHeightSources(scene)],
    ]),
    subheading('Blocks as submitted'),
    blocksTable(scene),
  ];
}

function blocksTable({ payload, figures }: ReportScene): Content {
  return {
    table: {
      headerRows: 1,
      dontBreakRows: true,
      widths: ['*', 110, 70, 70, 60],
      body: [
        [
          label('Block'),
          label('What becomes of it'),
          right('Base'),
          right('Top'),
          right('Storeys'),
        ],
        ...payload.revision.blocks.map(({ properties }): Content[] => [
          properties.name === null ? properties.id : `${properties.name} (${properties.id})`,
          properties.role === 'proposed' ? 'comes' : 'stands now, is removed',
          { text: figures.height(properties.baseM), style: 'figure' },
          { text: figures.height(properties.topM), style: 'figure' },
          {
            text: properties.storeys === null ? 'not given' : figures.whole(properties.storeys),
            style: 'figure',
          },
        ]),
      ],
    },
    layout: hairlineTable,
    style: 'cell',
  };
}

function right(text: string): Content {
  return { stack: [label(text)], alignment: 'right' };
}

/** Where the heights of what stands around come from: the accuracy of every shadow hangs on it. */
function sayHeightSources({ around, figures }: ReportScene): string {
  const counts = new Map<string, number>();
  for (const { heightSource } of around) {
    counts.set(heightSource, (counts.get(heightSource) ?? 0) + 1);
  }
  if (counts.size === 0) return 'no building stands within reach of the shadow';
  return [...counts.entries()]
    .sort((a, b) => b[1] - a[1] || (a[0] < b[0] ? -1 : 1))
    .map(([source, count]) => `${source} (${figures.whole(count)})`)
    .join('; ');
}
