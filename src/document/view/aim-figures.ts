/** The two figures of an aim: what the Markdown names, and what is drawn. */

import type { AimSensitivity } from '../../sensitivity/sensitivity.ts';
import type { Study } from '../../spec/study.ts';
import { marginPlot } from '../figures/margin-plot.ts';
import { powerCurve } from '../figures/power-curve.ts';
import { formatPercent } from '../numbers.ts';
import { achievedText } from './achieved.ts';
import { limitText } from './aim-tables.ts';
import {
  computedNumber,
  powerTarget,
  rangeText,
  typedNumber,
  unitsOf,
  unitText,
  withUnit,
} from './wording.ts';

export interface Figure {
  /** File name, `ventilation-power.svg`. */
  name: string;
  title: string;
  svg: string;
}

/** Markdown that shows the figures; null where there is nothing to draw. */
export function figureReferences(sensitivity: AimSensitivity, words: Study) {
  const [curve, margins] = [curveFigure(sensitivity, words), marginFigure(sensitivity, words)];
  const reference = (figure: Figure | null) =>
    figure === null ? null : `![${figure.title}](${figure.name})`;
  return { curve: reference(curve), margins: reference(margins) };
}

export function figuresOf(sensitivity: AimSensitivity, words: Study): Figure[] {
  return [curveFigure(sensitivity, words), marginFigure(sensitivity, words)].filter(
    (figure) => figure !== null,
  );
}

function curveFigure({ curve, plan }: AimSensitivity, words: Study): Figure | null {
  const { planned, target, method, aim } = plan;
  if (curve === null || planned.achieved === null) return null;
  const isPower = method.achieves === 'power';
  const what = isPower ? 'Power' : 'Width of the interval';
  const { sample } = words;
  const quantity = Object.values(aim.quantities).find(({ key }) => key === aim.effectKeys[0]);
  const range = quantity === undefined ? null : rangeText(quantity);
  const band = !curve.hasBand || quantity === undefined ? null : `${quantity.title} ${range}`;
  const title = `${what} of the aim “${aim.id}” against the number analysed`;
  return {
    name: `${aim.id}-${isPower ? 'power' : 'width'}.svg`,
    title,
    svg: powerCurve({
      prefix: `${aim.id}-curve`,
      title,
      description: `With ${planned.n} ${sample.unit} analysed the ${isPower ? 'power' : 'width'} is ${achievedText(plan, planned.achieved)}${target === null ? '' : `; the target is ${typedNumber(target, '')}`}.${band === null ? '' : ` The band shows ${band}.`}`,
      xLabel: `${sample.unit} analysed`,
      yLabel: isPower ? 'power' : 'full width of the interval',
      points: curve.points,
      target,
      planned: { n: planned.n, value: planned.achieved },
      band,
    }),
  };
}

function marginFigure({ margins, plan }: AimSensitivity, words: Study): Figure | null {
  const first = margins[0];
  if (first === undefined || first.limits.length === 0) return null;
  const { aim, method } = plan;
  const units = unitsOf(aim);
  const title = `How far the assumptions of the aim “${aim.id}” can slip`;
  return {
    name: `${aim.id}-margins.svg`,
    title,
    svg: marginPlot({
      prefix: `${aim.id}-margins`,
      title,
      description: `For each assumption its planned value, its stated range, and where the planned study falls below ${first.limits.map(({ floor }) => typedNumber(floor, '')).join(' and ')}.`,
      rows: margins.map(({ quantity, stage, limits }) => {
        const unit = unitText(quantity.unit, units);
        const loss = words.sample.losses.find(({ proportion }) => proportion.path === quantity.path);
        const text = (value: number) =>
          stage === null
            ? withUnit(computedNumber(value, quantity.unit), unit)
            : formatPercent(Number(value.toPrecision(3)));
        return {
          label: stage === null ? quantity.title : `lost: ${loss?.stage ?? stage}`,
          unit,
          planned: quantity.value,
          plannedText: text(quantity.value),
          limits: limits.map((limit) => ({
            floor:
              method.achieves === 'power'
                ? `power ${powerTarget(limit.floor)}`
                : `width ${achievedText(plan, limit.floor)}`,
            value: limit.value,
            text: limitText(limit, text),
          })),
          low: quantity.low,
          high: quantity.high,
        };
      }),
    }),
  };
}
