import { beforeAll, describe, expect, it } from 'vitest';
import { renderReport } from '../../../api/modules/reports/render-report.ts';
import type { ReportPayload } from '../../../api/modules/reports/report-payload.ts';
import { createFigureFormat } from '../../../shared/drawing/figure-format.ts';
import { extentOnPlane } from '../../../shared/drawing/frame.ts';
import { createLocalPlane } from '../../../shared/geometry/local-plane.ts';
import { buildLarkhavenPayload } from './larkhaven-payload.ts';
import { readPdf, type PdfFacts, type PdfText } from './read-pdf.ts';

let payload: ReportPayload;
let bytes: Buffer;
let pages: number;
let pdf: PdfFacts;

beforeAll(async () => {
  payload = await buildLarkhavenPayload();
  ({ bytes, pages } = await renderReport(payload));
  pdf = await readPdf(bytes);
}, 180_000);

/** The payload with so many receptors not met, each with an address of its own. */
function withFailing(count: number): ReportPayload {
  const [pattern] = payload.findingRows.filter(({ finding }) => finding === 'not-met');
  if (pattern === undefined) throw new Error('The sample tower meets the rule.');
  const rows = Array.from({ length: count }, (_, index) => ({
    ...pattern,
    receptor: `far-${index}`,
    label: `${index + 1} Quillonbrook Street`,
  }));
  return {
    ...payload,
    findingRows: rows,
    ledgers: [],
    instants: [],
    study: {
      ...payload.study,
      findings: {
        ...payload.study.findings,
        clauses: [
          {
            clause: pattern.clause,
            finding: 'not-met',
            receptorsNotMet: rows.map(({ receptor }) => receptor),
          },
        ],
      },
    },
  };
}

describe('the first page', () => {
  it('names case, address, report, date and the whole digest of the study', () => {
    const words = pdf.pages[0]?.words;
    expect(words).toContain('Tallow Wharf Lofts');
    expect(words).toContain('2 Oarlock Shore');
    expect(words).toContain('2026-0001-R1');
    expect(words).toContain('December 1, 2026');
    expect(words).toContain(payload.study.digest);
  });

  it('lists every receptor that does not meet a clause by its address, with counts', () => {
    const words = pdf.pages[0]?.words ?? '';
    const failing = payload.findingRows.filter(({ finding }) => finding === 'not-met');
    expect(failing.length).toBeGreaterThan(3);
    for (const row of failing) expect(words).toContain(row.label);
    const judged = new Set(payload.findingRows.map(({ receptor }) => receptor)).size;
    expect(words).toContain(`not met at ${failing.length} of ${judged} receptors judged`);
    expect(words).toContain(`${failing.length} not met`);
  });

  it.each([24, 60, 96])('still holds all addresses when %i receptors fail', async (count) => {
    const many = await readPdf((await renderReport(withFailing(count))).bytes);
    const words = many.pages[0]?.words.replace(/\u00A0/g, ' ') ?? '';
    for (let number = 1; number <= count; number += 1) {
      expect(words).toContain(`${number} Quillonbrook Street`);
    }
  });

  it('lists hundreds of addresses street by street, none left out', async () => {
    const many = await readPdf((await renderReport(withFailing(400))).bytes);
    const list = /Lots: Quillonbrook Street ([\d, ]+)\./.exec(many.pages[0]?.words ?? '')?.[1];
    const houses = list?.split(', ').map(Number);
    expect(houses).toEqual(Array.from({ length: 400 }, (_, index) => index + 1));
  });

  it('says that the rule is met where it is', async () => {
    const met: ReportPayload = {
      ...payload,
      findingRows: payload.findingRows.filter(({ finding }) => finding !== 'not-met'),
      ledgers: [],
      instants: [],
      study: {
        ...payload.study,
        findings: {
          met: true,
          lossIndex: 0,
          clauses: [{ clause: 'winter-noon-hours', finding: 'met', receptorsNotMet: [] }],
        },
      },
    };
    const words = (await readPdf((await renderReport(met)).bytes)).pages[0]?.words;
    expect(words).toContain('met at all of the');
    expect(words).not.toContain('not met at');
  });
});

