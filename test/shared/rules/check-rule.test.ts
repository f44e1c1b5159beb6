import { describe, expect, it } from 'vitest';
import { checkRule } from '../../../shared/rules/check-rule.ts';
import { ruleSchema } from '../../../shared/rules/rule-schema.ts';
import { ruleTemplates } from '../../../shared/rules/templates/rule-templates.ts';
import { clauseOf, smallPlace } from '../../support/small-study.ts';

const ruleOf = (clause: Record<string, unknown>) => ({
  id: 'r',
  version: 1,
  title: 'Rule',
  clauses: [clauseOf(clause)],
});

/** The fields that the form of a rule refuses, each with a sentence. */
function refused(clause: Record<string, unknown>): string[] {
  const result = ruleSchema.safeParse(ruleOf(clause));
  return (result.error?.issues ?? []).map(({ path }) => path.join('.'));
}

const tromso = { longitude: 18.95, latitude: 69.65, timezone: 'Europe/Oslo', elevation: 0 };

/** The fields that are refused at a place. */
const refusedAt = (clause: Record<string, unknown>, place = smallPlace) =>
  checkRule(ruleSchema.parse(ruleOf(clause)), place, 2026).map(({ path }) => path);

describe('a rule that cannot be judged', () => {
  it.each<[string, Record<string, unknown>, string]>([
    ['no receptors', { receptors: { classes: [] } }, 'clauses.0.receptors.classes'],
    [
      'kinds of receptors beside a ring',
      { receptors: { classes: ['yard'], ring: { from: 5 } } },
      'clauses.0.receptors.classes',
    ],
    [
      'a ring turned inside out',
      { receptors: { ring: { from: 10, to: 5 } } },
      'clauses.0.receptors.ring.to',
    ],
    [
      'square metres of a window',
      { receptors: { classes: ['window'] }, measure: { kind: 'sun-area-hours' } },
      'clauses.0.measure.kind',
    ],
    [
      'square metres of a window in a limit',
      {
        receptors: { classes: ['window'] },
        limit: { atLeast: 40, measure: { kind: 'sun-area', hours: 1 } },
      },
      'clauses.0.limit.measure.kind',
    ],
    [
      'more hours than its window has',
      { measure: { kind: 'sun-share', hours: 5 }, limit: { atLeast: 0.5 } },
      'clauses.0.measure.hours',
    ],
    [
      'a share of fifty',
      { measure: { kind: 'sun-share', hours: 2 }, limit: { anyOf: [{ atLeast: 50 }] } },
      'clauses.0.limit.anyOf.0.atLeast',
    ],
    [
      'a day’s limit in a clause that adds up',
      {
        days: [{ year: true }],
        measure: { kind: 'beam-energy' },
        limit: { allOf: [{ keeps: 0.9 }, { atLeast: 2, measure: { kind: 'sun-hours' } }] },
      },
      'clauses.0.limit.allOf.1.measure.kind',
    ],
    [
      'hours at an instant, brought by a limit',
      {
        window: { basis: 'civil', from: '12:00', to: '12:00' },
        measure: { kind: 'shade-share' },
        limit: { atLeast: 1, measure: { kind: 'sun-hours' } },
      },
      'clauses.0.window.to',
    ],
    ['an unknown wall', { baseline: { wall: 3, with: ['trees'] } }, 'clauses.0.baseline'],
  ])('is refused for %s, with the field named', (_name, clause, path) => {
    expect(refused(clause).some((one) => one.startsWith(path))).toBe(true);
  });

  it('is not refused where its parts can be judged together', () => {
    expect(
      refused({
        receptors: { classes: ['window'] },
        measure: { kind: 'sun-share', hours: 4 },
        limit: { anyOf: [{ atLeast: 1 }, { keeps: 0.9, measure: { kind: 'beam-energy' } }] },
      }),
    ).toEqual([]);
    expect(refused({ receptors: { ring: { from: 5 } } })).toEqual([]);
  });
});

describe('a rule at a place', () => {
  it('is refused for a day on which the sun does not stand in its window', () => {
    expect(refusedAt({})).toEqual([]);
    expect(refusedAt({}, { ...smallPlace, ...tromso })).toEqual(['clauses.0.window']);
    expect(refusedAt({ window: { basis: 'standard', from: '01:00', to: '03:00' } })).toEqual([
      'clauses.0.window',
    ]);
    // The noon sun stands at 21.6° on the winter solstice at 45° N.
    expect(refusedAt({ minimumAltitude: 25 })).toEqual(['clauses.0.window']);
    // Of two days the one without sun is enough to refuse.
    const both = { days: [{ event: 'summer-solstice' }, { event: 'winter-solstice' }] };
    expect(refusedAt({ ...both, minimumAltitude: 25 })).toEqual(['clauses.0.window']);
  });

  it('lets a season have days without sun, though not all of them', () => {
    const polar = { ...smallPlace, ...tromso };
    expect(refusedAt({ days: [{ year: true }] }, polar)).toEqual([]);
    expect(refusedAt({ days: [{ from: '12-01', to: '01-10' }] }, polar)).toEqual([
      'clauses.0.window',
    ]);
  });

  it('is refused for a step that is longer than the time with sun in its window', () => {
    // Sunset on 21 December is at 16:14 by the clock here: 74 minutes from three on.
    const late = { window: { basis: 'civil', from: '15:00', to: '20:00' } };
    expect(refusedAt({ ...late, step: 60 })).toEqual([]);
    expect(refusedAt({ ...late, step: 90 })).toEqual(['clauses.0.step']);
  });

  it('may be of a single instant, which needs no step', () => {
    expect(
      refusedAt({
        window: { basis: 'civil', from: '12:00', to: '12:00' },
        step: 60,
        measure: { kind: 'shade-share' },
        limit: { atMost: 0.5 },
      }),
    ).toEqual([]);
  });

  it('can be every template', () => {
    for (const { rule } of ruleTemplates) expect(checkRule(rule, smallPlace, 2026)).toEqual([]);
    expect(new Set(ruleTemplates.map(({ id }) => id)).size).toBe(ruleTemplates.length);
  });
});
