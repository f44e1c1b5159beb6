import { describe, expect, it } from 'vitest';
import { listFindingRows } from '../../../api/modules/studies/list-finding-rows.ts';
import { renderFindingsCsv } from '../../../api/modules/studies/render-findings-csv.ts';
import { selectFindingRows } from '../../../api/modules/studies/select-finding-rows.ts';
import { summariseFindings } from '../../../api/modules/studies/summarise-findings.ts';
import type { FindingRow } from '../../../shared/contracts/studies.ts';
import { evidenceFileSchema } from '../../../shared/study/evidence-schema.ts';
import type { ClauseResult, EvidenceFile } from '../../../shared/study/evidence-schema.ts';
import { makeFindingRow } from '../../support/finding-row.ts';
import { rectangle, smallCityRule } from '../../support/small-city.ts';

function makeEvidence(clause: Partial<ClauseResult>): EvidenceFile {
  return evidenceFileSchema.parse({
    format: 'noonmark-study/1',
    engine: '1.0.0',
    place: { name: 'Testham', timezone: 'America/Chicago', longitude: -91.3, latitude: 46.75 },
    blocks: { features: [] },
    receptors: {
      features: [
        {
          properties: { id: 'N-1', class: 'parcel', label: '1 Test Row' },
          geometry: rectangle(0, 0, 9, 9),
        },
      ],
    },
    year: 2026,
    rule: smallCityRule(),
    results: {
      instants: [],
      receptors: [
        {
          id: 'N-1',
          openArea: 81,
          instants: [],
          clauses: [
            {
              clause: 'winter-noon-hours',
              day: '2026-12-21',
              finding: 'met',
              close: false,
              loss: 0.1,
              band: 'negligible',
              tests: [
                makeTest({ limit: 2, margin: -1, met: false }),
                makeTest({ limit: 0.5, margin: 0.4, met: true }),
              ],
              spacingM: null,
              note: 'A sentence.',
              ...clause,
            },
          ],
        },
      ],
      findings: { met: true, lossIndex: 0, clauses: [] },
    },
    digest: `sha256:${'0'.repeat(64)}`,
  });
}

function makeTest(change: { limit: number; margin: number; met: boolean }) {
  return { measure: 'sun-hours', unit: 'h', before: 1.1, after: 1, ...change };
}

describe('the findings table', () => {
  it('shows the limit that decides: the one that is met where the clause is met', () => {
    expect(listFindingRows(makeEvidence({}))).toMatchObject([
      {
        finding: 'met',
        limit: 0.5,
        margin: 0.4,
        lost: 0.1,
        clauseTitle: 'Two hours of midwinter sun',
      },
    ]);
  });

  it('shows the first limit that fails where the clause is not met', () => {
    const tests = [
      makeTest({ limit: 0.5, margin: 0.4, met: true }),
      makeTest({ limit: 2, margin: -1, met: false }),
    ];
    expect(listFindingRows(makeEvidence({ finding: 'not-met', tests }))).toMatchObject([
      { finding: 'not-met', limit: 2, margin: -1 },
    ]);
  });

  it('puts what is not met first and of that the worst margin', () => {
    const rows = [
      makeFindingRow({ receptor: 'a', finding: 'not-affected', margin: 0 }),
      makeFindingRow({ receptor: 'b', finding: 'not-met', margin: -0.2 }),
      makeFindingRow({ receptor: 'c', finding: 'met', margin: 2 }),
      makeFindingRow({ receptor: 'd', finding: 'not-met', margin: -1.2 }),
    ];
    expect(selectFindingRows(rows, {}).map(({ receptor }) => receptor)).toEqual([
      'd',
      'b',
      'c',
      'a',
    ]);
  });

  it('sorts house numbers as numbers', () => {
    const rows = [
      makeFindingRow({ label: '10 Test Row' }),
      makeFindingRow({ label: '9 Test Row' }),
    ];
    expect(selectFindingRows(rows, { sort: 'label' }).map(({ label }) => label)).toEqual([
      '9 Test Row',
      '10 Test Row',
    ]);
  });
});

