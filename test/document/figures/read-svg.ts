/** Reads a figure back without the code that drew it: texts with their boxes, ids, and whether it is well formed. */

import { expect } from 'vitest';

export interface DrawnText {
  text: string;
  x: number;
  y: number;
  left: number;
  right: number;
  top: number;
  bottom: number;
}

const FONT_SIZE = 12;
const CHARACTER_EM = 0.55;

export function attribute(tag: string, name: string): string | null {
  return new RegExp(` ${name}="([^"]*)"`).exec(tag)?.[1] ?? null;
}

export function tagsOf(svg: string, name: string): string[] {
  return svg.match(new RegExp(`<${name}[ />][^>]*>?`, 'g')) ?? [];
}

export function textsOf(svg: string): DrawnText[] {
  return [...svg.matchAll(/<text([^>]*)>([^<]*)<\/text>/g)].map(([, attributes = '', content = '']) => {
    const text = unescapeXml(content);
    const [x, y] = [Number(attribute(attributes, 'x')), Number(attribute(attributes, 'y'))];
    const width = [...text].length * CHARACTER_EM * FONT_SIZE;
    const anchor = attribute(attributes, 'text-anchor') ?? 'start';
    const left = x - width * { start: 0, middle: 0.5, end: 1 }[anchor as 'start' | 'middle' | 'end'];
    return { text, x, y, left, right: left + width, top: y - 0.8 * FONT_SIZE, bottom: y + 0.22 * FONT_SIZE };
  });
}

export function unescapeXml(text: string): string {
  const characters: Record<string, string> = { lt: '<', gt: '>', quot: '"', '#39': "'", amp: '&' };
  return text.replace(/&(#?\w+);/g, (_, name: string) => characters[name] ?? '?');
}

export function overlapsOf(svg: string): string[] {
  const texts = textsOf(svg);
  return texts.flatMap((a, index) =>
    texts
      .slice(index + 1)
      .filter((b) => a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom)
      .map((b) => `'${a.text}' overlaps '${b.text}'`),
  );
}

/** What every figure has to keep, whatever its data. */
export function expectSoundFigure(svg: string, prefix: string): void {
  expect(wellFormed(svg)).toBe(true);
  expect(svg).not.toMatch(/NaN|Infinity|undefined|null/);
  expect(svg).not.toMatch(/\sstyle=|<style|<script|\son\w+=/);
  const root = tagsOf(svg, 'svg')[0]!;
  expect(attribute(root, 'xmlns')).toBe('http://www.w3.org/2000/svg');
  expect(attribute(root, 'role')).toBe('img');
  expect(attribute(root, 'aria-labelledby')).toBe(`${prefix}-title ${prefix}-desc`);
  const [width, height] = [Number(attribute(root, 'width')), Number(attribute(root, 'height'))];
  expect(attribute(root, 'viewBox')).toBe(`0 0 ${width} ${height}`);
  const ids = [...svg.matchAll(/ id="([^"]*)"/g)].map(([, id]) => id!);
  expect(new Set(ids).size).toBe(ids.length);
  expect(ids.filter((id) => !id.startsWith(`${prefix}-`))).toEqual([]);
  expect(svg.match(/\d\.\d{3,}(?=[^<>]*>)/g)).toBeNull();
  const outside = textsOf(svg).filter(
    ({ left, right, top, bottom }) => left < 0 || right > width || top < 0 || bottom > height,
  );
  expect(outside).toEqual([]);
  expect(overlapsOf(svg)).toEqual([]);
}

/** Tags closed in order, attributes quoted, no bare `<` or `&`, one root. */
export function wellFormed(svg: string): boolean {
  const open: string[] = [];
  let rest = svg;
  while (rest !== '') {
    const tag = /^<(\/?)([a-zA-Z]+)((?: [\w:-]+="[^"<]*")*)(\/?)>/.exec(rest);
    const text = /^[^<]+/.exec(rest);
    if (tag !== null) {
      const [whole, closing, name = '', attributes = '', empty] = tag;
      if (/&(?!(?:lt|gt|amp|quot|#39);)/.test(attributes)) return false;
      if (closing === '/' && open.pop() !== name) return false;
      if (closing === '' && empty === '') open.push(name);
      rest = rest.slice(whole.length);
      if (open.length === 0) return rest === '';
    } else if (text !== null && !/&(?!(?:lt|gt|amp|quot|#39);)/.test(text[0]) && open.length > 0) {
      rest = rest.slice(text[0].length);
    } else return false;
  }
  return false;
}
