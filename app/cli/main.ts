// The command line's entry, built to dist/cli.js.

import { faultText } from '../../weather/index.ts';
import { version } from '../version.ts';
import { readArguments } from './arguments.ts';
import { checkCommand } from './check.ts';
import { commandHelp, generalHelp } from './help.ts';
import { nearest } from './nearest.ts';
import { networkCommand } from './network.ts';
import { simulateCommand } from './simulate.ts';
import { InputFaults, WrongUsage } from './stop.ts';
import { terminal } from './terminal.ts';
import { weatherCommand } from './weather.ts';

const commands = [simulateCommand, checkCommand, weatherCommand, networkCommand];

const status = { done: 0, inputAtFault: 1, wrongUsage: 2, programAtFault: 3 } as const;

async function runCommand(args: readonly string[]): Promise<void> {
  const [name, ...rest] = args;
  const speak = terminal(process.stdout, process.stderr, rest.includes('--progress'));
  if (name === undefined) throw new WrongUsage(generalHelp(commands, version));
  if (['--help', '-h', 'help'].includes(name)) {
    const about = commands.find((command) => command.name === rest[0]);
    return speak.print(about ? commandHelp(about) : generalHelp(commands, version));
  }
  if (name === '--version') return speak.print(version);
  const command = commands.find((one) => one.name === name);
  if (!command) {
    const near = nearest(
      name,
      commands.map((one) => one.name),
    );
    throw new WrongUsage(
      `There is no command "${name}".${near ? ` Did you mean ${near}?` : ''} "inglenook --help" lists them.`,
    );
  }
  const read = readArguments(command, rest);
  if (read === null) return speak.print(commandHelp(command));
  await command.run(read.operand, read.given, speak);
}

/** Says why it ended, and gives the exit status. */
function explain(error: unknown): number {
  if (error instanceof InputFaults) {
    for (const fault of error.faults) console.error(faultText(fault));
    return status.inputAtFault;
  }
  if (error instanceof WrongUsage) {
    console.error(error.message);
    return status.wrongUsage;
  }
  const message = error instanceof Error ? error.message : String(error);
  console.error(`Stopped: ${message}. This is a fault of the program, not of your input.`);
  if (process.env.INGLENOOK_TRACE) console.error(error);
  else console.error('With INGLENOOK_TRACE=1 the same command prints where it happened.');
  return status.programAtFault;
}

// "inglenook … | head": the reader has gone, and nobody is left to complain to.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code === 'EPIPE') process.exit(status.done);
  throw error;
});

try {
  await runCommand(process.argv.slice(2));
  process.exitCode = status.done;
} catch (error) {
  process.exitCode = explain(error);
}
