import type { Content, TableCell } from 'pdfmake/interfaces';
import { drawLegend } from '../../../../shared/drawing/legend-drawing.ts';
import type { ReportInstant } from '../report-payload.ts';
import { drawNorthAndScale, drawSheet, drawSmallPlan, pointsToAMetre } from './plan-sheets.ts';
import { heading, page, subheading } from './report-look.ts';
import { findWorstInstant, isJudged, type ReportScene } from './report-scene.ts';

const columns = 3;
const gap = 12;
const mapWidth = (page.textWidth - gap * (columns - 1)) / columns;

/** The shadows of every hour of the key dates: the worst judged hour large, then all in rows to one scale. */
export function keyDateSheets(scene: ReportScene): Content[] {
  const { payload } = scene;
  if (payload.instants.length === 0) return [];
  return [
    heading('Shadows hour by hour'),
    ...worstSheet(scene),
    {
      table: {
        headerRows: 1,
        dontBreakRows: true,
        keepWithHeaderRows: 1,
        widths: ['*'],
        body: [[sheetHead(scene)], ...listDates(scene).flatMap((day) => dateRows(scene, day))],
      },
      layout: {
        hLineWidth: () => 0,
        vLineWidth: () => 0,
        paddingLeft: () => 0,
        paddingRight: () => 0,
        paddingTop: () => 0,
        paddingBottom: () => 5,
      },
      pageBreak: 'before',
    },
  ];
}

function worstSheet(scene: ReportScene): Content[] {
  const worst = findWorstInstant(scene);
  if (worst === null) return [];
  const { time, figures, payload } = scene;
  const kind = isJudged(payload, worst.at) ? 'The judged hour' : 'The hour';
  return [
    subheading(`${kind} with the most net new shadow: ${time.dateAndClock(worst.at)}`),
    { svg: drawSheet(scene, worst, page.textWidth), width: page.textWidth },
    {
      svg: drawLegend(
        ['standing-shadow', 'net-new-shadow', 'proposal', 'removed', 'site', 'building', 'not-met'],
        page.textWidth,
      ),
      width: page.textWidth,
      margin: [0, 5, 0, 4],
    },
    {
      text: `${figures.area(worst.netNewM2)} of ground outside the site lies in shadow that has sun now; ${figures.area(worst.removedM2)} gains sun from what is removed. The numbers mark the receptors that do not meet a requirement, as on page 1.`,
    },
    {
      text: 'The following sheets show every whole hour from sunrise to sunset on the key dates, judged or not. Shadows that reach over the edge of a map go on beyond it, and the areas count them whole: with the sun near the horizon they run for kilometres over ground that may not be level.',
      margin: [0, 4, 0, 0],
    },
  ];
}

function listDates({ payload, time }: ReportScene) {
  const { keyDates } = payload.study;
  return keyDates
    .map(({ event, date }) => ({
      event,
      date,
      instants: payload.instants.filter(({ at }) => time.civilDateOf(at) === date),
    }))
    .filter(({ instants }) => instants.length > 0);
}

function dateRows(
  scene: ReportScene,
  day: { event: string; date: string; instants: ReportInstant[] },
): TableCell[][] {
  const rows: ReportInstant[][] = [];
  for (let start = 0; start < day.instants.length; start += columns) {
    rows.push(day.instants.slice(start, start + columns));
  }
  const words = day.event.replace('-', ' ').replace(/^./, (first) => first.toUpperCase());
  return rows.map((row, index) => [
    {
      stack: [
        ...(index === 0
          ? [
              {
                text: `${scene.time.civilDate(day.date)}: ${words}`,
                style: 'subheading',
                margin: [0, 2, 0, 4] as [number, number, number, number],
              },
            ]
          : []),
        {
          columns: row.map((instant) => ({
            width: mapWidth,
            stack: [
              { svg: drawSmallPlan(scene, instant, mapWidth), width: mapWidth },
              ...caption(scene, instant),
            ],
          })),
          columnGap: gap,
        },
      ],
    },
  ]);
}

function caption({ payload, time, figures }: ReportScene, instant: ReportInstant): Content[] {
  const date = time.shortMonthAndDay(time.civilDateOf(instant.at));
  return [
    {
      stack: [
        {
          text: [
            { text: `${date}, ${time.clockWithZone(instant.at)}`, style: 'strong' },
            ...(isJudged(payload, instant.at) ? [' · judged'] : []),
          ],
        },
        `sun ${figures.angle(instant.azimuthDeg)} from north, ${figures.angle(instant.altitudeDeg)} high`,
        `net new shadow ${figures.area(instant.netNewM2)}`,
      ],
      fontSize: 7.5,
      lineHeight: 1.15,
      margin: [0, 2, 0, 0],
    },
  ];
}

/** What holds for all maps of a sheet, repeated on each page. */
function sheetHead(scene: ReportScene): Content {
  /** 72 points to an inch of 0.0254 m. */
  const scaleNumber = Math.round(72 / 0.0254 / pointsToAMetre(scene, mapWidth) / 100) * 100;
  return {
    columns: [
      { svg: drawNorthAndScale(scene, mapWidth), width: 130 },
      {
        stack: [
          {
            svg: drawLegend(
              ['standing-shadow', 'net-new-shadow', 'proposal'],
              page.textWidth - 142,
            ),
            width: page.textWidth - 142,
          },
          {
            text: `All maps to one scale, about 1 : ${scene.figures.whole(scaleNumber)} as printed. Azimuth clockwise from true north; altitude with standard refraction.`,
            style: 'small',
            margin: [0, 2, 0, 0],
          },
        ],
        width: '*',
      },
    ],
    columnGap: 12,
  };
}
