/** What a style of citation has to give. */

import type { Reference } from '../../spec/study.ts';

/** A reference that the document cites. */
export interface Work {
  reference: Reference;
  /** Place in the order of first use, from 1. */
  number: number;
  /** 'a', 'b', … where several references share authors and year; else ''. */
  suffix: string;
}

export interface Style {
  /** Inside brackets or parentheses: 'Cohen, 1988; Green, 1991' or '1–3'. */
  inText(works: readonly Work[]): string;
  /** Brackets or parentheses around it. */
  enclosed(inText: string): string;
  /** As part of a sentence: 'Cohen (1988)' or 'Cohen [1]'. */
  narrative(work: Work): string;
  /** The list of references, in the order of the style. */
  list(works: readonly Work[]): string[];
}
