/** Exact parts of sums and products of doubles, for the few places where one rounding would be seen: a
 *  number is carried as the unevaluated sum of a double and a far smaller one. */

/** What a + b lost when it was rounded to `sum`. Source: Knuth (1969), section 4.2.2, theorem B. */
export function sumError(a: number, b: number, sum: number): number {
  const bPart = sum - a;
  return a - (sum - bPart) + (b - bPart);
}

/** What a·b lost when it was rounded to `product`; |a|, |b| below 1e290 and the product above 1e-290.
 *  Source: Dekker (1971), A floating-point technique for extending the available precision, mul12. */
export function productError(a: number, b: number, product: number): number {
  const aSplit = 134217729 * a;
  const aHead = aSplit - (aSplit - a);
  const aTail = a - aHead;
  const bSplit = 134217729 * b;
  const bHead = bSplit - (bSplit - b);
  const bTail = b - bHead;
  return aTail * bTail - (product - aHead * bHead - aTail * bHead - aHead * bTail);
}

/** What (n + nLow)/(d + dLow) lost when it was rounded to `quotient`. */
export function quotientError(n: number, nLow: number, d: number, dLow: number, quotient: number): number {
  const product = quotient * d;
  return (n - product - productError(quotient, d, product) + nLow - quotient * dLow) / d;
}
