/** Runs once and gives the milliseconds that it took. */
export function milliseconds(work: () => unknown): number {
  const startedMs = performance.now();
  work();
  return performance.now() - startedMs;
}

export function median(values: readonly number[]): number {
  return values.toSorted((a, b) => a - b)[Math.floor(values.length / 2)] ?? NaN;
}

/** Three digits that count, for figures from microseconds to minutes. */
export function say(value: number): string {
  if (!Number.isFinite(value)) return '–';
  if (value !== 0 && Math.abs(value) < 0.01) return value.toExponential(1);
  return new Intl.NumberFormat('en', { maximumSignificantDigits: 3 }).format(value);
}

/** A Markdown table. */
export function table(head: readonly string[], rows: readonly (readonly string[])[]): string {
  const line = (cells: readonly string[]) => `| ${cells.join(' | ')} |`;
  return [line(head), line(head.map(() => '---')), ...rows.map(line)].join('\n');
}
