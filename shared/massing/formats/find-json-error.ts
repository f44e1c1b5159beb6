/**
 * Where a text stops being JSON (RFC 8259), as an index into it; null when it is JSON. JavaScript engines word their
 * own message differently, mostly without a place. Nothing recurses, so any depth will do.
 */
export function findJsonError(text: string): number | null {
  /** The brackets that are open. */
  const open: ('{' | '[')[] = [];
  let at = skipSpace(text, 0);
  let expected: 'value' | 'key' | 'end of value' = 'value';
  /** An empty list or object may close here. */
  let mayClose = false;

  while (at < text.length) {
    const character = text.charAt(at);
    const isClosing = character === (open.at(-1) === '{' ? '}' : ']') && open.length > 0;
    if (expected === 'end of value' || (mayClose && isClosing)) {
      if (isClosing) {
        open.pop();
        expected = 'end of value';
        at += 1;
      } else if (character === ',' && open.length > 0) {
        expected = open.at(-1) === '{' ? 'key' : 'value';
        at += 1;
      } else return at;
      mayClose = false;
    } else if (expected === 'key') {
      const end = endOfString(text, at);
      if (end === null) return at;
      at = skipSpace(text, end);
      if (text[at] !== ':') return at;
      at += 1;
      expected = 'value';
      mayClose = false;
    } else if (character === '{' || character === '[') {
      open.push(character);
      expected = character === '{' ? 'key' : 'value';
      mayClose = true;
      at += 1;
    } else {
      const end = endOfString(text, at) ?? endOfWord(text, at);
      if (end === null) return at;
      at = end;
      expected = 'end of value';
      mayClose = false;
    }
    at = skipSpace(text, at);
  }
  return open.length === 0 && expected === 'end of value' ? null : text.length;
}

function skipSpace(text: string, start: number): number {
  let at = start;
  while (at < text.length && ' \t\n\r'.includes(text.charAt(at))) at += 1;
  return at;
}

/** Past the closing quote of a sound string that begins here, else null. */
function endOfString(text: string, start: number): number | null {
  if (text[start] !== '"') return null;
  for (let at = start + 1; at < text.length; at += 1) {
    const character = text.charAt(at);
    if (character === '"') return at + 1;
    if (character < ' ') return null;
    if (character !== '\\') continue;
    at += 1;
    if (text[at] === 'u') {
      if (!/^[0-9a-f]{4}$/i.test(text.slice(at + 1, at + 5))) return null;
      at += 4;
    } else if (!'"\\/bfnrt'.includes(text.charAt(at) || ' ')) return null;
  }
  return null;
}

/** Past a number, true, false or null that begins here, else null. */
function endOfWord(text: string, start: number): number | null {
  const word = /(?:-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?|true|false|null)/y;
  word.lastIndex = start;
  return word.test(text) ? word.lastIndex : null;
}
