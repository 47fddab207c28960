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

/** File name and title, which the Markdown needs; null where there is nothing to draw. */
type Caption = Pick<Figure, 'name' | 'title'>;

/** Markdown that shows the figures; null where there is nothing to draw. */
export function figureReferences(sensitivity: AimSensitivity) {
  const reference = (caption: Caption | null) =>
    caption === null ? null : `![${caption.title}](${caption.name})`;
  return { curve: reference(curveCaption(sensitivity)), margins: reference(marginCaption(sensitivity)) };
}

export function figuresOf(sensitivity: AimSensitivity, words: Study): Figure[] {
  return [curveFigure(sensitivity, words), marginFigure(sensitivity, words)].filter(
    (figure) => figure !== null,
  );
}

function curveCaption({ curve, plan }: AimSensitivity): Caption | null {
  if (curve === null || plan.planned.achieved === null) return null;
  const isPower = plan.method.achieves === 'power';
  return {
    name: `${plan.aim.id}-${plan.method.achieves}.svg`,
    title: `${isPower ? 'Power' : 'Width of the interval'} of the aim “${plan.aim.id}” against the number analysed`,
  };
}

function marginCaption({ margins, plan }: AimSensitivity): Caption | null {
  if ((margins[0]?.limits.length ?? 0) === 0) return null;
  return {
    name: `${plan.aim.id}-margins.svg`,
    title: `How far the assumptions of the aim “${plan.aim.id}” can slip`,
  };
}

function curveFigure(sensitivity: AimSensitivity, words: Study): Figure | null {
  const { curve, plan } = sensitivity;
  const { planned, target, method, aim } = plan;
  const caption = curveCaption(sensitivity);
  if (caption === null || curve === null || planned.achieved === null) return null;
  const isPower = method.achieves === 'power';
  const { sample } = words;
  const quantity = Object.values(aim.quantities).find(({ key }) => key === aim.effectKeys[0]);
  const range = quantity === undefined ? null : rangeText(quantity);
  const band = !curve.hasBand || quantity === undefined ? null : `${quantity.title} ${range}`;
  return {
    ...caption,
    svg: powerCurve({
      prefix: `${aim.id}-curve`,
      title: caption.title,
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

function marginFigure(sensitivity: AimSensitivity, words: Study): Figure | null {
  const { margins, plan } = sensitivity;
  const caption = marginCaption(sensitivity);
  const [first] = margins;
  if (caption === null || first === undefined) return null;
  const { aim, method } = plan;
  const units = unitsOf(aim);
  return {
    ...caption,
    svg: marginPlot({
      prefix: `${aim.id}-margins`,
      title: caption.title,
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
