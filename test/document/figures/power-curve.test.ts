import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { powerCurve } from '../../../src/document/figures/power-curve.ts';
import type { PowerCurveData } from '../../../src/document/figures/power-curve-data.ts';
import { attribute, expectSoundFigure, tagsOf, textsOf } from './read-svg.ts';

const HOSTILE = '<script>alert("1")</script> & \'x\' \u0007 قوة الاختبار';

/** Any rising curve will do: no figure knows where its values come from. */
const rising = (n: number, effect: number) => 1 - Math.exp(-n * effect);

function powerData(change: Partial<PowerCurveData> = {}): PowerCurveData {
  const points = Array.from({ length: 45 }, (_, index) => 8 + 4 * index).map((n) => ({
    n,
    value: rising(n, 0.02),
    low: rising(n, 0.012),
    high: rising(n, 0.03),
  }));
  return {
    prefix: 'tide-curve',
    title: 'Power of the aim “tide”',
    description: 'With 116 harbours analysed the power is .902.',
    xLabel: 'harbours analysed',
    yLabel: 'power',
    points,
    target: 0.9,
    planned: { n: 116, value: rising(116, 0.02) },
    band: 'partial R² .04 to .15',
    ...change,
  };
}

function widthData(change: Partial<PowerCurveData> = {}): PowerCurveData {
  const width = (n: number, sd: number) => (4 * sd * (1 + 5 / n)) / Math.sqrt(n);
  const points = Array.from({ length: 45 }, (_, index) => 4 + 4 * index).map((n) => ({
    n,
    value: width(n, 6),
    low: width(n, 5),
    high: width(n, 8),
  }));
  return powerData({
    yLabel: 'full width of the interval',
    points,
    target: 2.6,
    planned: { n: 100, value: width(100, 6) },
    band: 'residual SD 5 to 8',
    ...change,
  });
}

const words = (svg: string) => textsOf(svg).map(({ text }) => text);
const dotOf = (svg: string) => {
  const dot = tagsOf(svg, 'circle')[0]!;
  return { x: Number(attribute(dot, 'cx')), y: Number(attribute(dot, 'cy')) };
};

/** The coordinate of a value, interpolated between two labels of an axis. */
function between(svg: string, [from, to]: [string, string], side: 'x' | 'y', value: number): number {
  const at = (text: string) => textsOf(svg).find((one) => one.text === text)![side];
  const share = (value - Number(from)) / (Number(to) - Number(from));
  return at(from) + share * (at(to) - at(from));
}

