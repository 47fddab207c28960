/** Schema errors → Problems: one sentence each, in our words, with no error that only follows from another. */

import { methodInputs } from '../generated/inputs.ts';
import { type SchemaError, validateSharedAim, validateSpec } from '../generated/validate-spec.js';
import type { Problem } from '../problem.ts';
import { allowed, knownKeys, type SchemaNode, typesOf } from './allowed.ts';
import { formMessage } from './effect-form.ts';
import { errorAt } from './error-at.ts';
import { LIMITS } from './limits.ts';
import type { MethodInputs } from './method-inputs.ts';
import { nearest } from './nearest.ts';
import { formatPath, type Segments } from './path.ts';
import { schemaOf, schemaOfKey } from './schema-lookup.ts';
import { listed, shown, shownValue } from './shown.ts';
import { childOf, isGroup, valueAt } from './tree.ts';

/** A problem, and the path of the missing key that it accounts for: one slip of the pen is one problem. */
export interface Finding extends Problem {
  explains?: string;
}

/** Every way in which the tree departs from the schema; empty when it is a valid spec. */
export function validate(tree: unknown): Finding[] {
  if (validateSpec(tree)) return [];
  // More than can be said is not put into words: a hostile file can break every rule a hundred thousand times.
  return (validateSpec.errors ?? [])
    .slice(0, 10 * LIMITS.problems)
    .flatMap((error) => problemsOf(error, tree));
}

function problemsOf(error: SchemaError, tree: unknown): Finding[] {
  const path = segmentsOf(error.instancePath, tree);
  const problems = path[2] === 'inputs' ? effectProblems(error, path, tree) : null;
  if (problems) return problems;
  if (error.keyword === 'discriminator') return methodProblems(path, tree);
  const problem = plainProblem(error, path, tree);
  return problem ? [problem] : [];
}

function plainProblem(error: SchemaError, path: Segments, tree: unknown): Finding | null {
  const value = valueAt(tree, path);
  const schema = schemaOf(path, tree);
  switch (error.keyword) {
    case 'if':
    case 'propertyNames':
      return null;
    case 'additionalProperties':
      return unknownKey(path, String(error.params.additionalProperty), schema);
    case 'required':
    case 'dependentRequired':
      return missingKey(path, String(error.params.missingProperty), schema);
    case 'minItems':
    case 'minProperties':
      return errorAt('too-few', path, `Found ${shownValue(value)}, but at least one entry is needed.`);
    case 'maxItems':
      return errorAt(
        'too-many',
        path,
        `Found ${String((value as unknown[]).length)} entries, but at most ${String(error.params.limit)} are read.`,
      );
    case 'uniqueItems':
      return errorAt('repeated', path, `An entry is listed twice. Keep one.`);
    case 'type':
    case 'enum':
    case 'const':
    case 'minimum':
    case 'maximum':
    case 'exclusiveMinimum':
    case 'exclusiveMaximum':
    case 'minLength':
      return notAllowed(path, value, schema);
    case 'maxLength':
      return errorAt(
        'too-long',
        path,
        `The text has more than ${Number(error.params.limit).toLocaleString('en')} characters. Shorten it.`,
      );
    case 'pattern':
      // An empty text is reported once, by its length.
      return value === '' ? null : notAllowed(path, value, schema);
    default:
      return errorAt(
        'combination',
        path,
        'These keys cannot stand together like this. `samplecase methods` shows what each method takes.',
      );
  }
}

/** A value of the wrong type or out of range, or none of a choice. */
function notAllowed(path: Segments, value: unknown, schema: SchemaNode | null): Problem {
  const wanted = schema ? allowed(asSimpleAs(value, schema)) : 'another value';
  const found =
    typeof value === 'string' && value !== '' && value.trim() === '' ? 'a blank text' : shownValue(value);
  const hint = schema ? hintFor(value, schema) : '';
  return errorAt('not-allowed', path, `Found ${found}, but ${wanted} is needed.${hint && ` ${hint}`}`);
}

/** A quantity may be a number or a group of keys; to whoever wrote a number, only the number matters. */
function asSimpleAs(value: unknown, schema: SchemaNode): SchemaNode {
  const isScalar = typeof value === 'number' || typeof value === 'string';
  return isScalar && typesOf(schema).includes('number') ? { ...schema, type: 'number' } : schema;
}

/** A question or a step, where the slip is plain. Nothing is repaired: the author decides. */
function hintFor(value: unknown, schema: SchemaNode): string {
  const types = typesOf(schema);
  const choices = (Array.isArray(schema.enum) ? schema.enum : []).filter((item) => typeof item === 'string');
  if (typeof value === 'string' && choices.length > 0) {
    const near = nearest(value, choices);
    return near ? `Did you mean ${shown(near)}?` : '';
  }
  if (types.includes('number') || types.includes('integer')) return numberHint(value, schema);
  if (types.length !== 1) return '';
  if (types[0] === 'string' && (typeof value === 'number' || typeof value === 'boolean')) {
    return 'Put it in quotation marks.';
  }
  const entries = isGroup(schema.items) ? typesOf(schema.items) : [];
  if (types[0] === 'array' && entries.includes(typeof value)) {
    return `Write it as a list: [${shownValue(value)}].`;
  }
  return '';
}

