/** Recompute lines in Python with NumPy and SciPy. */

import type { Dialect } from './dialect.ts';

export const python: Dialect = {
  language: 'python',
  comment: (text) => `# ${text}`,
  preamble: [
    '# Python with NumPy and SciPy',
    'from math import ceil, exp, floor, sqrt',
    'import numpy as np',
    'from scipy import integrate, optimize, special, stats',
  ],
  assign: (name, expression) => `${name} = ${expression}`,
  number: (value) => String(value),
  define(name, parameters, body, value) {
    const head = parameters.map((one) => (one.value === undefined ? one.name : `${one.name}=${one.value}`));
    const lines = value.split('\n');
    const result = lines.at(-1) ?? '';
    return [
      `def ${name}(${head.join(', ')}):`,
      ...body.map((line) => `    ${line}`),
      ...lines.slice(0, -1).map((line) => `    ${line}`),
      `    return ${result}`,
    ];
  },
  search(name, smallest, improvesUpwards) {
    const short = improvesUpwards ? '<' : '>';
    return [
      'def needed(effect, target):',
      `    low, high = ${smallest - 1}, ${2 * smallest}`,
      `    while ${name}(high, effect) ${short} target:`,
      '        low, high = high, 2 * high',
      '    while high - low > 1:',
      '        middle = (low + high) // 2',
      `        if ${name}(middle, effect) ${short} target:`,
      '            low = middle',
      '        else:',
      '            high = middle',
      '    return high',
    ];
  },
  each: (values, variable, expression) => `[${expression} for ${variable} in [${values.join(', ')}]]`,
  call(name, positional, named = {}) {
    const given = Object.entries(named).map(([key, value]) => `${key}=${value}`);
    return `${name}(${[...positional, ...given].join(', ')})`;
  },
  root: (name, n, target, lower, upper) =>
    `optimize.brentq(lambda e: ${name}(${n}, e) - ${target}, ${lower}, ${upper}, xtol=1e-15)`,
  enrol: (evaluable, losses) =>
    losses.length === 0
      ? `ceil(${evaluable})`
      : `ceil(round(${evaluable} / (${losses.map((loss) => `(1 - ${loss})`).join(' * ')}), 6))`,
  kept: (enrolled, losses) =>
    `floor(round(${[enrolled, ...losses.map((loss) => `(1 - ${loss})`)].join(' * ')}, 6))`,
  average(name, n, key, { low, mode, high }) {
    return [
      'def weighted(x):',
      `    rising = x < ${mode}`,
      `    density = (2 * (x - ${low}) / ((${high} - ${low}) * (${mode} - ${low})) if rising`,
      `               else 2 * (${high} - x) / ((${high} - ${low}) * (${high} - ${mode})))`,
      `    return density * ${name}(${n}, effect(${key}=x))`,
      'def side(a, b):',
      '    return 0 if a == b else integrate.quad(weighted, a, b, epsrel=1e-11)[0]',
      `average = side(${low}, ${mode}) + side(${mode}, ${high})`,
    ];
  },
  averageValue: 'average',
  show: (expression, result) => `${expression}  # ${result}`,
};
