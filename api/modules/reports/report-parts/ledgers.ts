import type { Content } from 'pdfmake/interfaces';
import { drawLedger } from '../../../../shared/drawing/ledger-drawing.ts';
import { drawLegend } from '../../../../shared/drawing/legend-drawing.ts';
import { palette } from '../../../../shared/drawing/palette.ts';
import type { SunLedger } from '../../../../shared/receptors/sun-ledger-schema.ts';
import { heading, page } from './report-look.ts';
import { nameReceptorClass, type ReportScene } from './report-scene.ts';

/** The sun ledgers of the receptors that lose most, on the key dates. */
export function ledgerPart(scene: ReportScene): Content[] {
  const { ledgers } = scene.payload;
  if (ledgers.length === 0) return [];
  return [
    heading('Sun ledgers of the most affected'),
    {
      text: 'For each key date the sun now stands over the sun with the proposal, from sunrise to sunset. A band is as high as the share of the open ground that is in sun, so that its surface stands for the mean hours. Hours and energy are those of a clear sky.',
      margin: [0, 0, 0, 6],
    },
    {
      svg: drawLegend(['sun', 'lost', 'window'], page.textWidth),
      width: page.textWidth,
      margin: [0, 0, 0, 4],
    },
    ...ledgers.map((ledger) => ledgerEntry(scene, ledger)),
  ];
}

function ledgerEntry(scene: ReportScene, ledger: SunLedger): Content {
  const { figures, time, notMet, payload } = scene;
  const number = notMet.find((one) => one.receptor === ledger.receptor)?.number;
  const judged = payload.study.judgedDays
    .filter(({ clause }) =>
      payload.findingRows.some((row) => row.receptor === ledger.receptor && row.clause === clause),
    )
    .flatMap(({ days }) => days);
  const spans = ledger.days.flatMap((day) =>
    day.lostSpans.length === 0
      ? []
      : [
          `${time.shortMonthAndDay(day.date)} ${day.lostSpans
            .map(({ fromAt, toAt }) => `${time.clock(fromAt)} to ${time.clock(toAt)}`)
            .join(' and ')}`,
        ],
  );
  const energy = ledger.days
    .map(
      (day) =>
        `${time.shortMonthAndDay(day.date)} ${figures.inUnit(day.beamEnergyKwhM2.before, 'kWh/m²')} now, ${figures.inUnit(day.beamEnergyKwhM2.after, 'kWh/m²')} with it`,
    )
    .join('; ');
  return {
    stack: [
      {
        text: [
          number === undefined ? '' : { text: `No. ${number}   `, color: palette.madder },
          ledger.label,
          {
            text: `   ${nameReceptorClass(ledger.class)}${ledger.openAreaM2 === null ? '' : `, ${figures.area(ledger.openAreaM2)} of open ground`}`,
            style: 'plain',
            fontSize: 8.5,
          },
        ],
        style: 'subheading',
        margin: [0, 8, 0, 2],
      },
      {
        svg: drawLedger(ledger, { width: page.textWidth, time, figures, judged, hasFigures: true }),
        width: page.textWidth,
      },
      {
        text: [
          spans.length === 0
            ? 'At no time does a twentieth of it lose the sun. '
            : `Sun is lost, at a twentieth of it or more: ${spans.join('; ')}; at other times less than that. `,
          `Energy: ${energy}.`,
        ],
        style: 'small',
        margin: [0, 2, 0, 0],
      },
    ],
    unbreakable: true,
  };
}