it('refuses a payload whose rows leave out a receptor that the study found not met', async () => {
  const [dropped] = payload.findingRows.filter(({ finding }) => finding === 'not-met');
  const edited = {
    ...payload,
    findingRows: payload.findingRows.filter((row) => row !== dropped),
  };
  await expect(renderReport(edited)).rejects.toThrow(dropped?.receptor);
});

describe('the document', () => {
  it('carries title, author, language, date and an outline', () => {
    expect(pdf.title).toBe('Staff report 2026-0001-R1: Tallow Wharf Lofts');
    expect(pdf.author).toBe('Corvin Haldreth, City of Larkhaven');
    expect(pdf.language).toBe('en-US');
    expect(pdf.createdAt).toBe('D:20261201153000Z');
    expect(pdf.outline).toEqual([
      'The request and staff’s recommendation',
      'The site and the proposal',
      'The rule and the findings',
      'Shadows hour by hour',
      'Sun ledgers of the most affected',
      'Comments from the public',
      'Method, limits and cautions',
    ]);
  });

  it('counts its pages, and numbers each', () => {
    expect(pages).toBe(pdf.pages.length);
    pdf.pages.forEach((page, index) => {
      expect(page.words).toContain(`p. ${index + 1} of ${pages}`);
    });
  });

  it('names case and revision in the head, and its limits at the foot, of every page', () => {
    for (const page of pdf.pages.slice(1)) {
      expect(page.words).toContain('2026-0001 Tallow Wharf Lofts · revision 1');
    }
    for (const page of pdf.pages) {
      expect(page.words).toContain('no survey and no legal opinion');
      expect(page.words).toContain('licensed professionals decide');
    }
  });

  it('keeps all text inside its pages', () => {
    for (const page of pdf.pages) {
      for (const { text, x, y, width } of page.texts) {
        expect(x, text).toBeGreaterThan(20);
        expect(x + width, text).toBeLessThan(page.width - 20);
        expect(y, text).toBeGreaterThan(20);
        expect(y, text).toBeLessThan(page.height - 20);
      }
    }
  });

  it('embeds its two fonts and no other', () => {
    const raw = bytes.toString('latin1');
    const names = [...raw.matchAll(/\/BaseFont \/([A-Za-z+-]+)/g)].map(([, name]) => name);
    const families = new Set(names.map((name) => name?.replace(/^[A-Z]{6}\+/, '')));
    expect([...families].sort()).toEqual(['PublicSans-Regular', 'PublicSans-SemiBold']);
    expect(raw.match(/\/FontFile2 /g)).toHaveLength(2);
  });

  it('gives the same bytes for the same payload', async () => {
    const again = await renderReport(structuredClone(payload));
    expect(again.bytes.equals(bytes)).toBe(true);
  });

  it('is drawn on Letter, and on A4 where that is asked for', async () => {
    expect([pdf.pages[0]?.width, pdf.pages[0]?.height]).toEqual([612, 792]);
    const a4 = await readPdf(
      (await renderReport({ ...payload, instants: [] }, { pageSize: 'A4' })).bytes,
    );
    expect(a4.pages[0]?.width).toBeCloseTo(595.28, 1);
    expect(a4.pages[0]?.height).toBeCloseTo(841.89, 1);
  });

  it('cautions in the words of its limits', () => {
    const words = pdf.pages.map((page) => page.words).join(' ');
    for (const caution of [
      'planning-level study on the massing as submitted',
      'Ground: taken as level',
      'Trees and hedges: left out',
      'Penumbra: not modelled',
      'refraction is the standard one',
    ]) {
      expect(words).toContain(caution);
    }
  });
});

