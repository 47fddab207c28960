/** How the pages word values, units and grounds: one place, one choice. */

import type { Equivalent } from '../../methods/method.ts';
import type { Aim, Basis, Quantity, Role } from '../../spec/study.ts';
import { formatExact, formatProbability, formatSignificant } from '../numbers.ts';

const BASES: Record<Basis, string> = {
  'smallest-effect-of-interest': 'the smallest effect of interest',
  'published-estimate': 'a published estimate',
  'meta-analysis': 'the estimate of a meta-analysis',
  'pilot-data': 'an estimate from pilot data',
  'routine-data': 'taken from routine data',
  'expert-judgement': 'a judgement of experts',
  convention: 'a convention',
};

export function basisText(basis: Basis | null): string | null {
  return basis === null ? null : BASES[basis];
}

const ROLES: Record<Role, string> = {
  primary: 'Primary',
  'key-secondary': 'Key secondary',
  secondary: 'Secondary',
  exploratory: 'Exploratory',
};

export function roleTitle(role: Role): string {
  return ROLES[role];
}

/** Digits of a number that was computed and is read, not typed. */
const COMPUTED_DIGITS = 3;

/** A number as the author typed it. Numbers without a unit are written without a leading zero. */
export function typedNumber(value: number, unit: string): string {
  return pure(formatExact(value), unit);
}

/** A computed number for reading, on the side of its target where there is one. */
export function computedNumber(value: number, unit: string, target?: number): string {
  return pure(formatSignificant(value, COMPUTED_DIGITS, target), unit);
}

function pure(text: string, unit: string): string {
  return unit === '' ? text.replace(/^(−?)0\./, '$1.') : text;
}

/** A target power or a floor: two decimals at least, all that were given. */
export function powerTarget(value: number): string {
  const exact = formatProbability(value);
  return /^\.\d$/.test(exact) ? `${exact}0` : exact;
}

/** Units of an aim's variables, as its author writes them; '' where they are not stated. */
export interface Units {
  outcome: string;
  predictor: string;
  moderator: string;
}

export function unitsOf(aim: Aim): Units {
  const named = aim.inputs as { predictor?: { unit?: string }; moderator?: { unit?: string } };
  return {
    outcome: aim.outcome.unit,
    predictor: named.predictor?.unit ?? '',
    moderator: named.moderator?.unit ?? '',
  };
}

/** The unit that the schema names by its variable, or by two of them: `outcome/predictor`. */
export function unitText(unit: string, units: Units): string {
  if (unit === 'outcome/predictor')
    return `${units.outcome} per ${units.predictor || 'unit of the predictor'}`;
  return unit === '' ? '' : units[unit as keyof Units];
}

export function withUnit(text: string, unit: string): string {
  return unit === '' ? text : `${text} ${unit}`;
}

/** 'partial R² of .06', with its unit. */
export function stated(quantity: Quantity, units: Units, value = quantity.value): string {
  const text = withUnit(typedNumber(value, quantity.unit), unitText(quantity.unit, units));
  return `${quantity.title} of ${text}`;
}

export function rangeText(quantity: Quantity): string | null {
  const { low, high, unit } = quantity;
  if (low !== null && high !== null) return `${typedNumber(low, unit)} to ${typedNumber(high, unit)}`;
  if (low !== null) return `from ${typedNumber(low, unit)}`;
  if (high !== null) return `up to ${typedNumber(high, unit)}`;
  return null;
}

export function equivalentText({ meaning, value, unit }: Equivalent, units: Units): string {
  return `${meaning} of ${withUnit(computedNumber(value, unit), unitText(unit, units))}`;
}

/** The stated form first, the others in parentheses behind it. */
export function effectText(
  equivalents: readonly Equivalent[],
  leadingKey: string | null,
  units: Units,
): string {
  const leading = equivalents.find(({ key }) => key === leadingKey) ?? equivalents[0];
  if (leading === undefined) return '';
  const others = equivalents.filter((one) => one !== leading).map((one) => equivalentText(one, units));
  const text = equivalentText(leading, units);
  return others.length === 0 ? text : `${text} (${others.join('; ')})`;
}

/** The author's own sentence, with a full stop if it ends without one. */
export function sentence(text: string): string {
  return /[.!?…]["’”)]*\s*$/.test(text) ? text.trim() : `${text.trim()}.`;
}

/** 'an R² of .3', 'a slope of 2': by how the first word is spoken. */
export function withArticle(text: string): string {
  return `${/^(?:[aeiou]|R²|f²)/.test(text) ? 'an' : 'a'} ${text}`;
}

export function list(items: readonly string[], conjunction: 'and' | 'or' = 'and'): string {
  if (items.length < 2) return items.join('');
  return `${items.slice(0, -1).join(', ')} ${conjunction} ${items.at(-1)}`;
}
