/** Smallest whole number from which a condition stays true. */

export function smallestInteger(
  holds: (n: number) => boolean,
  from: number,
  limit: number,
  rises: 'always' | 'eventually',
): number {
  let low = from - 1;
  let high = from;
  for (let step = 1; !holds(high); step *= 2) {
    if (high >= limit) throw new RangeError(`smallestInteger: the condition does not hold up to ${limit}`);
    low = high;
    high = Math.min(limit, high + step);
  }
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2);
    if (holds(middle)) high = middle;
    else low = middle;
  }
  if (rises === 'always') return high;
  let last = high - 1;
  for (let n = high + 1; n <= high + 50; n += 1) if (!holds(n)) last = n;
  return last + 1;
}
