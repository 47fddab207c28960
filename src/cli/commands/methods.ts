/** `samplecase methods`: what can be planned; with a name, its inputs, formula and sources. */

import { Command } from 'commander';
import { type Method, type MethodName, methodInputs, methods, sourceTitle } from '../../index.ts';
import { EXIT, Exit } from '../exit.ts';
import { terminalTable, wrap } from '../terminal.ts';

export function methodsCommand(): Command {
  return new Command('methods')
    .description('List the design methods, or show one: inputs, formula, sources')
    .argument('[name]', 'method to show')
    .action((name: string | undefined) => {
      if (name === undefined) {
        const rows = Object.values(methods).map((method) => [method.name, method.summary]);
        process.stdout.write(`${terminalTable(['method', 'plans'], rows)}\n`);
        return;
      }
      const method = methods[name as MethodName] as Method | undefined;
      if (method === undefined) {
        process.stderr.write(
          `There is no method “${name}”. There are: ${Object.keys(methods).join(', ')}.\n`,
        );
        throw new Exit(EXIT.usage);
      }
      process.stdout.write(`${describe(method)}\n`);
    });
}

function describe(method: Method): string {
  const inputs = methodInputs[method.name];
  const described = (title: string, description: string) =>
    [title, description].filter((part) => part !== '').join(': ');
  return [
    `${method.name}: ${method.title}`,
    '',
    wrap(method.summary),
    '',
    `Finds: ${method.finds.join(', ')}`,
    '',
    'Inputs',
    ...inputs.others.map((input) =>
      wrap(
        `${input.path.join('.')}${input.required ? '' : ' (optional)'}  ${described(input.title, input.description)}`,
        88,
        '  ',
      ),
    ),
    ...inputs.quantities.map((input) =>
      wrap(`${input.path.join('.')}  ${described(input.title, input.description)}`, 88, '  '),
    ),
    ...(inputs.forms.length === 0
      ? []
      : [
          '',
          'The effect is stated in one of these forms',
          ...inputs.forms.map((form) => `  ${form.title}: ${form.keys.join(', ')}`),
        ]),
    '',
    'Criteria',
    ...inputs.criteria.map((input) => wrap(`${input.key}  ${input.description}`, 88, '  ')),
    '',
    'Formula',
    ...method.formula.map((line) => `  ${line}`),
    ...method.symbols.map(({ symbol, meaning }) => wrap(`${symbol}  ${meaning}`, 88, '    ')),
    '',
    'If an assumption fails',
    ...method.assumptions.map(({ statement, ifNot }) => wrap(`${statement}: ${ifNot}`, 88, '  ')),
    '',
    'Sources',
    ...method.sources.map(({ key, of, at }) =>
      wrap(`${of}: ${sourceTitle(key)}${at === undefined ? '' : `, ${at}`}`, 88, '  '),
    ),
  ].join('\n');
}
