import { sayClauseParts } from '../../../shared/rules/clause-sentence.ts';
import type { ClauseFigures } from '../../../shared/rules/clause-words.ts';
import type { RuleClause } from '../../../shared/rules/rule-schema.ts';
import type { Formats } from '../../lib/formats.ts';

type UnitFormats = Pick<Formats, 'inUnit' | 'share' | 'number' | 'dayOfYear'>;

/** What is not written yet. */
const gap = '…';

/** How this place writes a clause's figures; what a form has not got yet is a gap. */
export function clauseFigures(formats: UnitFormats): ClauseFigures {
  const orGap = (write: (value: number) => string) => (value: number) =>
    Number.isFinite(value) ? write(value) : gap;
  return {
    inUnit: (value, unit) => orGap((one) => formats.inUnit(one, unit))(value),
    metres: orGap((lengthM) => `${formats.number(lengthM, Number.isInteger(lengthM) ? 0 : 2)} m`),
    percent: orGap(formats.share),
    whole: orGap((value) => formats.number(value)),
    monthDay: (text) => {
      const isDay = /^\d\d-\d\d$/.test(text) && !Number.isNaN(Date.parse(`2000-${text}`));
      return isDay ? formats.dayOfYear(`2000-${text}`) : gap;
    },
  };
}

/** One clause of a rule in plain words: what it judges, when, how, and what it asks. */
export function describeClause(
  clause: RuleClause,
  formats: UnitFormats,
): { label: string; value: string }[] {
  const parts = sayClauseParts(clause, clauseFigures(formats));
  const entries = [
    { label: 'Judged', value: parts.judged },
    { label: 'Days', value: parts.days },
    { label: 'Hours', value: parts.hours },
    { label: 'Measured', value: parts.measured },
    { label: 'Held against', value: parts.heldAgainst },
    { label: 'Asked', value: parts.asked },
    { label: 'Not counted', value: parts.notCounted },
    { label: 'Weight', value: parts.weight },
  ];
  return entries.flatMap(({ label, value }) => (value === null ? [] : [{ label, value }]));
}
