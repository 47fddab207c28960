/** SVG as text: only presentation attributes, every text escaped, numbers rounded. */

type Attributes = Record<string, string | number>;

/** Width of every figure in its own units; printed 12 cm wide, one unit is 0.71 pt. */
export const FIGURE_WIDTH = 480;

export const INK = '#1c1c1c';
export const SOFT_INK = '#555555';
export const HAIRLINE = '#8c8c8c';

export interface Frame {
  /** Makes the ids unique where several figures stand in one page. */
  prefix: string;
  title: string;
  description: string;
  height: number;
}

/** Coordinates to 2 decimals: finer than any printer, and the same text on every machine. */
export function rounded(value: number): number {
  if (!Number.isFinite(value)) throw new RangeError(`coordinate is ${value}; it has to be finite`);
  return Math.round(value * 100) / 100 + 0;
}

export function escapeXml(text: string): string {
  return (
    text
      // Characters that XML 1.0 section 2.2 does not allow, even as a reference.
      .replace(/[^\t\n\r\u0020-\ud7ff\ue000-\ufffd\u{10000}-\u{10ffff}]/gu, '\ufffd')
      .replaceAll('&', '&amp;')
      .replaceAll('<', '&lt;')
      .replaceAll('>', '&gt;')
      .replaceAll('"', '&quot;')
      .replaceAll("'", '&#39;')
  );
}

/** One element. `content` is SVG already; user text gets in through `textElement` and `titleElement`. */
export function element(name: string, attributes: Attributes, content = ''): string {
  const pairs = Object.entries(attributes).map(
    ([key, value]) => ` ${key}="${typeof value === 'number' ? rounded(value) : escapeXml(value)}"`,
  );
  return content === '' ? `<${name}${pairs.join('')}/>` : `<${name}${pairs.join('')}>${content}</${name}>`;
}

export function textElement(text: string, attributes: Attributes): string {
  return element('text', attributes, escapeXml(text));
}

export function titleElement(text: string): string {
  return element('title', {}, escapeXml(text));
}

export function lineElement(x1: number, y1: number, x2: number, y2: number, attributes: Attributes): string {
  return element('line', { x1, y1, x2, y2, ...attributes });
}

/** The whole figure. Left to right whatever page it stands in, so that anchors mean what they say. */
export function frame({ prefix, title, description, height }: Frame, parts: readonly string[]): string {
  if (!/^\S+$/.test(prefix)) {
    throw new RangeError(`prefix is '${prefix}'; it has to be a non-empty id without spaces`);
  }
  const [titleId, descriptionId] = [`${prefix}-title`, `${prefix}-desc`];
  return element(
    'svg',
    {
      xmlns: 'http://www.w3.org/2000/svg',
      viewBox: `0 0 ${FIGURE_WIDTH} ${rounded(height)}`,
      width: FIGURE_WIDTH,
      height,
      role: 'img',
      'aria-labelledby': `${titleId} ${descriptionId}`,
      direction: 'ltr',
      'font-family': 'Helvetica, Arial, sans-serif',
      'font-size': 12,
      fill: INK,
    },
    [
      element('title', { id: titleId }, escapeXml(title)),
      element('desc', { id: descriptionId }, escapeXml(description)),
      element('rect', { x: 0, y: 0, width: FIGURE_WIDTH, height, fill: '#ffffff' }),
      ...parts,
    ].join('\n'),
  );
}
