import { describe, expect, test } from 'vitest';
import { planStudy } from '../../src/plan/plan-study.ts';
import { type AimSensitivity, sensitivityOf } from '../../src/sensitivity/sensitivity.ts';
import { parseSpec } from '../../src/spec/parse.ts';
import { type NestedChanges, nestedSpec } from '../support/nested-spec.ts';

function tablesOf(changes: NestedChanges = {}): AimSensitivity {
  const { study } = parseSpec(JSON.stringify(nestedSpec(changes)));
  if (study === null) throw new Error('no study');
  const plan = planStudy(study);
  const [aim] = plan.aims;
  if (aim === undefined) throw new Error('no aim');
  return sensitivityOf(aim, plan);
}

const tables = tablesOf();
const { plan } = tables;

describe('the table of required numbers', () => {
  const { required } = tables;

  test('its axes come from low, value and high, and from the target', () => {
    expect(required?.effects).toEqual([0.04, 0.05, 0.06, 0.075, 0.09]);
    expect(required?.targets).toEqual([0.8, 0.85, 0.9, 0.95]);
  });

  test('the marked cell is the headline', () => {
    const { row, column } = required?.planned ?? { row: -1, column: -1 };
    expect(required?.cells[row]?.[column]).toBe(plan.own.n);
  });

  test('.04 in place of .06 needs 353 (computed with base distribution functions)', () => {
    expect(required?.cells[0]?.[2]).toBe(353);
  });

  test('every cell is the smallest number that meets its target', () => {
    required?.effects.forEach((r2, row) => {
      required.targets.forEach((target, column) => {
        const n = required.cells[row]?.[column] ?? 0;
        expect(plan.calculation.achieved(n, r2 / (1 - r2))).toBeGreaterThanOrEqual(target);
        expect(plan.calculation.achieved(n - 1, r2 / (1 - r2))).toBeLessThan(target);
      });
    });
  });

  test('asked-for axes are taken, and the plan stays among them', () => {
    const asked = tablesOf({ sensitivity: { effects: [0.02, 0.1], targets: [0.7] } }).required;
    expect(asked?.effects).toEqual([0.02, 0.06, 0.1]);
    expect(asked?.targets).toEqual([0.7, 0.9]);
  });

  test('without a range the axis is multiples of the value', () => {
    expect(tablesOf({ partialR2: 0.06 }).required?.effects).toEqual([0.03, 0.045, 0.06, 0.075, 0.09]);
  });

  test('a value so large that its multiples leave the range keeps only those within', () => {
    expect(tablesOf({ partialR2: 0.8 }).required?.effects).toEqual([0.4, 0.6, 0.8]);
  });
});

describe('the table of power under losses', () => {
  test('the marked cell is the power of the plan, and each loss leaves whole people', () => {
    const { power } = tables;
    const { row, column } = power?.planned ?? { row: -1, column: -1 };
    expect(power?.cells[row]?.[column]).toBe(plan.planned.achieved);
    expect(power?.evaluable[column]).toBe(235);
    expect(power?.losses).toEqual([0.1, 0.15, 0.164, 0.2, 0.25, 0.35]);
    // 282 enrolled: 253.8, 239.7, (planned), 225.6, 211.5, 183.3
    expect(power?.evaluable).toEqual([253, 239, 235, 225, 211, 183]);
  });
});

describe('ranges', () => {
  const { ranges } = tables;

  test('are ranked by how much they move the number to enrol', () => {
    expect(ranges?.rows.map(({ quantity }) => quantity.path)).toEqual([
      'aims[0].inputs.effect.partial_r2',
      'sample.losses[0].proportion',
    ]);
  });

  test('a lower effect is unfavourable: 353 to analyse, power .728 of the plan', () => {
    const [first] = ranges?.rows ?? [];
    expect(first?.unfavourable).toBe('low');
    expect(first?.low?.required?.evaluable).toBe(353);
    expect(first?.low?.achieved).toBeCloseTo(0.728, 3);
  });

  test('a larger loss is unfavourable, and all ends together are worse than each', () => {
    const [effect, loss] = ranges?.rows ?? [];
    expect(loss?.unfavourable).toBe('high');
    // 235 / (.80 · .95) = 309.2
    expect(loss?.high?.required).toEqual({ evaluable: 235, enrol: 310 });
    const all = ranges?.allUnfavourable?.required?.enrol ?? 0;
    expect(all).toBeGreaterThan(effect?.low?.required?.enrol ?? 0);
    // 353 / (.80 · .95) = 464.5
    expect(all).toBe(465);
  });

  test('where the number is given they are ranked by what is achieved', () => {
    const given = tablesOf({ find: 'power', evaluable: 235 }).ranges;
    expect(given?.rows[0]?.low?.required).toBeNull();
    expect(given?.rows[0]?.low?.achieved).toBeCloseTo(0.728, 3);
  });

  test('there are none without a stated range', () => {
    expect(tablesOf({ partialR2: 0.06, sample: {} }).ranges).toBeNull();
  });
});

