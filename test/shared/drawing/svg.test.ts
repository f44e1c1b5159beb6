import { describe, expect, it } from 'vitest';
import { element, escapeText, svgDocument, writeNumber } from '../../../shared/drawing/svg.ts';

describe('escapeText', () => {
  it('leaves no markup in names, neither as text nor as attribute', () => {
    const name = `</text><script>alert("x")</script> & 'co'`;
    const drawn = element('text', { 'data-name': name }, name).markup;
    expect(drawn.match(/</g)).toHaveLength(2);
    expect(drawn).toBe(
      '<text data-name="&lt;/text&gt;&lt;script&gt;alert(&quot;x&quot;)&lt;/script&gt; &amp; &#39;co&#39;">' +
        '&lt;/text&gt;&lt;script&gt;alert(&quot;x&quot;)&lt;/script&gt; &amp; &#39;co&#39;</text>',
    );
  });

  it('replaces what XML forbids: controls and halves of a surrogate pair', () => {
    expect(escapeText('a\u0000b\u0008c\uD800d\uFFFEe')).toBe('a\uFFFDb\uFFFDc\uFFFDd\uFFFDe');
  });

  it('keeps letters of any script', () => {
    expect(escapeText('Łódka 光 𝔸 m²')).toBe('Łódka 光 𝔸 m²');
  });
});

describe('writeNumber', () => {
  it.each([
    [12, '12'],
    [0.5, '0.5'],
    [-3.256, '-3.26'],
    [-0.001, '0'],
    [1234567.891, '1234567.89'],
  ])('writes %d as %s', (value, text) => {
    expect(writeNumber(value)).toBe(text);
  });
});

describe('svgDocument', () => {
  it('is well-formed XML with a size and a label', () => {
    const drawn = svgDocument({ width: 20, height: 10 }, 'A "plan"', [
      element('rect', { x: 1, width: undefined, fill: 'none' }),
    ]);
    expect(drawn).toBe(
      '<svg xmlns="http://www.w3.org/2000/svg" width="20" height="10" viewBox="0 0 20 10" role="img"' +
        ' aria-label="A &quot;plan&quot;" font-family="Public Sans"><rect x="1" fill="none"/></svg>',
    );
  });
});
