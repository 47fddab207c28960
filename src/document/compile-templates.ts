/** A user's own templates, compiled at run time as ours are at build time. Loaded only when asked for, since the
 *  compiler is large. */

import Handlebars from 'handlebars';
import { fail } from '../problem.ts';
import type { TemplateSet } from './templates.ts';

/** @throws ProblemError naming the template that cannot be compiled. */
export function compileTemplates(sources: Readonly<Record<string, string>>): TemplateSet {
  const compiled: Record<string, object> = {};
  for (const [path, text] of Object.entries(sources)) {
    try {
      // The precompiled form is a JavaScript object literal written by Handlebars itself.
      const specification = Handlebars.precompile(text, { noEscape: true, strict: true });
      compiled[path] = new Function(`return ${specification}`)() as object;
    } catch (error) {
      fail('template', path, `The template cannot be read: ${(error as Error).message}`);
    }
  }
  return compiled;
}
