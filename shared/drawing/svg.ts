/** A piece of finished SVG: made by the functions of this file alone, so that no raw text slips in. */
export interface Svg {
  readonly markup: string;
}

type AttributeValue = string | number | undefined;

/**
 * One SVG element.
 *
 * @param attributes values are escaped; numbers are rounded to hundredths; `undefined` leaves the attribute out
 * @param children other elements, or text, which is escaped
 */
export function element(
  name: string,
  attributes: Record<string, AttributeValue>,
  ...children: (Svg | string)[]
): Svg {
  const written = Object.entries(attributes)
    .flatMap(([key, value]) =>
      value === undefined
        ? []
        : [` ${key}="${typeof value === 'number' ? writeNumber(value) : escapeText(value)}"`],
    )
    .join('');
  const inside = children
    .map((child) => (typeof child === 'string' ? escapeText(child) : child.markup))
    .join('');
  return {
    markup: inside === '' ? `<${name}${written}/>` : `<${name}${written}>${inside}</${name}>`,
  };
}

/** Elements under one another, with shared attributes. */
export function group(attributes: Record<string, AttributeValue>, children: readonly Svg[]): Svg {
  return element('g', attributes, ...children);
}

/**
 * A whole drawing as an SVG document.
 *
 * @param size in px on screen, in points on paper
 * @param label what the drawing shows, for people who cannot see it
 */
export function svgDocument(
  size: { width: number; height: number },
  label: string,
  children: readonly Svg[],
): string {
  return element(
    'svg',
    {
      xmlns: 'http://www.w3.org/2000/svg',
      width: size.width,
      height: size.height,
      viewBox: `0 0 ${writeNumber(size.width)} ${writeNumber(size.height)}`,
      role: 'img',
      'aria-label': label,
      'font-family': 'Public Sans',
    },
    ...children,
  ).markup;
}

/** A number as short as hundredths allow: `12`, `0.5`, `-3.25`. */
export function writeNumber(value: number): string {
  const rounded = Math.round(value * 100) / 100;
  return String(rounded);
}

/** Text as it may stand in SVG; characters that XML forbids become U+FFFD. */
export function escapeText(text: string): string {
  return plainText.test(text) ? text : Array.from(text, escapeCharacter).join('');
}

/** Most attributes are numbers and path data: nothing to escape. */
const plainText = /^[\w .,:%#()-]*$/;

const entities: Partial<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

function escapeCharacter(character: string): string {
  const code = character.codePointAt(0) ?? 0;
  const isControl = code < 0x20 && character !== '\t' && character !== '\n' && character !== '\r';
  const isLoneSurrogate = code >= 0xd800 && code <= 0xdfff;
  // XML 1.0, section 2.2, production 2
  if (isControl || isLoneSurrogate || code === 0xfffe || code === 0xffff) return '\uFFFD';
  return entities[character] ?? character;
}
