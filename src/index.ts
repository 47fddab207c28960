/** Samplecase as a library: a spec in, problems, numbers and documents out. Nothing here touches disk, network or
 *  clock, on import or later. */

import { type RenderedDocument, renderDocuments } from './document/document.ts';
import type { TemplateSet } from './document/templates.ts';
import type { ResultJson } from './generated/result.ts';
import { type Problem, ProblemError } from './problem.ts';
import { buildReport, type Report, withSensitivities } from './report.ts';
import { toResult } from './result.ts';
import type { Judgement } from './rules/rules.ts';
import { parseSpec } from './spec/parse.ts';
import { inFileOrder } from './spec/positions.ts';
import type { DocumentFormat, DocumentKind } from './spec/study.ts';

export { type NumbersTable, numbersTable } from './document/numbers-table.ts';
export { sourceTitle } from './document/source-title.ts';
export { methods } from './generated/catalogue.ts';
export { methodInputs } from './generated/inputs.ts';
export { newSpecs } from './generated/new-specs.ts';
export type { ResultJson } from './generated/result.ts';
export type { MethodName, Spec } from './generated/spec.ts';
export { version } from './generated/version.ts';
export type { Method } from './methods/method.ts';
export { type Problem, ProblemError } from './problem.ts';
export type { Report } from './report.ts';
export type { Rule } from './rules/rule.ts';
export { rules } from './rules/rules.ts';
export type { DocumentFormat, DocumentKind, DocumentRequest, Study } from './spec/study.ts';
export type { RenderedDocument, TemplateSet };
export { toResult };

export interface SpecOptions {
  /** Name of the spec's file, for messages. */
  file?: string;
  /** Gives the text of the file of references that the spec names; without it such a spec is refused. */
  readReferences?: (path: string) => string;
}

export interface Checked {
  /** Everything found, in the order of the file; levels error, warning and note. */
  problems: Problem[];
  /** null when the spec cannot be planned. */
  report: Report | null;
}

/** Read a spec (YAML or JSON text, or the object it denotes), plan it and hold it against the rules. Never throws
 *  for what a spec holds. */
export function check(spec: string | object, options: SpecOptions = {}): Checked {
  const text = typeof spec === 'string' ? spec : JSON.stringify(spec);
  const { study, problems, locate } = parseSpec(text, options);
  if (study === null) return { problems, report: null };
  try {
    const report = buildReport(study);
    const found = [...report.judgements.map(toProblem), ...infeasible(report)];
    return { problems: inFileOrder([...problems, ...found.map(locate)]), report };
  } catch (error) {
    if (!(error instanceof ProblemError)) throw error;
    return { problems: inFileOrder([...problems, ...error.problems.map(locate)]), report: null };
  }
}

/** The numbers of a study, as `solve --json` prints them. @throws ProblemError when the spec cannot be planned. */
export function solve(spec: string | object, options: SpecOptions = {}): ResultJson {
  return toResult(plannable(spec, options));
}

export interface RenderOptions extends SpecOptions {
  /** Precompiled templates that replace ours path by path. */
  templates?: TemplateSet;
}

/** One document of a study. Words and citation style are those the spec asks for that kind, else the defaults.
 *  @throws ProblemError when the spec cannot be planned or breaks a rule of level error. */
export function render(
  spec: string | object,
  kind: DocumentKind,
  format: DocumentFormat,
  options: RenderOptions = {},
): RenderedDocument {
  const report = plannable(spec, options);
  const asked = report.study.documents.find((document) => document.kind === kind);
  const request = { kind, words: null, citations: 'apa' as const, ...asked, formats: [format] };
  const [document] = renderDocuments(withSensitivities(report), [request], options.templates ?? {});
  if (document === undefined) throw new Error(`no document for format ${format}`);
  return document;
}

/** Every document the spec asks for. The report is that of `check`. */
export function renderAll(report: Report, templates: TemplateSet = {}): RenderedDocument[] {
  return renderDocuments(withSensitivities(report), report.study.documents, templates);
}

function plannable(spec: string | object, options: SpecOptions): Report {
  const { problems, report } = check(spec, options);
  const errors = problems.filter(({ level, code }) => level === 'error' && code !== INFEASIBLE);
  if (report === null || errors.length > 0) throw new ProblemError(errors);
  return report;
}

/** Code of the problem that the stated maximum is too small: documents are still written, and say so. */
export const INFEASIBLE = 'infeasible';

function infeasible({ plan }: Report): Problem[] {
  if (plan.shortfall === null) return [];
  const { maximum, evaluable } = plan.shortfall;
  return [
    {
      level: 'error',
      code: INFEASIBLE,
      path: 'sample.maximum',
      message: `${plan.enrol} are needed and at most ${maximum} can be had, which leaves ${evaluable} of ${plan.evaluable} for the analysis: the study as specified is not feasible.`,
    },
  ];
}

function toProblem({ rule, level, path, message, acknowledged }: Judgement): Problem {
  const answered = acknowledged === null ? {} : { acknowledged };
  return { level: acknowledged === null ? level : 'note', code: rule, path, message, ...answered };
}
