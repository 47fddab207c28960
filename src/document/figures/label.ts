/** Text that has to fit: an approximate width, lines, and a shortened last line. */

import { element, textElement, titleElement } from './svg.ts';

/** In figure units; 8.5 pt where the figure is printed 12 cm wide. */
export const FONT_SIZE = 12;
export const LINE_HEIGHT = 15;

/** Width of a character in em: the average of a wide sans-serif face, so that narrower ones fit as well. */
const CHARACTER_EM = 0.6;
/** Scripts whose characters fill a square: from CJK radicals on, Hangul, full-width forms, pictographs. */
const WIDE = /[\u1100-\u115f\u2e80-\ua4cf\uac00-\ud7a3\uf900-\ufaff\uff00-\uff60\u{1f300}-\u{1faff}]/u;

const graphemes = new Intl.Segmenter('en', { granularity: 'grapheme' });

export interface Label {
  lines: string[];
  /** The whole text if `lines` had to leave some of it out. */
  full: string | null;
  width: number;
  height: number;
}

export function textWidth(text: string): number {
  return characters(text).reduce((sum, one) => sum + FONT_SIZE * (WIDE.test(one) ? 1.1 : CHARACTER_EM), 0);
}

/** Breaks a text into at most `maxLines` lines at spaces; what does not fit ends in an ellipsis. */
export function fitted(text: string, maxWidth: number, maxLines: number): Label {
  const words = text.split(/\s+/).filter((word) => word !== '');
  const lines: string[] = [];
  for (const [index, word] of words.entries()) {
    const last = lines.at(-1);
    if (last !== undefined && textWidth(`${last} ${word}`) <= maxWidth) {
      lines[lines.length - 1] = `${last} ${word}`;
    } else if (lines.length < maxLines) {
      lines.push(word);
    } else {
      lines[lines.length - 1] = `${last} ${words.slice(index).join(' ')}`;
      break;
    }
  }
  const shown = lines.map((line) => shortened(line, maxWidth));
  return { ...stacked(shown), full: shown.some((line, index) => line !== lines[index]) ? text : null };
}

/** A label of the lines given, short ones. */
export function stacked(lines: string[]): Label {
  return {
    lines,
    full: null,
    width: Math.max(0, ...lines.map(textWidth)),
    height: lines.length * LINE_HEIGHT,
  };
}

/** Draws a label; `x`, `y` is the top of its first line at the anchor. */
export function labelElement(
  { lines, full }: Label,
  x: number,
  y: number,
  attributes: Record<string, string | number> = {},
): string {
  const texts = lines.map((line, index) => textElement(line, { x, y: y + baseline(index), ...attributes }));
  return full === null ? texts.join('') : element('g', {}, titleElement(full) + texts.join(''));
}

/** From the top of a label to the baseline of a line of it. */
function baseline(line: number): number {
  return line * LINE_HEIGHT + FONT_SIZE - 0.5;
}

function shortened(text: string, maxWidth: number): string {
  if (textWidth(text) <= maxWidth) return text;
  const kept = characters(text);
  while (kept.length > 0 && textWidth(`${kept.join('').trimEnd()}…`) > maxWidth) kept.pop();
  return `${kept.join('').trimEnd()}…`;
}

function characters(text: string): string[] {
  return Array.from(graphemes.segment(text), ({ segment }) => segment);
}
