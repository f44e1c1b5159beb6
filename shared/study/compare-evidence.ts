import type { StudyResults } from './evidence-schema.ts';

/** How a study's stored results stand against recomputed ones. */
export type ResultsComparison =
  | { kind: 'same' }
  /** Numbers differ by no more than their last rounded digit. */
  | { kind: 'last-digits'; path: string; message: string }
  | { kind: 'different'; path: string; message: string };

const areaMembers = new Set(['openArea', 'sunBefore', 'sunAfter', 'netNew', 'removed']);

/** Compares results member by member; `check` is no part of them. Names the first difference. */
export function compareResults(stored: StudyResults, computed: StudyResults): ResultsComparison {
  const { check: _storedCheck, ...before } = stored;
  const { check: _computedCheck, ...after } = computed;
  let lastDigits: ResultsComparison | null = null;
  for (const difference of differences(before, after, 'results', '', '')) {
    const comparison = describe(difference);
    if (comparison.kind === 'different') return comparison;
    lastDigits ??= comparison;
  }
  return lastDigits ?? { kind: 'same' };
}

interface Difference {
  path: string;
  member: string;
  /** Of the test that the member belongs to. */
  unit: string;
  stored: unknown;
  computed: unknown;
}

function* differences(
  stored: unknown,
  computed: unknown,
  path: string,
  member: string,
  unit: string,
): Generator<Difference> {
  if (Object.is(stored, computed)) return;
  if (isRecord(stored) && isRecord(computed)) {
    for (const key of new Set([...Object.keys(stored), ...Object.keys(computed)])) {
      // A list's items are told by their own member, not by their number.
      const name = Array.isArray(stored) ? member : key;
      const ownUnit = typeof stored['unit'] === 'string' ? stored['unit'] : unit;
      yield* differences(stored[key], computed[key], `${path}.${key}`, name, ownUnit);
    }
    return;
  }
  yield { path, member, unit, stored, computed };
}

/** What the last digit of a rounded figure is worth. */
function lastDigit(member: string, unit: string): number {
  if (areaMembers.has(member) || unit === 'm²' || unit === 'm²·h') return 0.01;
  return unit === 'kWh/m²' ? 0.001 : 0.0001;
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}

function describe({ path, member, unit, stored, computed }: Difference): ResultsComparison {
  const message = `the file says ${JSON.stringify(stored)}, the computation gives ${JSON.stringify(computed)}`;
  const isLastDigit =
    typeof stored === 'number' &&
    typeof computed === 'number' &&
    Math.abs(stored - computed) <= 1.01 * lastDigit(member, unit);
  // A sentence repeats figures that are compared by themselves.
  if (isLastDigit || member === 'note') return { kind: 'last-digits', path, message };
  return { kind: 'different', path, message };
}
