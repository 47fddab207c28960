/** One check per kind of argument. Every function of numeric/ refuses in the same words:
 *  "tQuantile: p is 1.5; a number above 0 and below 1 is needed". NaN fails every check. */

/** The one form of a refusal, for domains that the checks below do not cover. */
export function refuse(functionName: string, argument: string, value: number, needed: string): never {
  throw new RangeError(`${functionName}: ${argument} is ${value}; ${needed} is needed`);
}

export function requireFinite(functionName: string, argument: string, value: number): void {
  if (!Number.isFinite(value)) refuse(functionName, argument, value, 'a finite number');
}

export function requirePositive(functionName: string, argument: string, value: number): void {
  if (!(value > 0 && value < Infinity)) refuse(functionName, argument, value, 'a finite number above 0');
}

export function requireNonNegative(functionName: string, argument: string, value: number): void {
  if (!(value >= 0 && value < Infinity)) refuse(functionName, argument, value, 'a finite number from 0');
}

/** Both ends allowed. */
export function requireBetween(
  functionName: string,
  argument: string,
  value: number,
  lowest: number,
  highest: number,
): void {
  if (!(value >= lowest && value <= highest)) {
    refuse(functionName, argument, value, `a number from ${lowest} to ${highest}`);
  }
}

/** A value whose support starts at 0, where numbers below `lowest` would lose digits as subnormal doubles do. */
export function requireZeroOrBetween(
  functionName: string,
  argument: string,
  value: number,
  lowest: number,
  highest: number,
): void {
  if (!(value === 0 || (value >= lowest && value <= highest))) {
    refuse(functionName, argument, value, `0 or a number from ${lowest} to ${highest}`);
  }
}

/** Neither end allowed: a probability whose quantile is sought. */
export function requireProbability(functionName: string, argument: string, value: number): void {
  if (!(value > 0 && value < 1)) refuse(functionName, argument, value, 'a number above 0 and below 1');
}

export function requireWholeBetween(
  functionName: string,
  argument: string,
  value: number,
  lowest: number,
  highest: number,
): void {
  if (!(Number.isInteger(value) && value >= lowest && value <= highest)) {
    refuse(functionName, argument, value, `a whole number from ${lowest} to ${highest}`);
  }
}
