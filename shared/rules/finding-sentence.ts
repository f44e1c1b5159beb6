import type { ClauseJudgement } from './judge-receptor.ts';
import { leavesOf, type LimitTest } from './limits.ts';
import type { LimitLeaf, MeasureKind, ReceptorClass, RuleClause } from './rule-schema.ts';

/** What was measured, in words: a parcel is not a garden. */
export function nameReceptor(receptorClass: ReceptorClass, label: string): string {
  switch (receptorClass) {
    case 'parcel':
      return `the open ground of ${label}`;
    case 'yard':
      return `the yard of ${label}`;
    case 'collector':
      return `the collector at ${label}`;
    case 'open-space':
    case 'walk':
      return label;
  }
}

/** A length of time as people say it: `3 h 05 min`, `45 min`, `none`. */
export function sayHours(hours: number): string {
  const minutes = Math.round(hours * 60);
  if (minutes === 0) return 'none';
  const wholeHours = Math.trunc(minutes / 60);
  const rest = Math.abs(minutes % 60);
  if (wholeHours === 0) return `${minutes} min`;
  return rest === 0 ? `${wholeHours} h` : `${wholeHours} h ${String(rest).padStart(2, '0')} min`;
}

const dayAndMonth = new Intl.DateTimeFormat('en', {
  month: 'long',
  day: 'numeric',
  timeZone: 'UTC',
});

/** A civil date in English: `December 21`. */
export function sayDay(date: string): string {
  return dayAndMonth.format(new Date(`${date}T12:00:00Z`));
}

/** A measure's value with its unit, in words. */
export function sayValue(measure: MeasureKind, value: number): string {
  switch (measure) {
    case 'sun-hours':
    case 'best-run':
      return sayHours(value);
    case 'shade-share':
      return `${(value * 100).toFixed(0)} %`;
    case 'sun-area-hours':
      return `${value.toFixed(0)} m²·h`;
    case 'beam-energy':
      return `${value.toFixed(2)} kWh/m²`;
  }
}

const measureWords: Record<MeasureKind, string> = {
  'sun-hours': 'sun in the judged hours',
  'best-run': 'unbroken sun in the judged hours',
  'shade-share': 'its area in shade at the worst judged instant',
  'sun-area-hours': 'sunlit area times hours in the judged time',
  'beam-energy': 'direct clear-sky energy in the judged time',
};

const endings: Record<ClauseJudgement['finding'], string> = {
  met: 'Met.',
  'not-met': 'Not met.',
  disregarded: 'Shaded too briefly to be held against the proposal.',
  'not-affected': 'The proposal changes nothing here in the judged hours.',
};

/** A finding as a few plain English sentences. */
export function describeFinding(
  clause: RuleClause,
  judgement: ClauseJudgement,
  receptorClass: ReceptorClass,
  label: string,
): string {
  const { kind } = clause.measure;
  const when = judgement.day === null ? 'Over the judged days' : `On ${sayDay(judgement.day)}`;
  const own = judgement.tests.find((test) => test.measure === kind) ?? judgement.tests[0];
  const values =
    own === undefined
      ? ''
      : ` has ${sayValue(kind, own.before)} of ${measureWords[kind]} before and ${sayValue(kind, own.after)} after`;
  const asks = leavesOf(clause.limit)
    .map((leaf, index) => sayLimit(leaf, judgement.tests[index], clause))
    .join('allOf' in clause.limit ? ', and ' : ', or ');
  return `${when}, ${nameReceptor(receptorClass, label)}${values}. The rule asks for ${asks}. ${endings[judgement.finding]}`;
}

function sayLimit(leaf: LimitLeaf, test: LimitTest | undefined, clause: RuleClause): string {
  const kind = leaf.measure?.kind ?? clause.measure.kind;
  if ('atLeast' in leaf) return `at least ${sayValue(kind, leaf.atLeast)}`;
  if ('atMost' in leaf) return `at most ${sayValue(kind, leaf.atMost)}`;
  if ('losesAtMost' in leaf) return `a loss of at most ${sayValue(kind, leaf.losesAtMost)}`;
  if ('keeps' in leaf) {
    const share = `${(leaf.keeps * 100).toFixed(0)} % of what there was`;
    return test === undefined ? share : `${share} (${sayValue(kind, test.limit)})`;
  }
  if ('losesAtMostShare' in leaf) {
    const share = `a loss of at most ${(leaf.losesAtMostShare * 100).toFixed(1)} %`;
    return test === undefined ? share : `${share} (${sayValue(kind, test.limit)})`;
  }
  return 'no worse than before';
}