describe('the findings', () => {
  it('prints the figures of every affected receptor under the words of its clause', () => {
    const figures = createFigureFormat('en-US');
    const words = pdf.pages.map((page) => page.words).join(' ');
    expect(words).toContain('at least 2 h 00 min with the proposal, or a loss of at most 30 min');
    const affected = payload.findingRows.filter(({ finding }) => finding !== 'not-affected');
    expect(affected.length).toBeGreaterThan(10);
    for (const row of affected) {
      const printed = [row.before, row.after, row.lost, row.limit]
        .map((value) => figures.inUnit(value, row.unit))
        .join(' ');
      expect(words).toMatch(
        new RegExp(
          `${row.label} ${row.class === 'parcel' ? 'lot' : 'open space'}[^.]*? ${printed}`,
        ),
      );
    }
  });

  it('names every receptor that is not affected, street by street', () => {
    const words = pdf.pages.map((page) => page.words).join(' ');
    const untouched = payload.findingRows.filter(({ finding }) => finding === 'not-affected');
    expect(untouched.length).toBeGreaterThan(100);
    expect(words).toContain(`Not affected: ${untouched.length}`);
    for (const { label } of untouched) {
      const [, house, street] = /^(\d+) (.+)$/.exec(label) ?? ['', '', label];
      const listed = new RegExp(`${street}([\\d, ]*)[;.]`).exec(words)?.[1] ?? '';
      expect(listed.split(/, | /), label).toContain(house);
    }
  });

  it('repeats the head of the table on each of its pages', () => {
    const tablePages = pdf.pages.filter(({ words }) => /lot, \w+ loss/.test(words));
    expect(tablePages.length).toBeGreaterThan(1);
    for (const page of tablePages) expect(page.words).toContain('NO. RECEPTOR DAY NOW WITH IT');
  });
});

describe('the maps', () => {
  const center = ({ x, width }: PdfText) => x + width / 2;

  it('carry a scale bar that is right to 1 %', () => {
    const plane = createLocalPlane(payload.municipality.longitude, payload.municipality.latitude);
    const extent = extentOnPlane(payload.mapExtent, plane);
    const page = pdf.pages.find(({ words }) => words.includes('The site and the proposal'));
    const end = page?.texts.find(({ text }) => /^\d+ m$/.test(text));
    const start = page?.texts.find(({ text, y }) => text === '0' && y === end?.y);
    if (end === undefined || start === undefined) throw new Error('The map has no scale bar.');
    const barPoints = center(end) - center(start);
    const barM = Number.parseFloat(end.text);
    // The map is as wide as the text block: from 62.5 to 549.5 points.
    const pointsToAMetre = 487 / (extent.eastM - extent.westM);
    expect(barPoints / barM / pointsToAMetre).toBeGreaterThan(0.99);
    expect(barPoints / barM / pointsToAMetre).toBeLessThan(1.01);
  });

  it('state civil time with zone, azimuth and altitude for every hour of the key dates', () => {
    const words = pdf.pages.map((page) => page.words).join(' ');
    expect(payload.instants.length).toBeGreaterThan(40);
    expect(words).toContain(
      'Dec 21, 12:00 p.m. CST · judged sun 179.2° from north, 19.9° high net new shadow',
    );
    expect(words).toContain('Jun 21, 12:00 p.m. CDT sun');
    const captions = words.match(/° from north, \d+\.\d° high net new shadow/g);
    expect(captions).toHaveLength(payload.instants.length);
    expect(words).toContain('true north');
  });

  it('are vectors: the file holds no picture', () => {
    expect(bytes.toString('latin1')).not.toContain('/Subtype /Image');
  });
});

describe('what people wrote', () => {
  it('prints published comments in full, and counts those withheld', () => {
    const words = pdf.pages.map((page) => page.words).join(' ');
    expect(words).toContain('Hedwin Marchbole');
    expect(words).toContain('My back room has sun until about noon in winter.');
    expect(words).toContain('2 published when this report was issued');
    expect(words).toContain('1 was withheld');
  });

  it('survives words without end, foreign scripts and markup', async () => {
    const odd = await readPdf(
      (
        await renderReport({
          ...payload,
          instants: [],
          ledgers: [],
          reviewCase: { ...payload.reviewCase, title: 'Łódka & <b>Søn</b> "Ængstrøm"' },
          publishedComments: [
            {
              authorName: 'Αλέξανδρος 光',
              body: `${'w'.repeat(400)} → 5′ \u202F✓\u0007`,
              receivedAt: '2026-11-24T18:12:00Z',
              revision: null,
              pin: null,
            },
          ],
        })
      ).bytes,
    );
    const words = odd.pages.map((page) => page.words).join(' ');
    expect(odd.pages[0]?.words).toContain('Łódka & <b>Søn</b> "Ængstrøm"');
    expect(words).toContain("-> 5'");
    expect(words).toContain('◊◊◊◊◊◊◊◊◊◊ ◊');
    expect(words).toContain('stands for a character that this report’s font lacks');
    for (const page of odd.pages) {
      for (const { text, x, width } of page.texts) {
        expect(x + width, text).toBeLessThan(page.width - 20);
      }
    }
  });
});