describe('margins', () => {
  test('power is .80 at a partial R² of .047', () => {
    const limit = tables.margins[0]?.limits[0];
    expect(limit?.floor).toBe(0.8);
    expect(limit?.value).toBeCloseTo(0.047, 3);
    const r2 = limit?.value ?? 0;
    expect(plan.calculation.achieved(235, r2 / (1 - r2))).toBeCloseTo(0.8, 12);
  });

  test('a loss at its limit leaves just as many as the floor needs', () => {
    const loss = tables.margins.find(({ stage }) => stage === 'declines to take part')?.limits[0]?.value ?? 0;
    const needed = tables.required?.cells[2]?.[0] ?? 0;
    expect(282 * (1 - loss) * 0.95).toBeCloseTo(needed, 9);
  });

  test('floors are .80 and .10 below the target, each once', () => {
    const floors = (power: number) =>
      tablesOf({ criteria: { alpha: 0.05, power } }).margins[0]?.limits.map(({ floor }) => floor);
    expect(floors(0.9)).toEqual([0.8]);
    expect(floors(0.95)).toEqual([0.85, 0.8]);
    expect(floors(0.8)).toEqual([0.8, 0.7]);
  });

  test('a study that is already below a floor says so', () => {
    const short = tablesOf({ find: 'power', evaluable: 100 });
    expect(short.margins[0]?.limits[0]).toMatchObject({ value: null, reason: 'already-below' });
  });
});

describe('expected power', () => {
  test('lies between the powers at the ends of the range, and equals a plain sum over a fine grid', () => {
    const expected = tables.assurance?.expected ?? 0;
    // Midpoint rule with 20 000 cells on the triangular density, written out.
    const [low, mode, high] = [0.04, 0.06, 0.09];
    const cells = 20_000;
    let sum = 0;
    for (let i = 0; i < cells; i += 1) {
      const r2 = low + ((high - low) * (i + 0.5)) / cells;
      const height = 2 / (high - low);
      const density =
        r2 < mode ? (height * (r2 - low)) / (mode - low) : (height * (high - r2)) / (high - mode);
      sum += (density * plan.calculation.achieved(235, r2 / (1 - r2)) * (high - low)) / cells;
    }
    expect(expected).toBeCloseTo(sum, 7);
  });

  test('is not given without a range', () => {
    expect(tablesOf({ partialR2: 0.06 }).assurance).toBeNull();
  });
});

describe('the curve', () => {
  test('holds the planned point, rises, and keeps its band in order', () => {
    const points = tables.curve?.points ?? [];
    expect(points.find(({ n }) => n === 235)?.value).toBe(plan.planned.achieved);
    points.slice(1).forEach((point, index) => {
      expect(point.value).toBeGreaterThan(points[index]?.value ?? 1);
      expect(point.low ?? 1).toBeLessThan(point.value);
      expect(point.high ?? 0).toBeGreaterThan(point.value);
    });
  });
});

describe('the table of detectable effects', () => {
  test('falls with the number analysed, rises with the power, and its marked cell is that of the plan', () => {
    const { detectable } = tables;
    const { row, column } = detectable?.planned ?? { row: -1, column: -1 };
    expect(detectable?.cells[row]?.[column]).toBe(plan.planned.detectable);
    expect(detectable?.numbers).toEqual([176, 212, 235, 259, 294]);
    const cells = detectable?.cells ?? [];
    cells.slice(1).forEach((cellsOfRow, index) => {
      expect(cellsOfRow[0] ?? 1).toBeLessThan(cells[index]?.[0] ?? 0);
      expect(cellsOfRow[1] ?? 0).toBeGreaterThan(cellsOfRow[0] ?? 1);
    });
  });
});
