import { describe, expect, it } from 'vitest';
import { ruleTemplates } from '../../../../shared/rules/templates/rule-templates.ts';
import { placeOfMunicipality } from '../../../../web/features/rules/place-of-municipality.ts';
import { draftOfRule, ruleOfDraft } from '../../../../web/features/rules/rule-draft.ts';
import { readRule } from '../../../../web/features/rules/rule-problems.ts';
import { larkhaven } from '../../support/render-in-place.tsx';

const clause = {
  id: 'noon',
  title: 'Noon hours',
  receptors: { classes: ['parcel'] },
  days: [{ event: 'winter-solstice' }],
  window: { basis: 'standard', from: '10:00', to: '14:00' },
  measure: { kind: 'sun-hours' },
  limit: { atLeast: 2 },
};

function problemsOf(change: object): [string, string][] {
  const value = { id: 'r', version: 1, title: 'Sun', clauses: [{ ...clause, ...change }] };
  return [...readRule(value, placeOfMunicipality(larkhaven), 2026).problems];
}

describe('what is wrong with a rule', () => {
  it.each<[string, object, string, string]>([
    ['a limit without a figure', { limit: { atLeast: NaN } }, 'limit.atLeast', 'Write a number.'],
    [
      'a figure deep in a limit',
      { limit: { anyOf: [{ noWorse: true }, { allOf: [{ keeps: NaN }] }] } },
      'limit.anyOf.1.allOf.0.keeps',
      'Write a number.',
    ],
    ['a share beyond the whole', { limit: { keeps: 1.5 } }, 'limit.keeps', 'Write 1 at most.'],
    [
      'a day without its day',
      { days: [{ date: '' }] },
      'days.0.date',
      'Write the day as MM-DD, for example 03-21.',
    ],
    [
      'a season with no step',
      { days: [{ from: '06-21', to: '09-20', everyDays: 0 }] },
      'days.0.everyDays',
      'Write at least 1.',
    ],
    ['no clock', { window: {} }, 'window.basis', 'Choose by which clock the hours are meant.'],
    ['no title', { title: ' ' }, 'title', 'Write something here.'],
    [
      'a wall without a height',
      { baseline: { wall: NaN, with: [] } },
      'baseline.wall',
      'Write a number.',
    ],
    ['a weight of nothing', { weight: 0 }, 'weight', 'Write more than 0.'],
  ])('is said once, at its field, in plain words: %s', (_name, change, path, message) => {
    expect(problemsOf(change)).toEqual([[`clauses.0.${path}`, message]]);
  });

  it('is nothing for every template, also after it went through the form', () => {
    expect(ruleTemplates.length).toBeGreaterThan(0);
    for (const { rule } of ruleTemplates) {
      const value = ruleOfDraft(draftOfRule(rule), rule);
      const reading = readRule(value, placeOfMunicipality(larkhaven), 2026);
      expect([...reading.problems]).toEqual([]);
      expect(reading.rule).toEqual(rule);
    }
  });
});
