import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { findJsonError } from '../../../../shared/massing/formats/find-json-error.ts';

function isJson(text: string): boolean {
  try {
    JSON.parse(text);
    return true;
  } catch {
    return false;
  }
}

describe('findJsonError', () => {
  it.each([
    ['{"a": [1, 2,, 3]}', 12],
    ['{"a": 1', 7],
    ['{"a" 1}', 5],
    ['{a: 1}', 1],
    ['[1, NaN]', 4],
    ['[1, 2],', 6],
    ['[1}', 2],
    ['{"a": "b\nc"}', 6],
    ['["\\x"]', 1],
    ['["\\u12g4"]', 1],
    ['[01]', 2],
    ['[1,]', 3],
    ['{,}', 1],
    ['', 0],
  ])('points into %j at %i', (text, at) => {
    expect(findJsonError(text)).toBe(at);
  });

  it('finds nothing in JSON', () => {
    fc.assert(
      fc.property(fc.json(), (text) => {
        expect(findJsonError(text)).toBeNull();
      }),
    );
  });

  it('finds an error exactly where the engine’s parser throws', () => {
    const piece = fc.constantFrom(
      ...Array.from('{}[],:"\\ \n01-.eutn/'),
      'true',
      'null',
      '"a"',
      '"a":1',
      '1.5',
    );
    fc.assert(
      fc.property(fc.array(piece, { maxLength: 12 }), (pieces) => {
        const text = pieces.join('');
        expect(findJsonError(text) === null).toBe(isJson(text));
      }),
      { numRuns: 2000 },
    );
  });
});
