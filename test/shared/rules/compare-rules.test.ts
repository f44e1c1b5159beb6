import { describe, expect, it } from 'vitest';
import { sayClause } from '../../../shared/rules/clause-sentence.ts';
import type { ClauseFigures } from '../../../shared/rules/clause-words.ts';
import { compareRules } from '../../../shared/rules/compare-rules.ts';
import { clauseSchema, ruleSchema, type Rule } from '../../../shared/rules/rule-schema.ts';

const figures: ClauseFigures = {
  inUnit: (value, unit) => (unit === '1' ? `${value * 100}%` : `${value} ${unit}`),
  metres: (lengthM) => `${lengthM} m`,
  percent: (share) => `${share * 100}%`,
  whole: String,
  monthDay: (text) => text,
};

const noon = {
  id: 'noon',
  title: 'Noon hours',
  receptors: { classes: ['parcel', 'yard'] },
  days: [{ event: 'winter-solstice' }],
  window: { basis: 'standard', from: '10:00', to: '14:00' },
  measure: { kind: 'sun-hours' },
  limit: { atLeast: 2 },
};
const garden = {
  ...noon,
  id: 'garden',
  title: 'Gardens in March',
  days: [{ date: '03-21' }],
  window: { basis: 'sun', afterSunrise: 0, beforeSunset: 0 },
  measure: { kind: 'sun-share', hours: 2 },
  limit: { anyOf: [{ atLeast: 0.5 }, { keeps: 0.8 }] },
};

function makeRule(clauses: object[], change: object = {}): Rule {
  return ruleSchema.parse({ id: 'r', version: 1, title: 'Sun', clauses, ...change });
}

const sentences = (earlier: Rule, later: Rule) =>
  compareRules(earlier, later, figures).map(({ sentence }) => sentence);

describe('the difference between two versions', () => {
  it('is nothing where they judge alike, whatever their numbers', () => {
    expect(compareRules(makeRule([noon]), makeRule([noon], { version: 2 }), figures)).toEqual([]);
  });

  it('names each part of a clause that changes, with what it was before', () => {
    const later = makeRule([
      { ...noon, window: { ...noon.window, from: '09:00' }, limit: { atLeast: 3 }, step: 5 },
    ]);
    expect(compareRules(makeRule([noon]), later, figures)).toEqual([
      {
        kind: 'changed',
        clause: 'Noon hours',
        sentence:
          'Hours: from 09:00 to 14:00, standard time, all year, every 5 minutes; before: from 10:00 to 14:00, standard time, all year, every 10 minutes.',
      },
      {
        kind: 'changed',
        clause: 'Noon hours',
        sentence: 'Asked: at least 3 h with the proposal; before: at least 2 h with the proposal.',
      },
    ]);
  });

  it.each<[string, object, string]>([
    ['whom it judges', { receptors: { classes: ['parcel'] } }, 'Judged: parcels: '],
    ['of which area', { receptors: { ...noon.receptors, of: 'whole' } }, 'their whole area'],
    ['at which height', { receptors: { ...noon.receptors, plane: 1.5 } }, 'at 1.5 m above'],
    ['the lowest sun', { minimumAltitude: 10 }, 'while the sun is at least 10° high'],
    ['the measure', { measure: { kind: 'best-run', share: 0.5 } }, 'Measured: the longest'],
    ['a baseline', { baseline: { wall: 3.66 } }, 'before: what stands now'],
    ['what is let pass', { disregard: { minutes: 15, area: 1 } }, 'for at most 15 minutes a day'],
    ['its weight', { weight: 2 }, 'before: counts once in the loss index'],
    ['its title', { title: 'Other' }, 'Title: “Other”; before: “Noon hours”.'],
  ])('says it where a clause changes %s', (_name, change, words) => {
    const found = sentences(makeRule([noon]), makeRule([{ ...noon, ...change }]));
    expect(found.join('\n')).toContain(words);
  });

  it('says in full what is new and what is dropped', () => {
    expect(compareRules(makeRule([noon]), makeRule([garden]), figures)).toEqual([
      {
        kind: 'added',
        clause: 'Gardens in March',
        sentence: `New: ${sayClause(clauseSchema.parse(garden), figures)}`,
      },
      {
        kind: 'removed',
        clause: 'Noon hours',
        sentence: `Dropped: ${sayClause(clauseSchema.parse(noon), figures)}`,
      },
    ]);
  });

  it('says when clauses only change places, and not when one between them is dropped', () => {
    const third = { ...noon, id: 'third', title: 'Third' };
    expect(sentences(makeRule([noon, garden]), makeRule([garden, noon]))).toEqual([
      'The clauses stand in another order: “Gardens in March”, “Noon hours”.',
    ]);
    const kinds = compareRules(makeRule([noon, garden, third]), makeRule([noon, third]), figures);
    expect(kinds.map(({ kind }) => kind)).toEqual(['removed']);
  });

  it('tells of the rule’s own texts and of its bands', () => {
    const later = makeRule([noon], {
      title: 'Sunlight',
      citation: 'Code 7',
      bands: [{ upTo: 1, label: 'any' }],
    });
    expect(sentences(makeRule([noon]), later)).toEqual([
      'Title: “Sunlight”; before: “Sun”.',
      'Citation: “Code 7”; before: none.',
      expect.stringContaining(
        'What a loss is called: any up to 100%; before: negligible up to 10%',
      ),
    ]);
  });
});

describe('a clause as one sentence', () => {
  const say = (change: object) => sayClause(clauseSchema.parse({ ...noon, ...change }), figures);

  it('says when, whom, by what, and what is asked', () => {
    expect(say({})).toBe(
      'On the winter solstice, from 10:00 to 14:00, standard time, all year, parcels and yards are judged by hours of direct sun in the judged hours, as a mean over the area; the rule asks for at least 2 h with the proposal.',
    );
  });

  it('speaks of a ring as of one', () => {
    const receptors = { ring: { from: 5, to: 10 } };
    expect(say({ receptors })).toContain("outside the site's boundary is judged by");
  });

  it('leaves a gap for what is not chosen yet', () => {
    const unfinished = { ...clauseSchema.parse(noon), window: null, days: [] };
    expect(sayClause(unfinished, figures)).toContain('On …, at hours by a clock to be chosen,');
  });
});
