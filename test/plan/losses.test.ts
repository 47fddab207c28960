import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { enrolledFor, evaluableFrom, overallLoss } from '../../src/plan/losses.ts';

describe('from analysed to enrolled', () => {
  // Arithmetic, by hand.
  test.each([
    [235, [0.17], 284],
    [100, [0.2], 125],
    [90, [0.1], 100],
    [235, [0.05, 0.12], 282],
    [235, [0.12, 0.05], 282],
    [100, [0.1, 0.1], 124],
    [70, [0.3], 100],
    [7, [], 7],
    [10, [0], 10],
    [1, [0.999999], 1_000_000],
  ])('%d analysed with losses %j are %d enrolled', (evaluable, losses, enrolled) => {
    expect(enrolledFor(evaluable, losses)).toBe(enrolled);
  });

  test('275 enrolled, the wrong multiplication of 235 by 1.17, leave only 228', () => {
    expect(evaluableFrom(275, [0.17])).toBe(228);
  });

  test('decimals are taken as written: k tenths lost of a multiple of ten is exact', () => {
    for (let tenths = 1; tenths < 10; tenths += 1) {
      for (let tens = 1; tens <= 200; tens += 1) {
        const left = tens * (10 - tenths);
        expect(enrolledFor(left, [tenths / 10])).toBe(tens * 10);
        expect(evaluableFrom(tens * 10, [tenths / 10])).toBe(left);
      }
    }
  });

  test('very small and very long decimals stay exact', () => {
    expect(enrolledFor(1_000_000, [1e-7])).toBe(1_000_001);
    expect(overallLoss([0.1, 0.1])).toBe(0.19);
  });

  const loss = fc.integer({ min: 0, max: 900 }).map((thousandths) => thousandths / 1000);

  test('the number enrolled leaves enough, and one fewer does not', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 100_000 }),
        fc.array(loss, { maxLength: 5 }),
        (evaluable, losses) => {
          const enrolled = enrolledFor(evaluable, losses);
          expect(evaluableFrom(enrolled, losses)).toBeGreaterThanOrEqual(evaluable);
          expect(evaluableFrom(enrolled - 1, losses)).toBeLessThan(evaluable);
        },
      ),
    );
  });
});
