/** Rounding, decided once. Provisional. */
const minus = (t: string) => t.replace('-', '−');
const noZero = (t: string) => t.replace(/^(−?)0\./, '$1.');
export function formatPower(value: number, target?: number): string {
  if (value > 0.9995) return '>.999';
  if (value < 0.0005) return '<.001';
  const rounded = Math.round(value * 1000) / 1000;
  const shown =
    target !== undefined && value < target && rounded >= target ? Math.floor(value * 1000) / 1000 : rounded;
  return noZero(shown.toFixed(3));
}
export function formatProbability(value: number): string {
  return noZero(minus(String(value)));
}
export function formatSignificant(value: number, digits: number): string {
  return minus(String(Number(value.toPrecision(digits))));
}
export function formatPercent(value: number): string {
  return `${minus(String(Number((100 * value).toPrecision(12))))} %`;
}
export function formatCount(value: number): string {
  return value >= 10000 ? String(value).replace(/\B(?=(\d{3})+$)/g, '\u202f') : String(value);
}
export function formatExact(value: number): string {
  return minus(String(value));
}
