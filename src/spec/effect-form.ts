/** In which form an effect is stated, and what is wrong when it is in none. */

import type { EffectFormInput } from './method-inputs.ts';
import { listed } from './shown.ts';

/** The form whose keys these are; with `seeksEffect`, the leading key may be left out, as it is what is found.
 *  A whole form goes before one without its leading key. */
export function formOf(
  keys: readonly string[],
  forms: readonly EffectFormInput[],
  seeksEffect: boolean,
): EffectFormInput | null {
  const isAmong = (wanted: readonly string[]): boolean =>
    wanted.length > 0 && wanted.length === keys.length && wanted.every((key) => keys.includes(key));
  return (
    forms.find((form) => isAmong(form.keys)) ??
    (seeksEffect ? forms.find((form) => isAmong(form.keys.slice(1))) : undefined) ??
    null
  );
}

/** Why the keys are no form, and which forms there are. */
export function formMessage(keys: readonly string[], forms: readonly EffectFormInput[]): string {
  const known = keys.filter((key) => forms.some((form) => form.keys.includes(key)));
  const begun = forms.filter((form) => known.every((key) => form.keys.includes(key)));
  if (known.length === 0) return `No effect is stated. ${formList(forms)}`;
  if (begun.length === 0)
    return `Found ${listed(known, 'and')}, which do not belong to one form. ${formList(forms)}`;
  const missing = begun.map((form) =>
    listed(
      form.keys.filter((key) => !known.includes(key)),
      'and',
    ),
  );
  return `Found ${listed(known, 'and')}, which is not a whole form: add ${missing.join(', or ')}.`;
}

function formList(forms: readonly EffectFormInput[]): string {
  return `Give the effect in one form. ${forms.map(({ title, keys }) => `${listed(keys, 'and')}: ${title}`).join('; ')}.`;
}
