import { classCommand } from './class-command.ts';
import { readCommand, type Command } from './command.ts';
import { compareCommand } from './compare-command.ts';
import { differCommand } from './differ-command.ts';
import { erratumCommand } from './erratum-command.ts';
import { HELP } from './help.ts';
import { EXIT_CODES, EXIT_INTERRUPTED, wrongUsage, type Outcome } from './outcome.ts';
import { pressCommand } from './press-command.ts';
import { queriesCommand } from './queries-command.ts';
import { programVersion } from '../program-version.ts';
import { readBackCommand } from './read-back-command.ts';
import { releaseCommand } from './release-command.ts';
import { tableCommand } from './table-command.ts';

/** The same work as the other hosts', without a window: the result goes to stdout, everything else to stderr. */
async function run(command: Command): Promise<Outcome> {
  switch (command.kind) {
    case 'help':
      return { kind: 'done', result: HELP, remarks: [] };
    case 'version':
      return { kind: 'done', result: `${programVersion()}\n`, remarks: [] };
    case 'table':
      return tableCommand(command.path, command.options);
    case 'differ':
      return differCommand(command.path, command.options);
    case 'press':
      return pressCommand(command.path, command.into);
    case 'release':
      return releaseCommand(command.path, command.into, command.signatures);
    case 'read-back':
      return readBackCommand(command.paths, command.options);
    case 'queries':
      return queriesCommand(command.path, command.format);
    case 'compare':
      return compareCommand(command.paths, command.format);
    case 'class':
      return classCommand(command.path, command.options);
    case 'erratum':
      return erratumCommand(command.paths, command.options);
  }
}

/** Whoever reads the result may stop early, as `head` does: then there is nobody left to tell. */
process.stdout.on('error', (error: Error) => {
  if (!('code' in error) || error.code !== 'EPIPE') throw error;
  process.exit(EXIT_CODES.done);
});

process.once('SIGINT', () => {
  process.stderr.write('Stopped.\n');
  process.exit(EXIT_INTERRUPTED);
});

const command = readCommand(process.argv.slice(2));
const outcome = command.ok ? await run(command.value) : wrongUsage(command.problem);
if (outcome.kind !== 'wrong-usage') for (const remark of outcome.remarks) process.stderr.write(`${remark}\n`);
if (outcome.kind === 'done' || outcome.kind === 'differs') process.stdout.write(outcome.result);
if (outcome.kind !== 'done') process.stderr.write(`normloom: ${outcome.problem}\n`);
if (outcome.kind === 'wrong-usage') process.stderr.write('normloom --help tells how the commands are used.\n');
process.exitCode = EXIT_CODES[outcome.kind];
