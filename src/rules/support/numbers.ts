/** Numbers as the messages print them: like the pages, without a leading zero where there is no unit. */

import type { Quantity } from '../../spec/study.ts';

/** A number as the author typed it. */
export function shownNumber(value: number): string {
  return String(value)
    .replace('-', '−')
    .replace(/^(−?)0\./, '$1.');
}

/** A computed number, to three significant digits. */
export function shownComputed(value: number): string {
  return shownNumber(Number(value.toPrecision(3)));
}

/** Three decimals, never rounded up across the target. */
export function shownPower(value: number, target: number | null = null): string {
  if (value > 0.9995) return '>.999';
  if (value < 0.0005) return '<.001';
  const rounded = Math.round(value * 1000) / 1000;
  const isAcross = target !== null && value < target && rounded >= target;
  return (isAcross ? Math.floor(value * 1000) / 1000 : rounded).toFixed(3).replace(/^0\./, '.');
}

/** At least two decimals: .90, .05, .025. */
export function shownLevel(value: number): string {
  const text = shownNumber(value);
  return /^\.\d$/.test(text) ? `${text}0` : text;
}

export function shownPercent(proportion: number): string {
  return `${shownNumber(Number((100 * proportion).toPrecision(3)))} %`;
}

/** 'partial R² (.06)'; with a unit the leading zero stays. */
export function shownQuantity({ title, value, unit }: Quantity): string {
  return `${title} (${unit === '' ? shownNumber(value) : String(value).replace('-', '−')})`;
}

const FRACTIONS: readonly [number, string][] = [
  [1 / 20, 'one in twenty'],
  [1 / 10, 'one in ten'],
  [1 / 8, 'one in eight'],
  [1 / 6, 'one in six'],
  [1 / 5, 'one in five'],
  [1 / 4, 'one in four'],
  [3 / 10, 'three in ten'],
  [1 / 3, 'one in three'],
  [2 / 5, 'two in five'],
  [1 / 2, 'one in two'],
  [3 / 5, 'three in five'],
  [2 / 3, 'two in three'],
  [3 / 4, 'three in four'],
  [4 / 5, 'four in five'],
  [9 / 10, 'nine in ten'],
  [19 / 20, 'nineteen in twenty'],
];

/** A probability as the nearest simple fraction: 'one in four'. */
export function inWords(probability: number): string {
  return FRACTIONS.reduce((nearest, one) =>
    Math.abs(one[0] - probability) < Math.abs(nearest[0] - probability) ? one : nearest,
  )[1];
}
