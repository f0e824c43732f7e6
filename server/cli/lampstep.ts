/** The command line: JSON on standard output; 0 good, 1 a finding, 2 bad input with the reason on standard error. */
import { BadInput } from './commands/args';
import type { Command } from './commands/args';
import { compare } from './commands/compare';
import { draft } from './commands/draft';
import { prove } from './commands/prove';
import { rehearse } from './commands/rehearse';
import { replay } from './commands/replay';
import { schema } from './commands/schema';
import { verify } from './commands/verify';
import { walk } from './commands/walk';
import { workings } from './commands/workings';

const COMMANDS: readonly Command[] = [walk, prove, rehearse, draft, compare, replay, schema, verify, workings];

function help(): string {
  return [
    'npm run -s lampstep -- COMMAND …   JSON on standard output; exit 0 good, 1 a finding, 2 bad input',
    '',
    ...COMMANDS.flatMap((c) => [`  ${c.usage}`, ...c.about.map((line) => `      ${line}`), '']),
    '  help',
    '      This page.',
  ].join('\n');
}

async function main(argv: string[]): Promise<number> {
  const [name, ...rest] = argv;
  if (name === undefined || name === 'help' || name === '--help') {
    process.stdout.write(`${help()}\n`);
    return name === undefined ? 2 : 0;
  }
  const command = COMMANDS.find((c) => c.name === name);
  if (command === undefined) throw new BadInput(`There is no command "${name}". Try: ${COMMANDS.map((c) => c.name).join(', ')}, help.`);
  const { good, output } = await command.run(rest);
  // A page is text already; everything else is JSON.
  process.stdout.write(typeof output === 'string' ? output : `${JSON.stringify(output, null, 2)}\n`);
  return good ? 0 : 1;
}

try {
  process.exitCode = await main(process.argv.slice(2));
} catch (error) {
  if (!(error instanceof BadInput)) throw error;
  process.stderr.write(`${error.message}\n`);
  process.exitCode = 2;
}
