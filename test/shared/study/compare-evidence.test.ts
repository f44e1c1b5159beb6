import { describe, expect, it } from 'vitest';
import { compareResults } from '../../../shared/study/compare-evidence.ts';
import type { StudyResults } from '../../../shared/study/evidence-schema.ts';

const resultsOf = (unit: string, after: number): StudyResults => ({
  instants: [],
  receptors: [
    {
      id: '12',
      openArea: 400,
      instants: [],
      clauses: [
        {
          clause: 'c',
          day: null,
          finding: 'met',
          close: false,
          loss: null,
          band: null,
          tests: [{ measure: 'any', unit, before: 5, after, limit: 1, margin: 2, met: true }],
          spacingM: null,
          note: '',
        },
      ],
    },
  ],
  findings: { met: true, lossIndex: 0, clauses: [] },
});

describe('stored and computed results', () => {
  // Areas are rounded to 0.01, energy to 0.001, hours and shares to 0.0001: one digit may differ.
  it.each([
    ['m²', 3.01, 'last-digits'],
    ['m²·h', 3.01, 'last-digits'],
    ['m²', 3.02, 'different'],
    ['kWh/m²', 3.001, 'last-digits'],
    ['kWh/m²', 3.002, 'different'],
    ['h', 3.0001, 'last-digits'],
    ['h', 3.01, 'different'],
    ['1', 3, 'same'],
  ])('in %s, 3 against %d: %s', (unit, computed, kind) => {
    expect(compareResults(resultsOf(unit, 3), resultsOf(unit, computed)).kind).toBe(kind);
  });
});
