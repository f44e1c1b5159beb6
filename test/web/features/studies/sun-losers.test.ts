import { describe, expect, it } from 'vitest';
import type { FindingRow } from '../../../../shared/contracts/studies.ts';
import type { DrawnEvidence } from '../../../../web/features/studies/api/get-study-evidence.ts';
import { listSunLosers, worstFinding } from '../../../../web/features/studies/sun-losers.ts';

const hour = (clock: string, date = '2026-12-21') => `${date}T${clock}:00-06:00`;

/** A receptor of 100 m² with its sunlit square metres before and after at 10, 11 and 12. */
function evidenceOf(
  receptors: Record<string, [before: number, after: number][]>,
  date?: string,
): DrawnEvidence {
  const ids = Object.keys(receptors);
  return {
    blocks: { features: [] },
    receptors: {
      features: ids.map((id) => ({
        properties: { id, class: 'yard', label: `Yard ${id}` },
        geometry: { type: 'Polygon', coordinates: [] },
      })),
    },
    results: {
      receptors: Object.entries(receptors).map(([id, areas]) => ({
        id,
        openArea: 100,
        instants: areas.map(([sunBefore, sunAfter], index) => ({
          at: hour(String(10 + index), date),
          sunBefore,
          sunAfter,
        })),
      })),
    },
  };
}

const row = (receptor: string, finding: FindingRow['finding'], lost: number): FindingRow => ({
  receptor,
  label: `Yard ${receptor}`,
  class: 'yard',
  clause: 'winter',
  clauseTitle: 'Winter',
  day: '2026-12-21',
  finding,
  close: false,
  measure: 'sun-hours',
  unit: 'h',
  before: 2,
  after: 2 - lost,
  lost,
  limit: 2,
  margin: 0,
  loss: null,
  band: null,
  sentence: '',
});

const listIds = (...parameters: Parameters<typeof listSunLosers>) =>
  listSunLosers(...parameters).map((loser) => loser.receptor);

describe('listSunLosers', () => {
  const evidence = evidenceOf({
    little: [
      [100, 100],
      [100, 90],
      [100, 100],
    ],
    much: [
      [100, 0],
      [100, 0],
      [100, 0],
    ],
    nothing: [
      [50, 50],
      [50, 50],
      [50, 50],
    ],
  });

  it('lists who loses, most first, and leaves out who loses nothing', () => {
    expect(listIds(evidence, [], '2026-12-21')).toEqual(['much', 'little']);
  });

  it('puts first where the rule is not met', () => {
    const rows = [row('little', 'not-met', 0.1), row('much', 'met', 2)];
    expect(listIds(evidence, rows, '2026-12-21')).toEqual(['little', 'much']);
  });

  it('finds a loss between the hours by what the rule has judged', () => {
    expect(listIds(evidence, [row('nothing', 'met', 0.2)], '2026-12-21')).toContain('nothing');
  });

  it('does not set off sun that is lost against sun that is gained', () => {
    const mixed = evidenceOf({
      both: [
        [100, 0],
        [50, 50],
        [0, 100],
      ],
    });
    expect(listIds(mixed, [], '2026-12-21')).toEqual(['both']);
  });

  it('looks at the chosen day alone', () => {
    expect(listIds(evidence, [row('much', 'not-met', 2)], '2026-06-21')).toEqual([]);
  });

  it('gives the sunlit shares of the open area', () => {
    const [loser] = listSunLosers(evidence, [], '2026-12-21');
    expect(loser?.hourly[0]).toEqual({
      atMs: Date.parse(hour('10')),
      shareBefore: 1,
      shareAfter: 0,
    });
  });
});

describe('worstFinding', () => {
  it('is not met before all others, and null for none', () => {
    expect(worstFinding(['met', 'not-met', 'disregarded'])).toBe('not-met');
    expect(worstFinding(['not-affected', 'met'])).toBe('met');
    expect(worstFinding([])).toBeNull();
  });
});
