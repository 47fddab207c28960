/** Recompute lines in base R: no package is loaded. */

import type { Dialect } from './dialect.ts';

export const r: Dialect = {
  language: 'r',
  comment: (text) => `# ${text}`,
  preamble: ['# base R, no package needed'],
  assign: (name, expression) => `${name} <- ${expression}`,
  number: (value) => String(value),
  define(name, parameters, body, value) {
    const head = parameters.map((one) => (one.value === undefined ? one.name : `${one.name} = ${one.value}`));
    if (body.length === 0) return [`${name} <- function(${head.join(', ')}) ${value}`];
    return [
      `${name} <- function(${head.join(', ')}) {`,
      ...body.map((line) => `  ${line}`),
      ...value.split('\n').map((line) => `  ${line}`),
      '}',
    ];
  },
  search(name, smallest, improvesUpwards) {
    const short = improvesUpwards ? '<' : '>';
    return [
      'needed <- function(effect, target) {',
      `  low <- ${smallest - 1}; high <- ${2 * smallest}`,
      `  while (${name}(high, effect) ${short} target) { low <- high; high <- 2 * high }`,
      '  while (high - low > 1) {',
      '    middle <- (low + high) %/% 2',
      `    if (${name}(middle, effect) ${short} target) low <- middle else high <- middle`,
      '  }',
      '  high',
      '}',
    ];
  },
  each: (values, variable, expression) =>
    `sapply(c(${values.join(', ')}), function(${variable}) ${expression})`,
  call(name, positional, named = {}) {
    const given = Object.entries(named).map(([key, value]) => `${key} = ${value}`);
    return `${name}(${[...positional, ...given].join(', ')})`;
  },
  root: (name, n, target, lower, upper) =>
    `uniroot(function(e) ${name}(${n}, e) - ${target}, c(${lower}, ${upper}), tol = 1e-15)$root`,
  enrol: (evaluable, losses) =>
    losses.length === 0
      ? `ceiling(${evaluable})`
      : `ceiling(round(${evaluable} / (${losses.map((loss) => `(1 - ${loss})`).join(' * ')}), 6))`,
  kept: (enrolled, losses) =>
    `floor(round(${[enrolled, ...losses.map((loss) => `(1 - ${loss})`)].join(' * ')}, 6))`,
  average(name, n, key, { low, mode, high }) {
    return [
      'weighted <- Vectorize(function(x) {',
      `  rising <- x < ${mode}`,
      `  density <- if (rising) 2 * (x - ${low}) / ((${high} - ${low}) * (${mode} - ${low}))`,
      `             else 2 * (${high} - x) / ((${high} - ${low}) * (${high} - ${mode}))`,
      `  density * ${name}(${n}, effect(${key} = x))`,
      '})',
      `side <- function(a, b) if (a == b) 0 else integrate(weighted, a, b, rel.tol = 1e-11)$value`,
      `average <- side(${low}, ${mode}) + side(${mode}, ${high})`,
    ];
  },
  averageValue: 'average',
  show: (expression, result) => `${expression}  # ${result}`,
};
