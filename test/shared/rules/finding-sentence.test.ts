import { describe, expect, it } from 'vitest';
import {
  sayBaseline,
  sayRing,
  sayRuleLimit,
  sayRuleMeasure,
} from '../../../shared/rules/clause-words.ts';
import { describeFinding } from '../../../shared/rules/finding-sentence.ts';
import type { ClauseJudgement } from '../../../shared/rules/judge-receptor.ts';
import { clauseSchema } from '../../../shared/rules/rule-schema.ts';
import { clauseOf } from '../../support/small-study.ts';

const test = (
  more: Partial<ClauseJudgement['tests'][number]>,
): ClauseJudgement['tests'][number] => ({
  measure: 'sun-share',
  unit: '1',
  before: 0.8,
  after: 0.45,
  limit: 0.5,
  margin: -0.05,
  met: false,
  coarserGrids: 0,
  samplingError: null,
  ...more,
});

const judgement = (tests: ClauseJudgement['tests']): ClauseJudgement => ({
  met: false,
  close: false,
  day: '2026-03-21',
  finding: 'not-met',
  loss: 0.4,
  band: null,
  daysNotMet: null,
  tests,
});

const figures = {
  inUnit: (value: number, unit: string) => `${value} ${unit}`,
  metres: (lengthM: number) => `${lengthM} m`,
  percent: (share: number) => `${share * 100} %`,
  whole: String,
  monthDay: (monthDay: string) => monthDay,
};

describe('the sentence of a finding', () => {
  it('says shares of points, and how finely they were taken', () => {
    const clause = clauseSchema.parse(
      clauseOf({
        measure: { kind: 'sun-share', hours: 2 },
        limit: { anyOf: [{ atLeast: 0.5 }, { keeps: 0.8 }] },
      }),
    );
    const tests = [test({ samplingError: 0.0125 }), test({ limit: 0.64 })];
    expect(describeFinding(clause, judgement(tests), 'yard', '12 Netloft Lane', 0.5)).toBe(
      'On March 21, the yard of 12 Netloft Lane has 80 % of its area with at least 2 h of sun in the judged hours before and 45 % after. The rule asks for at least 50 %, or 80 % of what there was (64 %). Not met. Taken at points 0.50 m apart; points twice as far apart change the figure by at most 1.3 %.',
    );
  });

  it('says what the proposal is held against', () => {
    const clause = clauseSchema.parse(
      clauseOf({
        measure: { kind: 'shade-share' },
        limit: { noWorse: true },
        baseline: { wall: 3.66 },
      }),
    );
    const shade = test({ measure: 'shade-share', before: 0.1, after: 0.3 });
    const sentence = describeFinding(clause, judgement([shade]), 'parcel', '12', null);
    expect(sentence).toContain(
      'has 10 % of its area in shade at the worst judged instant with a wall of 3.66 m and 30 % with the proposal.',
    );
    expect(sentence).toContain('The rule asks for no worse than with a wall of 3.66 m.');
    expect(sentence).not.toContain('points');
  });

  it('leads with the first limit’s own measure where no limit takes the clause’s', () => {
    const clause = clauseSchema.parse(
      clauseOf({
        limit: {
          anyOf: [
            { atLeast: 40, measure: { kind: 'sun-area', hours: 1 } },
            { atMost: 2, measure: { kind: 'worst-shade-hours' } },
          ],
        },
      }),
    );
    const tests = [
      test({ measure: 'sun-area', unit: 'm²', before: 60, after: 30 }),
      test({ measure: 'worst-shade-hours', unit: 'h', before: 1, after: 3 }),
    ];
    const sentence = describeFinding(clause, judgement(tests), 'ring', 'the ground around', null);
    expect(sentence).toContain(
      'the ground around has 60 m² of ground with at least 1 h of sun in the judged hours before and 30 m² after.',
    );
    expect(sentence).toContain('at least 40 m², or at most 2 h.');
  });
});

describe('the sentence of a finding with nothing in it', () => {
  const clause = clauseSchema.parse(
    clauseOf({ measure: { kind: 'worst-shade-hours' }, limit: { atMost: 2 } }),
  );
  const shade = test({
    measure: 'worst-shade-hours',
    unit: 'h',
    before: 0,
    after: 4,
    samplingError: 0.001,
  });

  it('says no shade, and less than a minute', () => {
    const sentence = describeFinding(clause, judgement([shade]), 'ring', 'the ground', 0.5);
    expect(sentence).toContain(
      'the ground has no shade in the judged hours at its most shaded point before and 4 h after.',
    );
    expect(sentence).toContain('change the figure by less than a minute.');
  });

  it('says on how many days of a season it is not met', () => {
    const season = { ...judgement([shade]), daysNotMet: 7 };
    expect(describeFinding(clause, season, 'ring', 'the ground', null)).toContain(
      "Not met on 7 of the season's days, of which this is the worst.",
    );
  });

  it('speaks of the width of a window', () => {
    const share = clauseSchema.parse(
      clauseOf({ measure: { kind: 'sun-share', hours: 1 }, limit: { atLeast: 0.5 } }),
    );
    const sentence = describeFinding(
      share,
      judgement([test({ samplingError: 0 })]),
      'window',
      '12 Netloft Lane',
      0.1,
    );
    expect(sentence).toContain(
      'the window at 12 Netloft Lane has 80 % of its width with at least 1 h',
    );
    expect(sentence).toContain('change the figure by less than 0.1 %.');
  });
});

describe('the words of a clause', () => {
  it('name a ring and a baseline', () => {
    expect(sayRing({ from: 5, to: 10 }, figures)).toBe(
      "the ground from 5 m to 10 m outside the site's boundary",
    );
    expect(sayRing({ from: 10 }, figures)).toBe(
      "the ground from 10 m outside the site's boundary to where the shadow ends",
    );
    expect(sayBaseline(undefined, figures)).toBeNull();
    expect(sayBaseline({ wall: 3.66, with: ['context'] }, figures)).toBe(
      "compared with a wall of 3.66 m along the site's boundary, beside the buildings around",
    );
    expect(sayBaseline('proposal-alone', figures)).toContain('alone');
  });

  it('do not speak of now where the clause has a baseline', () => {
    const measure = { kind: 'shade-share' } as const;
    expect(sayRuleLimit({ noWorse: true }, measure, figures)).toBe('no worse than now');
    expect(sayRuleLimit({ noWorse: true }, measure, figures, 'by-right')).toBe(
      'no worse than that',
    );
  });

  it('name the hours that a point must have', () => {
    expect(sayRuleMeasure({ kind: 'sun-share', hours: 2 }, figures)).toBe(
      'the share of the area with at least 2 h of direct sun in the judged hours',
    );
    expect(sayRuleMeasure({ kind: 'sun-share', hours: 0 }, figures)).toBe(
      'the share of the area with any direct sun in the judged hours',
    );
  });
});
