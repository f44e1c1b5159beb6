import { describe, expect, it } from 'vitest';
import { clauseSchema } from '../../../../shared/rules/rule-schema.ts';
import { describeClause } from '../../../../web/features/rules/clause-in-words.ts';
import { larkhavenFormats, withPlainSpaces } from '../../support/render-in-place.tsx';

const winterNoon = {
  id: 'winter-noon-hours',
  title: 'Two hours of sun around noon in midwinter',
  receptors: { classes: ['parcel', 'open-space'] },
  days: [{ event: 'winter-solstice' }],
  window: { basis: 'standard', from: '10:00', to: '14:00' },
  measure: { kind: 'sun-hours' },
  limit: { anyOf: [{ atLeast: 2 }, { losesAtMost: 0.5 }] },
};

function wordsOf(change: Record<string, unknown>): Record<string, string> {
  const clause = clauseSchema.parse({ ...winterNoon, ...change });
  return Object.fromEntries(
    describeClause(clause, larkhavenFormats).map(({ label, value }) => [
      label,
      withPlainSpaces(value),
    ]),
  );
}

describe('a clause in words', () => {
  it('says whom it judges, when, by which clock, and what it asks', () => {
    const words = wordsOf({});
    expect(words['Judged']).toContain('parcels and open spaces');
    expect(words['Days']).toBe('the winter solstice');
    expect(words['Hours']).toBe('from 10:00 to 14:00, standard time, all year, every 10 minutes');
    expect(words['Asked']).toBe(
      'at least 2 h 00 min with the proposal, or a loss of at most 30 min',
    );
  });

  it('writes shares as percentages where the measure is a share', () => {
    const words = wordsOf({
      measure: { kind: 'shade-share' },
      limit: { atMost: 0.25 },
    });
    expect(words['Asked']).toBe('at most 25% with the proposal');
  });

  it('says which measure a limit takes where it is not the clause’s own', () => {
    const words = wordsOf({ limit: { keeps: 0.8, measure: { kind: 'beam-energy' } } });
    expect(words['Asked']).toBe(
      'at least 80% of what there is now (of direct clear-sky energy on the area, added over the judged days)',
    );
  });

  it('says what is let pass, in minutes only where some are', () => {
    expect(wordsOf({})['Not counted']).toContain('never covers more than 1 m²');
    expect(wordsOf({ disregard: { minutes: 15, area: 2 } })['Not counted']).toContain(
      'for at most 15 minutes a day',
    );
  });
});
