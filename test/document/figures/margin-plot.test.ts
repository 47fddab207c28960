import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  type MarginPlotData,
  type MarginRow,
  marginPlot,
} from '../../../src/document/figures/margin-plot.ts';
import { attribute, expectSoundFigure, tagsOf, textsOf } from './read-svg.ts';

const slope: MarginRow = {
  label: 'slope of the outcome on the predictor',
  unit: 'points per hour',
  planned: 0.5,
  plannedText: '0.5 points per hour',
  limits: [
    { floor: 'power .90', value: 0.48, text: '0.48 points per hour' },
    { floor: 'power .80', value: 0.41, text: '0.41 points per hour' },
  ],
  low: 0.3,
  high: 0.7,
};

function plot(...rows: MarginRow[]): string {
  const data: MarginPlotData = { prefix: 'tide-margins', title: 'How far', description: 'For each', rows };
  return marginPlot(data);
}

const words = (svg: string) => textsOf(svg).map(({ text }) => text);
const numberOf = (tag: string, name: string) => Number(attribute(tag, name));
/** The upright ticks of the rows, left to right; the last upright line of a figure is that of its key. */
const ticksOf = (svg: string) =>
  tagsOf(svg, 'line')
    .filter((tag) => attribute(tag, 'x1') === attribute(tag, 'x2'))
    .slice(0, -1)
    .map((tag) => numberOf(tag, 'x1'));

describe('marginPlot', () => {
  it('keeps the rules for figures', () => {
    expectSoundFigure(plot(slope), 'tide-margins');
    expectSoundFigure(
      plot(slope, { ...slope, limits: [] }, { ...slope, low: null, high: null }),
      'tide-margins',
    );
  });

  it('places planned value, range and limits on one linear scale from the outermost of them', () => {
    const svg = plot(slope);
    const bar = tagsOf(svg, 'rect').find((tag) => attribute(tag, 'fill') === '#cccccc')!;
    const [start, width] = [numberOf(bar, 'x'), numberOf(bar, 'width')];
    const at = (value: number) => start + (width * (value - 0.3)) / 0.4;
    expect(numberOf(tagsOf(svg, 'circle')[0]!, 'cx')).toBeCloseTo(at(0.5), 1);
    const ticks = ticksOf(svg);
    expect(ticks[0]).toBeCloseTo(at(0.48), 1);
    expect(ticks[1]).toBeCloseTo(at(0.41), 1);
  });

  it('scales each row by itself', () => {
    const hundredfold = {
      ...slope,
      planned: 50,
      low: 30,
      high: 70,
      limits: slope.limits.map((limit) => ({ ...limit, value: limit.value! * 100 })),
    };
    const [first, second, third, fourth] = ticksOf(plot(slope, hundredfold));
    expect([third, fourth]).toEqual([first, second]);
  });

  it('labels each limit with its floor and value, the unit once', () => {
    const texts = words(plot(slope));
    for (const text of ['0.5 points per hour', 'power .90: 0.48', 'power .80: 0.41'])
      expect(texts).toContain(text);
  });

  it('says the text of a limit that has no value, without a tick', () => {
    const limits = [
      { floor: 'power .90', value: 0.48, text: '0.48 points per hour' },
      { floor: 'power .80', value: null, text: 'at no value' },
    ];
    const svg = plot({ ...slope, limits });
    expect(words(svg)).toContain('power .80: at no value');
    expect(ticksOf(svg)).toHaveLength(1);
    expectSoundFigure(svg, 'tide-margins');
  });

  it('draws a range with one end from the planned value', () => {
    const svg = plot({ ...slope, low: null });
    const bar = tagsOf(svg, 'rect').find((tag) => attribute(tag, 'fill') === '#cccccc')!;
    expect(numberOf(bar, 'x')).toBe(numberOf(tagsOf(svg, 'circle')[0]!, 'cx'));
  });

  it('draws an assumption without range or limits in the middle of its row', () => {
    const svg = plot({ ...slope, limits: [], low: null, high: null });
    expectSoundFigure(svg, 'tide-margins');
    expect(tagsOf(svg, 'rect').filter((tag) => attribute(tag, 'fill') === '#cccccc')).toHaveLength(1);
  });

  it('escapes what the author wrote, wraps long labels and gives the whole text in the title of the row', () => {
    const label = `انحراف <script> & "quoted" ${'an assumption that goes on '.repeat(6)}until here`;
    const svg = plot({ ...slope, label, unit: '<b>&', plannedText: '0.5 <b>&' });
    expectSoundFigure(svg, 'tide-margins');
    expect(svg).toContain('<title>انحراف &lt;script&gt; &amp; &quot;quoted&quot; an assumption');
    expect(svg).toContain(
      'until here: planned 0.5 &lt;b&gt;&amp;; stated range 0.3 to 0.7 &lt;b&gt;&amp;; power .90',
    );
    expect(words(svg).some((text) => text.endsWith('…'))).toBe(true);
  });

  it('refuses values that cannot be drawn, and a plot of nothing', () => {
    expect(() => plot({ ...slope, planned: Number.NaN })).toThrow(/rows is NaN/);
    expect(() => plot({ ...slope, high: Number.POSITIVE_INFINITY })).toThrow(RangeError);
    expect(() => plot()).toThrow(/rows is empty/);
  });

  it('keeps the rules, with each limit at its own pole, wherever two limits lie', () => {
    const value = fc.integer({ min: 0, max: 400 }).map((step) => step / 400);
    const text = fc.constantFrom('0.5', '0.123', '12.3 %', '0.000 012 3 of an extraordinarily long unit');
    const limit = fc.record({ floor: fc.constantFrom('power .80', 'width 3.25 points'), value, text });
    const rows = fc.array(fc.record({ planned: value, limits: fc.tuple(limit, limit) }), {
      minLength: 1,
      maxLength: 4,
    });
    fc.assert(
      fc.property(rows, (some) => {
        const svg = plot(...some.map((row) => ({ ...slope, ...row, low: 0, high: 1 })));
        expectSoundFigure(svg, 'tide-margins');
        expect(ticksOf(svg)).toHaveLength(2 * some.length);
      }),
      { numRuns: 60 },
    );
  });
});
