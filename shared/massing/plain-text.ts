/** Text without control characters and halves of surrogate pairs, which neither a page nor a database takes. */
export function cleanText(text: string): string {
  return text.replaceAll(/[\p{Cc}\p{Cs}]/gu, '').trim();
}

/** The text's beginning, at most so many UTF-16 units, never cut within a character. */
export function cutText(text: string, most: number): string {
  if (text.length <= most) return text;
  return text.slice(0, most).replace(/\p{Cs}$/u, '');
}

/** A value of a file as a sentence quotes it: JSON, cut where it is long. */
export function showValue(value: unknown): string {
  if (value === undefined) return 'nothing';
  const text = JSON.stringify(value);
  return text.length > 60 ? `${cutText(text, 57)}…` : text;
}
