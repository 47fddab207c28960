import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { hangFlags } from '../../../src/document/figures/flags.ts';
import { stacked } from '../../../src/document/figures/label.ts';

const [LEFT, RIGHT] = [168, 480];

describe('hangFlags', () => {
  it('hangs two labels that lie apart on the first line, under their poles', () => {
    const [first, second] = hangFlags(
      [230, 400].map((at) => ({ at, label: stacked(['power .80: 1']) })),
      LEFT,
      RIGHT,
    );
    expect([first!.box.y, second!.box.y]).toEqual([0, 0]);
    expect(first!.box.x + first!.box.width / 2).toBeCloseTo(230, 10);
  });

  it('always gives two labels of almost half the width a pole that no label covers', () => {
    const at = fc.integer({ min: LEFT + 10, max: RIGHT - 10 });
    const words = fc.integer({ min: 1, max: 20 }).map((length) => stacked(['x'.repeat(length)]));
    fc.assert(
      fc.property(at, at, words, words, (a, b, one, other) => {
        const flags = hangFlags(
          [
            { at: a, label: one },
            { at: b, label: other },
          ],
          LEFT,
          RIGHT,
        );
        for (const { at, pole, box } of flags) {
          expect(pole).toBeGreaterThanOrEqual(0);
          expect(box.x).toBeGreaterThanOrEqual(LEFT);
          expect(box.x + box.width).toBeLessThanOrEqual(RIGHT);
          for (const { at: otherAt, pole: otherPole } of flags.filter((flag) => flag.at !== at)) {
            const isInside = otherAt! > box.x && otherAt! < box.x + box.width;
            expect(isInside && otherPole! > box.y).toBe(false);
          }
        }
      }),
    );
  });

  it('lists the labels one below the other where poles cannot reach all of them', () => {
    const label = stacked(['x'.repeat(40)]);
    const flags = hangFlags(
      [200, 300, 440].map((at) => ({ at, label })),
      LEFT,
      RIGHT,
    );
    expect(flags.map(({ box }) => box.y)).toEqual([0, 15, 30]);
    expect(flags.every(({ pole }) => pole! < 0)).toBe(true);
  });
});
