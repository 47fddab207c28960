/** Numbers as text for the pages, rounding decided once.
 *
 *  Decimals have a point; a negative number has a minus sign (U+2212); a number that cannot exceed 1 (power,
 *  probability, R²) has no zero before its point; no number is printed with an exponent unless it is below 1e-12 or
 *  has more than 21 digits. Exports: formatPower, formatProbability, formatSignificant, formatPercent, formatCount,
 *  formatExact. */

const MINUS = '\u2212';
/** No-break, so that a number never ends a line halfway. */
const THIN_SPACE = '\u202f';
const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

const POWER_DECIMALS = 3;
/** Percentages come from decimal fractions; 12 digits drop what the multiplication by 100 adds. */
const PERCENT_DIGITS = 12;
/** From here on a count is written in groups of three. */
const GROUPED_FROM = 10_000;

/**
 * A power or another probability to three decimals: `.900`, never `1` and never `0` (`>.999`, `<.001`).
 * One below its target is cut, not rounded, where rounding would print it as reaching the target.
 * @throws {RangeError} where value or target lies outside 0 to 1
 */
export function formatPower(value: number, target?: number): string {
  checkShare('value', value);
  if (target !== undefined) checkShare('target', target);
  const nearest = value.toFixed(POWER_DECIMALS);
  if (Number(nearest) >= 1) return '>.999';
  if (Number(nearest) <= 0) return '<.001';
  const crosses = target !== undefined && value < target && Number(nearest) >= target;
  return withoutZero(crosses ? cut(value, POWER_DECIMALS) : nearest);
}

/**
 * A number that cannot exceed 1 in size, with all the digits it was given: `.05`, `−.3`.
 * @throws {RangeError} where value lies outside −1 to 1
 */
export function formatProbability(value: number): string {
  if (!(Math.abs(value) <= 1)) throw new RangeError(`value is ${value}; it has to lie from -1 to 1`);
  return withoutZero(formatExact(value));
}

/**
 * To `digits` significant digits, without zeros at the end: `0.0638`, `12.5`, `30`. With a target, to as many more as
 * it takes to print the value on its side of it: a width of 2.5004 is not within 2.5.
 * @throws {RangeError} where a number is not finite or digits is no whole number from 1 to 17
 */
export function formatSignificant(value: number, digits: number, target?: number): string {
  if (!(Number.isInteger(digits) && digits >= 1 && digits <= 17)) {
    throw new RangeError(`digits is ${digits}; it has to be a whole number from 1 to 17`);
  }
  const rounded = Number(checkFinite(value).toPrecision(digits));
  const crosses = target !== undefined && value > checkFinite(target) !== rounded > target;
  return crosses && digits < 17 ? formatSignificant(value, digits + 1, target) : formatExact(rounded);
}

/**
 * A proportion as percent, with the digits it was given: `12 %`, `2.5 %`.
 * @throws {RangeError} where value is not finite
 */
export function formatPercent(value: number): string {
  return `${formatSignificant(100 * value, PERCENT_DIGITS)} %`;
}

/**
 * A whole number: `9500`, `12 000`.
 * @throws {RangeError} where value is no whole number from 0 that a double holds exactly
 */
export function formatCount(value: number): string {
  if (!(Number.isSafeInteger(value) && value >= 0)) {
    throw new RangeError(`value is ${value}; it has to be a whole number from 0`);
  }
  return value < GROUPED_FROM ? String(value) : String(value).replace(/\B(?=(\d{3})+$)/g, THIN_SPACE);
}

/**
 * All digits: the shortest decimal that reads back as the same number, at most 17 significant digits.
 * @throws {RangeError} where value is not finite
 */
export function formatExact(value: number): string {
  const text = String(checkFinite(value) + 0);
  const [mantissa = '', exponent] = text.split('e');
  const signed = mantissa.replace('-', MINUS);
  if (exponent === undefined) return signed;
  const power = Number(exponent);
  return power < 0 && power >= -12 ? shifted(signed, -power) : `${signed} × 10${superscript(power)}`;
}

/** `1.5` shifted by 7 places is `0.00000015`. */
function shifted(mantissa: string, places: number): string {
  const sign = mantissa.startsWith(MINUS) ? MINUS : '';
  const digits = mantissa.slice(sign.length).replace('.', '');
  return `${sign}0.${'0'.repeat(places - 1)}${digits}`;
}

function superscript(exponent: number): string {
  const digits = [...String(Math.abs(exponent))].map((digit) => SUPERSCRIPTS[Number(digit)]);
  return `${exponent < 0 ? '⁻' : ''}${digits.join('')}`;
}

/** Leaves decimals out. Works on the shortest decimal, so that a power of .569 stays .569. */
function cut(value: number, decimals: number): string {
  const [whole = '0', fraction = ''] = String(value).split('.');
  return `${whole}.${fraction.slice(0, decimals).padEnd(decimals, '0')}`;
}

function withoutZero(text: string): string {
  return text.replace(/^(−?)0\./, '$1.');
}

function checkFinite(value: number): number {
  if (!Number.isFinite(value)) throw new RangeError(`value is ${value}; it has to be finite`);
  return value;
}

function checkShare(name: string, value: number): void {
  if (!(value >= 0 && value <= 1)) throw new RangeError(`${name} is ${value}; it has to lie from 0 to 1`);
}
