/** What a curve is drawn from. */

export interface PowerCurvePoint {
  n: number;
  value: number;
  /** With the effect at the ends of its stated range; null where the end is not stated or reaches nothing. */
  low: number | null;
  high: number | null;
}

export interface PowerCurveData {
  prefix: string;
  title: string;
  description: string;
  xLabel: string;
  yLabel: string;
  /** In the order of `n`. */
  points: PowerCurvePoint[];
  target: number | null;
  planned: { n: number; value: number };
  /** What the band shows; null draws no band. */
  band: string | null;
}
