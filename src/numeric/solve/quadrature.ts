/** Adaptive Gauss–Kronrod. Provisional. */

const X = [
  0.991455371120812639206854697526329, 0.949107912342758524526189684047851,
  0.864864423359769072789712788640926, 0.741531185599394439863864773280788, 0.586087235467691130294144691693,
  0.405845151377397166906606412076961, 0.207784955007898467600689403773245, 0,
];
const K = [
  0.02293532201052922496373200805897, 0.063092092629978553290700663189204,
  0.104790010322250183839876322541518, 0.140653259715525918745189590510238,
  0.16900472663926790282658342659855, 0.190350578064785409913256402421014,
  0.204432940075298892414161999234649, 0.209482141084727828012999174891714,
];
const G = [
  0, 0.129484966168869693270611432679082, 0, 0.27970539148927666790146777142378, 0,
  0.381830050505118944950369775488975, 0, 0.417959183673469387755102040816327,
];

export function integrate(
  f: (x: number) => number,
  lower: number,
  upper: number,
  options: { relativeTolerance?: number } = {},
): number {
  const { relativeTolerance = 1e-12 } = options;
  const piece = (a: number, b: number) => {
    const c = (a + b) / 2;
    const h = (b - a) / 2;
    let k = 0;
    let g = 0;
    X.forEach((x, i) => {
      const v = x === 0 ? f(c) : f(c - h * x) + f(c + h * x);
      k += (K[i] ?? 0) * v;
      g += (G[i] ?? 0) * v;
    });
    return { k: k * h, e: Math.abs(k - g) * h };
  };
  const whole = piece(lower, upper);
  const go = (a: number, b: number, p: { k: number; e: number }, depth: number): number => {
    if (p.e <= relativeTolerance * Math.abs(whole.k) || depth > 40) return p.k;
    const c = (a + b) / 2;
    return go(a, c, piece(a, c), depth + 1) + go(c, b, piece(c, b), depth + 1);
  };
  return go(lower, upper, whole, 0);
}
