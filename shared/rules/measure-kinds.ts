import type { MeasureKind, RuleClause, RuleLimit, RuleMeasure } from './rule-schema.ts';

/** The unit of each measure's value; 1 is a share from 0 to 1. */
export const measureUnits = {
  'sun-share': '1',
  'sun-area': 'm²',
  'sun-hours': 'h',
  'best-run': 'h',
  'worst-shade-hours': 'h',
  'shade-share': '1',
  'sun-area-hours': 'm²·h',
  'beam-energy': 'kWh/m²',
} as const satisfies Record<MeasureKind, string>;

/** Whether a measure adds up over a clause's days, so that its limits hold on their sum. */
export function addsUpOverDays(kind: MeasureKind): boolean {
  return kind === 'sun-area-hours' || kind === 'beam-energy';
}

/** Whether more of a measure means less sun. */
export function measuresShade(kind: MeasureKind): boolean {
  return kind === 'shade-share' || kind === 'worst-shade-hours';
}

/** Whether a measure is taken point by point, on a sampling grid. */
export function needsSamples(kind: MeasureKind): boolean {
  return kind === 'sun-share' || kind === 'sun-area' || kind === 'worst-shade-hours';
}

/** Whether a measure's value is in square metres, which a window does not have. */
export function measuresArea(kind: MeasureKind): boolean {
  return kind === 'sun-area' || kind === 'sun-area-hours';
}

/** All measures that a clause takes: its own, and those that its limits bring. */
export function measuresOf(clause: Pick<RuleClause, 'measure' | 'limit'>): RuleMeasure[] {
  const ofLimit = (limit: RuleLimit): RuleMeasure[] => {
    if ('anyOf' in limit) return limit.anyOf.flatMap(ofLimit);
    if ('allOf' in limit) return limit.allOf.flatMap(ofLimit);
    return limit.measure === undefined ? [] : [limit.measure];
  };
  return [clause.measure, ...ofLimit(clause.limit)];
}
