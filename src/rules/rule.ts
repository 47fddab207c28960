/** The interface a rule fills: one small module a rule, all listed in rules.ts. */

import type { Source } from '../methods/method.ts';
import type { AimPlan, StudyPlan } from '../plan/plan.ts';
import type { Study } from '../spec/study.ts';

/** What a rule found. */
export interface Finding {
  /** Path in the spec the finding is about, such as `aims[0].inputs.effect`. */
  path: string;
  /** Id of the aim; null for the study. */
  aim: string | null;
  /** What is wrong with this spec, with its numbers, and what to do: one to three sentences. */
  message: string;
  /** When it differs from the rule's own level. */
  level?: Level;
}

export type Level = 'error' | 'warning' | 'note';

export interface Rule {
  /** Stable id, such as M14. */
  readonly id: string;
  readonly level: Level;
  /** Noun phrase or short sentence naming what holds. */
  readonly title: string;
  /** One paragraph on why it matters. */
  readonly why: string;
  /** Where the rule comes from; empty where it is arithmetic or common practice. */
  readonly sources: readonly Source[];
  /** 'arithmetic', 'common practice, no source', or null when `sources` says it. */
  readonly ground: string | null;
  /** Rules on the spec as normalised, run before any number is computed. */
  checkStudy?(study: Study): Finding[];
  /** Rules that need the plan. */
  checkPlan?(plan: StudyPlan): Finding[];
  checkAim?(aim: AimPlan, plan: StudyPlan): Finding[];
}
