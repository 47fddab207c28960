import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  formatCount,
  formatExact,
  formatPercent,
  formatPower,
  formatProbability,
  formatSignificant,
} from '../../src/document/numbers.ts';

const share = fc.integer({ min: 0, max: 1e6 }).map((millionths) => millionths / 1e6);
/** What a reader takes a printed number for. */
const read = (text: string) => Number(text.replace('−', '-').replaceAll('\u202f', ''));

describe('formatPower', () => {
  test.each([
    [0.9, '.900'],
    [0.90047, '.900'],
    [0.7279, '.728'],
    [0.8995001, '.900'],
    [0.99949, '.999'],
    [0.5, '.500'],
  ])('prints %s as %s', (value, text) => {
    expect(formatPower(value)).toBe(text);
  });

  test('never prints certainty', () => {
    expect(formatPower(0.99996)).toBe('>.999');
    expect(formatPower(1)).toBe('>.999');
    expect(formatPower(0.00049)).toBe('<.001');
    expect(formatPower(0)).toBe('<.001');
  });

  test.each([
    [0.8996, 0.9, '.899'],
    [0.89999999, 0.9, '.899'],
    [0.9, 0.9, '.900'],
    [0.9004, 0.9, '.900'],
    [0.7996, 0.9, '.800'],
    [0.7996, 0.8, '.799'],
    [0.5690000001, 0.57, '.569'],
    [0.9496, 0.9499, '.949'],
    [0.99996, 0.99999, '>.999'],
  ])('prints %s with target %s as %s', (value, target, text) => {
    expect(formatPower(value, target)).toBe(text);
  });

  test('never reads as reaching a target that is missed', () => {
    fc.assert(
      fc.property(share, share, (value, target) => {
        const text = formatPower(value, target);
        fc.pre(/^\./.test(text));
        if (read(text) >= target) expect(value).toBeGreaterThanOrEqual(target);
      }),
    );
  });

  test('never reads as reaching a target missed by less than the last decimal', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 2, max: 998 }),
        fc.double({ min: 1e-12, max: 4.9e-4, noNaN: true }),
        (thousandths, gap) => {
          const target = thousandths / 1000;
          expect(read(formatPower(target - gap, target))).toBeLessThan(target);
        },
      ),
    );
  });

  test('stays within one unit of the last decimal', () => {
    fc.assert(
      fc.property(share, share, (value, target) => {
        const text = formatPower(value, target);
        fc.pre(/^\./.test(text));
        expect(Math.abs(read(text) - value)).toBeLessThanOrEqual(0.001);
      }),
    );
  });

  test.each([-0.1, 1.1, Number.NaN, Number.POSITIVE_INFINITY])('refuses %s', (value) => {
    expect(() => formatPower(value)).toThrow(`value is ${value}; it has to lie from 0 to 1`);
    expect(() => formatPower(0.5, value)).toThrow(`target is ${value}; it has to lie from 0 to 1`);
  });
});

describe('formatProbability', () => {
  test.each([
    [0.05, '.05'],
    [0.025, '.025'],
    [0.9, '.9'],
    [5e-8, '.00000005'],
    [0, '0'],
    [1, '1'],
    [-0.3, '−.3'],
  ])('prints %s as %s', (value, text) => {
    expect(formatProbability(value)).toBe(text);
  });

  test('refuses what is no share', () => {
    expect(() => formatProbability(1.5)).toThrow('value is 1.5; it has to lie from -1 to 1');
    expect(() => formatProbability(Number.NaN)).toThrow(RangeError);
  });
});

describe('formatSignificant', () => {
  test.each([
    [0.06382978723404255, 3, '0.0638'],
    [12.5, 3, '12.5'],
    [30, 3, '30'],
    [123456, 3, '123000'],
    [-0.0001234, 2, '−0.00012'],
    [0.1 + 0.2, 10, '0.3'],
    [-0, 3, '0'],
  ])('prints %s to %s digits as %s', (value, digits, text) => {
    expect(formatSignificant(value, digits)).toBe(text);
  });

  test.each([
    [2.5004, 2.5, '2.5004'],
    [0.2003, 0.2, '0.2003'],
    [0.2, 0.2, '0.2'],
    [0.19996, 0.2, '0.2'],
    [0.19996, 0.19998, '0.19996'],
    [1.567, 1.6, '1.57'],
  ])('prints %s with target %s as %s', (value, target, text) => {
    expect(formatSignificant(value, 3, target)).toBe(text);
  });

  test('never prints a value on the other side of its target', () => {
    const width = fc.double({ min: 1e-6, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(width, fc.double({ min: -1e-3, max: 1e-3, noNaN: true }), (target, gap) => {
        const value = target * (1 + gap);
        expect(read(formatSignificant(value, 3, target)) > target).toBe(value > target);
      }),
    );
  });

  test('refuses digits that make no sense, and numbers that are none', () => {
    expect(() => formatSignificant(1, 0)).toThrow('digits is 0; it has to be a whole number from 1 to 17');
    expect(() => formatSignificant(1, 2.5)).toThrow(RangeError);
    expect(() => formatSignificant(Number.NaN, 3)).toThrow('value is NaN; it has to be finite');
  });
});

describe('formatPercent', () => {
  test.each([
    [0.12, '12 %'],
    [0.07, '7 %'],
    [0.025, '2.5 %'],
    [0.29, '29 %'],
    [0, '0 %'],
  ])('prints %s as %s', (value, text) => {
    expect(formatPercent(value)).toBe(text);
  });
});

describe('formatCount', () => {
  test('groups digits from 10 000 on', () => {
    expect(formatCount(0)).toBe('0');
    expect(formatCount(9999)).toBe('9999');
    expect(formatCount(10000)).toBe('10\u202f000');
    expect(formatCount(1234567)).toBe('1\u202f234\u202f567');
  });

  test('keeps every digit', () => {
    fc.assert(
      fc.property(fc.maxSafeNat(), (count) => {
        expect(read(formatCount(count))).toBe(count);
      }),
    );
  });

  test.each([-1, 2.5, Number.NaN, 2 ** 60])('refuses %s', (value) => {
    expect(() => formatCount(value)).toThrow(`value is ${value}; it has to be a whole number from 0`);
  });
});

describe('formatExact', () => {
  test.each([
    [0.1, '0.1'],
    [235, '235'],
    [-1.5, '−1.5'],
    [-0, '0'],
    [0.1 + 0.2, '0.30000000000000004'],
    [1.5e-7, '0.00000015'],
    [-2e-12, '−0.000000000002'],
    [1.5e-20, '1.5 × 10⁻²⁰'],
    [3e25, '3 × 10²⁵'],
  ])('prints %s as %s', (value, text) => {
    expect(formatExact(value)).toBe(text);
  });

  test('reads back as the same number', () => {
    const powers = (text: string) =>
      text.replace(/ × 10([⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+)/, (_, power: string) => {
        const digits = [...power].map((one) => (one === '⁻' ? '-' : '⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(one)));
        return `e${digits.join('')}`;
      });
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        expect(read(powers(formatExact(value)))).toBe(value + 0);
      }),
    );
  });

  test('refuses what is not finite', () => {
    expect(() => formatExact(Number.NaN)).toThrow('value is NaN; it has to be finite');
    expect(() => formatExact(Number.NEGATIVE_INFINITY)).toThrow(RangeError);
  });
});
