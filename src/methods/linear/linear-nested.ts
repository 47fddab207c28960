/** Provisional. */
import type { LinearNestedInputs } from '../../generated/spec.ts';
import { fTestPower, sampledFTestPower } from '../../numeric/power/f-test.ts';
import { betaUpperQuantile } from '../../numeric/distributions/beta.ts';
import type { Aim } from '../../spec/study.ts';
import type { Calculation, EffectForm, Method, Step, Values } from '../method.ts';

const get = (v: Values, k: string) => v[k] ?? Number.NaN;
const forms: EffectForm[] = [
  { keys: ['partial_r2'], title: 'partial R²', toEffect: (v) => get(v, 'partial_r2') / (1 - get(v, 'partial_r2')), fromEffect: (f2) => f2 / (1 + f2), expression: 'partial_r2 / (1 - partial_r2)', inverse: 'f2 / (1 + f2)' },
  { keys: ['f2'], title: 'f²', toEffect: (v) => get(v, 'f2'), fromEffect: (f2) => f2, expression: 'f2', inverse: 'f2' },
];

export const linearNested: Method = {
  name: 'linear-nested',
  title: 'partial F test of added predictors',
  summary: 'Partial F test of predictors added to a linear model that holds others.',
  achieves: 'power',
  achievedUnit: '',
  finds: ['sample-size', 'power', 'detectable-effect'],
  effect: { variable: 'f2', symbol: 'f²', meaning: 'Cohen’s f²' },
  forms,
  formula: ['F = ((RSS_r − RSS_f)/u) / (RSS_f/v)', 'v = n − u − p − 1'],
  symbols: [{ symbol: 'u', meaning: 'predictors tested' }],
  sources: [{ key: 'gatsonis1989', of: 'exact power with sampled predictors' }],
  assumptions: [{ statement: 'the residuals are normal', ifNot: 'the test is approximate' }],
  rises: 'always',
  prepare(aim: Aim): Calculation {
    const { added: u, adjusted_for: p, predictor_values } = aim.inputs as LinearNestedInputs;
    const sampled = predictor_values !== 'fixed';
    const form = forms.find((one) => one.keys[0] === aim.effectKeys[0]) ?? null;
    const { alpha } = aim.criteria;
    const values = Object.fromEntries(Object.values(aim.quantities).map((q) => [q.key, q.value]));
    const achieved = (n: number, f2: number) => {
      const v = n - u - p - 1;
      return sampled ? sampledFTestPower(alpha, u, v, f2 / (1 + f2)) : fTestPower(alpha, u, v, f2 * n);
    };
    return {
      smallestN: u + p + 2,
      form,
      effect: form === null ? null : form.toEffect(values),
      effectAt: (v) => (form ?? forms[0]!).toEffect(v),
      achieved,
      steps(n, f2): Step[] {
        const v = n - u - p - 1;
        const mean = sampled
          ? ['0:ceiling(qnbinom(1e-17, (n - 1 - p) / 2, 1 / (1 + f2), lower.tail = FALSE))', 'np.arange(stats.nbinom.isf(1e-17, (n - 1 - p) / 2, 1 / (1 + f2)) + 1)']
          : ['0:ceiling(qpois(1e-17, f2 * n / 2, lower.tail = FALSE))', 'np.arange(stats.poisson.isf(1e-17, f2 * n / 2) + 1)'];
        return [
          { variable: 'v', symbol: 'v', meaning: 'residual degrees of freedom', formula: 'n − u − p − 1', value: v, r: 'n - u - p - 1', python: 'n - u - p - 1' },
          { variable: 'x', symbol: 'x', meaning: 'critical value on the beta scale', formula: '', value: betaUpperQuantile(alpha, u / 2, v / 2), r: 'qbeta(alpha, u / 2, v / 2, lower.tail = FALSE)', python: 'stats.beta.isf(alpha, u / 2, v / 2)' },
          { variable: 'j', symbol: 'j', meaning: 'index', formula: '', value: null, r: mean[0]!, python: mean[1]! },
          { variable: 'result', symbol: '1 − β', meaning: 'power', formula: '', value: achieved(n, f2), r: sampled ? 'sum(dnbinom(j, (n - 1 - p) / 2, 1 / (1 + f2)) * pbeta(x, u / 2 + j, v / 2, lower.tail = FALSE))' : 'sum(dpois(j, f2 * n / 2) * pbeta(x, u / 2 + j, v / 2, lower.tail = FALSE))', python: sampled ? 'float(np.sum(stats.nbinom.pmf(j, (n - 1 - p) / 2, 1 / (1 + f2)) * stats.beta.sf(x, u / 2 + j, v / 2)))' : 'float(np.sum(stats.poisson.pmf(j, f2 * n / 2) * stats.beta.sf(x, u / 2 + j, v / 2)))' },
        ];
      },
      equivalents: (f2) => [
        { key: 'partial_r2', symbol: 'R²ₚ', meaning: 'partial R²', value: f2 / (1 + f2), unit: '' },
        { key: 'f2', symbol: 'f²', meaning: 'f²', value: f2, unit: '' },
      ],
      constants: [
        { variable: 'u', meaning: 'predictors tested', value: u },
        { variable: 'p', meaning: 'predictors adjusted for', value: p },
        { variable: 'alpha', meaning: 'significance level', value: alpha },
      ],
      alternatives: () => [],
    };
  },
};