function numberHint(value: unknown, schema: SchemaNode): string {
  const isProportion = (schema.exclusiveMaximum ?? schema.maximum) === 1;
  const percent = (number: number): string =>
    isProportion && number > 1 && number <= 100
      ? `Is ${number} % meant? Then write ${hundredth(number)}.`
      : '';
  if (typeof value === 'number') return percent(value);
  // A number is short; on a long text the patterns below could take minutes.
  if (typeof value !== 'string' || value.length > 40) return '';
  const text = value.trim();
  if (/^[-+]?(\d+\.?\d*|\.\d+)(e[-+]?\d+)?$/i.test(text) && Number.isFinite(Number(text)))
    return 'Write it without quotation marks.';
  const inPercent = /^(\d+(?:[.,]\d+)?)\s*%$/.exec(text)?.[1];
  if (inPercent)
    return percent(Number(inPercent.replace(',', '.'))) || 'Write it as a proportion, without the sign.';
  if (/^[-+]?\d*,\d+$/.test(text)) return 'Write the decimal sign as a point, and no thousands separator.';
  return '';
}

/** A hundredth in decimals: 7 → 0.07, where a division alone may leave 0.07000000000000001. */
function hundredth(value: number): number {
  return Number((value / 100).toPrecision(12));
}

function unknownKey(path: Segments, key: string, schema: SchemaNode | null): Finding {
  const known = knownKeys(schema);
  const holder = known.find((name) => schemaOfKey(schemaOfKey(schema, name), key));
  const near = nearest(key, known);
  const step = holder
    ? `It belongs under ${holder}.`
    : near
      ? `Did you mean ${shown(near)}?`
      : `Known keys are ${listed(known, 'and')}.`;
  const found = errorAt('unknown-key', [...path, key], `The key ${shown(key)} is not known here. ${step}`);
  const meant = holder ? [...path, holder, key] : near ? [...path, near] : null;
  return meant ? { ...found, explains: formatPath(meant) } : found;
}

function missingKey(path: Segments, key: string, schema: SchemaNode | null): Problem {
  const wanted = schemaOfKey(schema, key);
  const takes = wanted ? ` It takes ${allowed(wanted)}.` : '';
  const meaning = typeof wanted?.description === 'string' ? ` ${wanted.description}` : '';
  return errorAt('missing-key', [...path, key], `The key ${shown(key)} is missing.${takes}${meaning}`);
}

/** What is wrong with the form of an effect, or that it is missing; null for an error that is about neither.
 *  The forms are alternatives in the schema: one problem speaks for all that none of them fits. */
function effectProblems(error: SchemaError, path: Segments, tree: unknown): Problem[] | null {
  const inputs = inputsOf(path, tree);
  if (!inputs) return null;
  if (path.length === 3 && error.params.missingProperty === 'effect') {
    return [errorAt('missing-key', [...path, 'effect'], formMessage([], inputs.forms))];
  }
  const effect = valueAt(tree, path);
  const isAboutForms = path.length === 4 && path[3] === 'effect' && error.keyword !== 'additionalProperties';
  if (!isAboutForms || !isGroup(effect)) return null;
  const keys = Object.keys(effect);
  const known = keys.filter((key) => inputs.forms.some((form) => form.keys.includes(key)));
  const isMixed =
    known.length > 0 && !inputs.forms.some((form) => known.every((key) => form.keys.includes(key)));
  // A key that is not known is a problem of its own, and the form may be right once it is mended.
  if (known.length < keys.length && !isMixed) return [];
  return [errorAt('effect-form', path, formMessage(keys, inputs.forms))];
}

function inputsOf(path: Segments, tree: unknown): MethodInputs | null {
  const method = valueAt(tree, [...path.slice(0, 2), 'method']);
  return typeof method === 'string' && Object.hasOwn(methodInputs, method)
    ? methodInputs[method as keyof typeof methodInputs]
    : null;
}

/** An unknown method, and what is wrong with the keys that all methods share. */
function methodProblems(path: Segments, tree: unknown): Finding[] {
  const aim = valueAt(tree, path);
  const method = childOf(aim, 'method');
  const names = Object.keys(methodInputs);
  const problems: Finding[] = [];
  if (method !== undefined) {
    const near = typeof method === 'string' ? nearest(method, names) : null;
    const step = near ? `Did you mean ${shown(near)}?` : `Methods are ${listed(names, 'and')}.`;
    problems.push(
      errorAt(
        'unknown-method',
        [...path, 'method'],
        `Found ${shownValue(method)}, which is no method. ${step}`,
      ),
    );
  }
  if (validateSharedAim(aim)) return problems;
  for (const shared of validateSharedAim.errors ?? []) {
    const inAim = segmentsOf(shared.instancePath, aim);
    const isAboutMethod = inAim[0] === 'method' || shared.params.missingProperty === 'method';
    const found = isAboutMethod ? null : plainProblem(shared, [...path, ...inAim], tree);
    if (found) problems.push(found);
  }
  return problems;
}

/** A JSON pointer as segments; a number where the node around it is a list. */
function segmentsOf(pointer: string, tree: unknown): (string | number)[] {
  const segments: (string | number)[] = [];
  let value = tree;
  for (const part of pointer.split('/').slice(1)) {
    const key = part.replaceAll('~1', '/').replaceAll('~0', '~');
    const segment = Array.isArray(value) ? Number(key) : key;
    segments.push(segment);
    value = childOf(value, segment);
  }
  return segments;
}
