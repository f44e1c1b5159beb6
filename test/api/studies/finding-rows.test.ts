import { describe, expect, it } from 'vitest';
import { listFindingRows } from '../../../api/modules/studies/list-finding-rows.ts';
import { renderFindingsCsv } from '../../../api/modules/studies/render-findings-csv.ts';
import { selectFindingRows } from '../../../api/modules/studies/select-finding-rows.ts';
import type { FindingRow } from '../../../shared/contracts/studies.ts';
import { evidenceFileSchema } from '../../../shared/study/evidence-schema.ts';
import type { ClauseResult, EvidenceFile } from '../../../shared/study/evidence-schema.ts';
import { rectangle, smallCityRule } from '../../support/small-city.ts';

function makeRow(change: Partial<FindingRow>): FindingRow {
  return {
    receptor: 'N-1',
    label: '1 Test Row',
    class: 'parcel',
    clause: 'winter-noon-hours',
    clauseTitle: 'Two hours',
    day: '2026-12-21',
    finding: 'met',
    close: false,
    measure: 'sun-hours',
    unit: 'h',
    before: 4,
    after: 3,
    lost: 1,
    limit: 2,
    margin: 1,
    loss: 0.25,
    band: 'moderate',
    sentence: 'It is met.',
    ...change,
  };
}

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
      makeRow({ receptor: 'a', finding: 'not-affected', margin: 0 }),
      makeRow({ receptor: 'b', finding: 'not-met', margin: -0.2 }),
      makeRow({ receptor: 'c', finding: 'met', margin: 2 }),
      makeRow({ receptor: 'd', finding: 'not-met', margin: -1.2 }),
    ];
    expect(selectFindingRows(rows, {}).map(({ receptor }) => receptor)).toEqual([
      'd',
      'b',
      'c',
      'a',
    ]);
  });

  it('sorts house numbers as numbers', () => {
    const rows = [makeRow({ label: '10 Test Row' }), makeRow({ label: '9 Test Row' })];
    expect(selectFindingRows(rows, { sort: 'label' }).map(({ label }) => label)).toEqual([
      '9 Test Row',
      '10 Test Row',
    ]);
  });
});

describe('the findings table as CSV', () => {
  const cellsOf = (change: Partial<FindingRow>) =>
    renderFindingsCsv([makeRow(change)]).split('\r\n')[1];

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

  it('writes numbers as numbers, negative ones too, and leaves what is missing empty', () => {
    expect(cellsOf({ margin: -1.5, loss: null, band: null })).toMatch(/,2,-1\.5,,,,,It is met\.$/);
  });

  it('ends every line with CRLF', () => {
    expect(renderFindingsCsv([makeRow({}), makeRow({})]).match(/\r\n/g)).toHaveLength(3);
  });
});
