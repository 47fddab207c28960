import type { StudyPlan } from '../plan/plan.ts';
import type { Study } from '../spec/study.ts';
import type { Level, Rule } from './rule.ts';
export interface Judgement { rule: string; level: Level; path: string; aim: string | null; message: string; acknowledged: string | null }
export const rules: readonly Rule[] = [];
export const judgeStudy = (_s: Study): Judgement[] => [];
export const judgePlan = (_p: StudyPlan): Judgement[] => [];