describe('the findings table, narrowed and sorted', () => {
  const rows = [
    makeFindingRow({
      receptor: 'a',
      class: 'yard',
      limit: 3,
      sentence: 'The yard of a loses sun.',
    }),
    makeFindingRow({
      receptor: 'b',
      class: 'ring',
      limit: 1,
      clauseTitle: 'Bands beyond the boundary',
    }),
    makeFindingRow({ receptor: 'c', class: 'yard', limit: 40, unit: 'm²' }),
  ];
  const receptorsOf = (query: Parameters<typeof selectFindingRows>[1]) =>
    selectFindingRows(rows, query).map(({ receptor }) => receptor);

  it('has the receptors of one class alone', () => {
    expect(receptorsOf({ class: 'yard' })).toEqual(['a', 'c']);
    expect(receptorsOf({ class: 'window' })).toEqual([]);
  });

  it.each([
    ['YARD OF A', ['a']],
    ['beyond the boundary', ['b']],
    ['moderate', ['a', 'b', 'c']],
    ['nowhere', []],
  ])('is searched through sentences, clauses and bands for %j', (q, found) => {
    expect(receptorsOf({ q, sort: 'receptor' })).toEqual(found);
  });

  it('keeps hours apart from square metres when it is sorted by a figure', () => {
    expect(receptorsOf({ sort: 'limit' })).toEqual(['b', 'a', 'c']);
    expect(receptorsOf({ sort: '-limit' })).toEqual(['c', 'a', 'b']);
  });
});

describe('the findings summed up', () => {
  const summarise = (rows: FindingRow[], finding: 'met' | 'not-met' | 'no-receptor') =>
    summariseFindings({
      findings: {
        met: finding !== 'not-met',
        lossIndex: 0,
        clauses: [{ clause: 'winter-noon-hours', finding, receptorsNotMet: [] }],
      },
      findingRows: rows,
      rule: smallCityRule(),
    });

  it('count each finding of a clause, and name the worst that is not met', () => {
    const rows = [
      makeFindingRow({ receptor: 'a', finding: 'not-met', margin: -0.2 }),
      makeFindingRow({
        receptor: 'b',
        finding: 'not-met',
        margin: -1,
        label: '2 Test Row',
        close: true,
      }),
      makeFindingRow({ receptor: 'c', finding: 'disregarded', margin: -3 }),
      makeFindingRow({ receptor: 'd', finding: 'met' }),
      makeFindingRow({ receptor: 'e', finding: 'not-affected', class: 'yard' }),
    ];
    expect(summarise(rows, 'not-met')).toEqual({
      classes: ['parcel', 'yard'],
      clauses: [
        {
          clause: 'winter-noon-hours',
          title: 'Two hours of midwinter sun',
          finding: 'not-met',
          judged: 5,
          notMet: 2,
          met: 1,
          disregarded: 1,
          notAffected: 1,
          close: 1,
          worst: { receptor: 'b', label: '2 Test Row', margin: -1, unit: 'h' },
        },
      ],
    });
  });

  it('name no worst where margins have several units, or nothing is affected', () => {
    const mixed = [makeFindingRow({}), makeFindingRow({ unit: 'm²' })];
    expect(summarise(mixed, 'met').clauses[0]?.worst).toBeNull();
    const untouched = [makeFindingRow({ finding: 'not-affected' })];
    expect(summarise(untouched, 'met').clauses[0]?.worst).toBeNull();
  });

  it('say of a clause without any receptor that there is none', () => {
    expect(summarise([], 'no-receptor').clauses).toMatchObject([
      { finding: 'no-receptor', judged: 0, worst: null },
    ]);
  });
});

describe('the findings table as CSV', () => {
  const cellsOf = (change: Partial<FindingRow>) =>
    renderFindingsCsv([makeFindingRow(change)]).split('\r\n')[1];

  it('doubles quotes and quotes what has a comma or a line break (RFC 4180, 2.6 and 2.7)', () => {
    expect(cellsOf({ label: 'The "Old" Mill, north\nwing' })).toContain(
      ',"The ""Old"" Mill, north\nwing",',
    );
  });

  it.each(['=1+1', '+1', '-1', '@SUM(A1)', '\tx', '\rx'])(
    'keeps the text %j from being run as a formula',
    (label) => {
      expect(cellsOf({ label })).toContain(`'${label}`);
    },
  );

  it('writes the days of a season that fail, and how finely points lie', () => {
    expect(cellsOf({ daysNotMet: 12, spacingM: 0.5 })).toMatch(/,moderate,12,0\.5,It is met\.$/);
  });

  it('writes numbers as numbers, negative ones too, and leaves what is missing empty', () => {
    expect(cellsOf({ margin: -1.5, loss: null, band: null })).toMatch(/,2,-1\.5,,,,,It is met\.$/);
  });

  it('ends every line with CRLF', () => {
    expect(renderFindingsCsv([makeFindingRow({}), makeFindingRow({})]).match(/\r\n/g)).toHaveLength(
      3,
    );
  });
});