describe('powerCurve', () => {
  it('keeps the rules for figures with power and with width', () => {
    expectSoundFigure(powerCurve(powerData()), 'tide-curve');
    expectSoundFigure(powerCurve(widthData()), 'tide-curve');
  });

  it('names the planned number, the power, the target and the band directly, without leading zeros', () => {
    const texts = words(powerCurve(powerData()));
    for (const text of [
      'planned n 116',
      'power .902',
      'target .90',
      'harbours analysed',
      'power',
      '.2',
      '1',
    ]) {
      expect(texts).toContain(text);
    }
    expect(texts.join(' ')).toContain('partial R² .04 to .15');
    expect(texts.filter((text) => /(?:^|\s)0\./.test(text))).toEqual([]);
  });

  it('does not round a power that misses its target up to it', () => {
    const texts = words(powerCurve(powerData({ planned: { n: 116, value: 0.89996 } })));
    expect(texts).toContain('power .899');
  });

  it('puts the dot where the axes say it is', () => {
    const svg = powerCurve(powerData());
    const dot = dotOf(svg);
    expect(dot.x).toBeCloseTo(between(svg, ['40', '160'], 'x', 116), 1);
    // The baselines of the labels stand 0.35 of the font size below their marks.
    expect(dot.y).toBeCloseTo(between(svg, ['.2', '.8'], 'y', rising(116, 0.02)) - 0.35 * 12, 1);
  });

  it('drops a line from the dot to the axis and draws the target in another dash', () => {
    const svg = powerCurve(powerData());
    const dot = dotOf(svg);
    const dashed = tagsOf(svg, 'line').filter((tag) => attribute(tag, 'stroke-dasharray') !== null);
    expect(dashed).toHaveLength(2);
    expect(new Set(dashed.map((tag) => attribute(tag, 'stroke-dasharray'))).size).toBe(2);
    const drop = dashed.find((tag) => attribute(tag, 'x1') === attribute(tag, 'x2'))!;
    expect([Number(attribute(drop, 'x1')), Number(attribute(drop, 'y1'))]).toEqual([dot.x, dot.y]);
  });

  it('scales the vertical axis to a width and leaves out where the width grows out of reach', () => {
    const svg = powerCurve(widthData());
    const ticks = words(svg).filter((text) => /^\d+(\.\d+)?$/.test(text));
    expect(ticks).toContain('8');
    expect(words(svg)).toContain('width 2.52');
    expect(words(svg)).toContain('target 2.6');
    const small = powerCurve(
      widthData({
        points: [
          { n: 5, value: 0.03, low: null, high: null },
          { n: 50, value: 0.01, low: null, high: null },
        ],
        planned: { n: 20, value: 0.02 },
        target: null,
        band: null,
      }),
    );
    expect(words(small)).toContain('0.02');
    expect(words(small)).toContain('width 0.02');
  });

  it('draws no band, edge or band label without a band, and no target line without a target', () => {
    const svg = powerCurve(powerData({ band: null, target: null }));
    expect(tagsOf(svg, 'path')).toHaveLength(1);
    expect(words(svg).some((text) => text.startsWith('target'))).toBe(false);
    expect(tagsOf(powerCurve(powerData()), 'path')).toHaveLength(4);
  });

  it('breaks the band where one of its ends reaches nothing', () => {
    const points = powerData().points.map((point, index) => (index === 20 ? { ...point, low: null } : point));
    const svg = powerCurve(powerData({ points }));
    const band = attribute(tagsOf(svg, 'path')[0]!, 'd')!;
    expect(band.match(/M/g)).toHaveLength(2);
    expectSoundFigure(svg, 'tide-curve');
  });

  it('escapes what the author wrote and gives the whole of a shortened label in its title', () => {
    const band = `${HOSTILE} ${'and a very long tail of words '.repeat(8)}`.trim();
    const svg = powerCurve(
      powerData({ title: HOSTILE, description: HOSTILE, xLabel: HOSTILE, yLabel: HOSTILE, band }),
    );
    expectSoundFigure(svg, 'tide-curve');
    expect(svg).toContain(
      '&lt;script&gt;alert(&quot;1&quot;)&lt;/script&gt; &amp; &#39;x&#39; \ufffd قوة الاختبار',
    );
    expect(svg).toContain('and a very long tail of words</title>');
  });

  it('has text of at least 8 pt where it is printed 12 cm wide', () => {
    const root = tagsOf(powerCurve(powerData()), 'svg')[0]!;
    const points =
      (Number(attribute(root, 'font-size')) / Number(attribute(root, 'width'))) * (12 / 2.54) * 72;
    expect(points).toBeGreaterThanOrEqual(8);
    expect(powerCurve(powerData()).match(/font-size/g)).toHaveLength(1);
  });

  it('keeps the label of a target at the top of the plot off a long name of the axis', () => {
    const yLabel = 'power of the test of the slope with everything else in the model held fixed';
    expectSoundFigure(powerCurve(powerData({ yLabel, target: 0.9999 })), 'tide-curve');
  });

  it('draws a curve of a single point', () => {
    const point = { n: 30, value: 0.5, low: null, high: null };
    expectSoundFigure(
      powerCurve(powerData({ points: [point], planned: { n: 30, value: 0.5 } })),
      'tide-curve',
    );
  });

  it('gives the same text for the same data', () => {
    expect(powerCurve(powerData())).toBe(powerCurve(powerData()));
  });

  it('refuses values that cannot be drawn and ids with spaces', () => {
    const point = { n: 30, value: Number.NaN, low: null, high: null };
    expect(() => powerCurve(powerData({ points: [point] }))).toThrow(RangeError);
    expect(() =>
      powerCurve(powerData({ points: [{ ...point, value: 1, high: Number.POSITIVE_INFINITY }] })),
    ).toThrow(/Infinity/);
    expect(() => powerCurve(powerData({ points: [] }))).toThrow(/points is empty/);
    expect(() => powerCurve(powerData({ prefix: 'a b' }))).toThrow(/prefix is 'a b'/);
  });

  it('keeps the rules for any rising power', () => {
    const shape = fc.record({
      first: fc.integer({ min: 3, max: 30 }),
      step: fc.integer({ min: 1, max: 40_000 }),
      effect: fc.double({ min: 0.001, max: 1, noNaN: true }),
      spread: fc.double({ min: 1, max: 4, noNaN: true }),
      planned: fc.integer({ min: 0, max: 29 }),
      target: fc.constantFrom(null, 0.8, 0.9, 0.95, 0.999),
      band: fc.constantFrom(
        null,
        'slope 1 to 3',
        'difference of the means of the two groups, in points, 1.5 to 2.5',
      ),
    });
    fc.assert(
      fc.property(shape, ({ first, step, effect, spread, planned, target, band }) => {
        const points = Array.from({ length: 30 }, (_, index) => ({
          n: first + step * index,
          value: rising(index + 1, effect),
          low: rising(index + 1, effect / spread),
          high: rising(index + 1, effect * spread),
        }));
        const data = powerData({ points, planned: points[planned]!, target, band });
        expectSoundFigure(powerCurve(data), 'tide-curve');
      }),
      { numRuns: 25 },
    );
  });
});
