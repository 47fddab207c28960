/** What a schema cannot say, because it needs two places of the spec at once. */

import type { Problem } from '../problem.ts';
import type { Check } from './checks/check.ts';
import { aimIdsDiffer, documentKindsDiffer, referenceIdsDiffer } from './checks/duplicates.ts';
import { acknowledgedAimsExist, citationsResolve } from './checks/links.ts';
import {
  evaluableFitsTheSample,
  evaluableIsNotSoughtAndGiven,
  numberAnalysedIsKnown,
  powerIsStatedWhereNeeded,
} from './checks/numbers.ts';
import {
  askedEffectsArePossible,
  askedPowersArePossible,
  powerExceedsAlpha,
  valueLiesInItsRange,
} from './checks/ranges.ts';
import type { Reference } from './study.ts';

const CHECKS: readonly Check[] = [
  aimIdsDiffer,
  documentKindsDiffer,
  referenceIdsDiffer,
  citationsResolve,
  acknowledgedAimsExist,
  valueLiesInItsRange,
  powerExceedsAlpha,
  powerIsStatedWhereNeeded,
  evaluableIsNotSoughtAndGiven,
  numberAnalysedIsKnown,
  evaluableFitsTheSample,
  askedEffectsArePossible,
  askedPowersArePossible,
];

/** Every contradiction in the tree, which need not be a valid spec.
 *  @param references null when they could not be read */
export function findInconsistencies(tree: unknown, references: readonly Reference[] | null): Problem[] {
  return CHECKS.flatMap((check) => check(tree, references));
}
