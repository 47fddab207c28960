/** `samplecase rules`: the checks that are made, each with its reason and source. */

import { Command } from 'commander';
import { type Rule, rules, sourceTitle } from '../../index.ts';
import { EXIT, Exit } from '../exit.ts';
import { wrap } from '../terminal.ts';

export function rulesCommand(): Command {
  return new Command('rules')
    .description('Show the rules a spec is held against, or one of them, each with its reason and source')
    .argument('[id]', 'rule to show, such as M14')
    .action((id: string | undefined) => {
      if (id === undefined) {
        process.stdout.write(`${rules.map(describe).join('\n\n')}\n`);
        return;
      }
      const rule = rules.find((one) => one.id === id.toUpperCase());
      if (rule === undefined) {
        process.stderr.write(
          `There is no rule “${id}”. There are: ${rules.map((one) => one.id).join(', ')}.\n`,
        );
        throw new Exit(EXIT.usage);
      }
      process.stdout.write(`${describe(rule)}\n`);
    });
}

function describe(rule: Rule): string {
  const sources = rule.sources.map(
    ({ key, of, at }) => `${of}: ${sourceTitle(key)}${at === undefined ? '' : `, ${at}`}`,
  );
  const grounds = [...sources, ...(rule.ground === null ? [] : [rule.ground])];
  return [
    `${rule.id} (${rule.level}): ${rule.title}`,
    '',
    wrap(rule.why),
    '',
    ...grounds.map((ground) => wrap(`Source: ${ground}`)),
  ].join('\n');
}
