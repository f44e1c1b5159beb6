/** A value of a file as a sentence quotes it: JSON, cut where it is long. */
export function showValue(value: unknown): string {
  if (value === undefined) return 'nothing';
  const text = JSON.stringify(value);
  return text.length > 60 ? `${text.slice(0, 57)}…` : text;
}
