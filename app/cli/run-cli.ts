// The command line as a function of its arguments and streams.

import { faultText } from '../../weather/index.ts';
import { version } from '../version.ts';
import { readArguments } from './arguments.ts';
import { checkCommand } from './check.ts';
import type { Command } from './command.ts';
import { compareCommand } from './compare.ts';
import { cooldownCommand } from './cooldown.ts';
import { commandHelp, generalHelp } from './help.ts';
import { nearest } from './nearest.ts';
import { networkCommand } from './network.ts';
import { overheatingCommand } from './overheating.ts';
import { simulateCommand } from './simulate.ts';
import { sizeCommand } from './size.ts';
import { InputFaults, WrongUsage } from './stop.ts';
import type { StudyThreads } from './study-threads.ts';
import { sweepCommand } from './sweep.ts';
import { type Stream, terminal } from './terminal.ts';
import { weatherCommand } from './weather.ts';

const commands: readonly Command[] = [
  simulateCommand,
  compareCommand,
  sizeCommand,
  cooldownCommand,
  overheatingCommand,
  sweepCommand,
  checkCommand,
  weatherCommand,
  networkCommand,
];

export const status = { done: 0, inputAtFault: 1, wrongUsage: 2, programAtFault: 3 } as const;

export interface Streams {
  readonly out: Stream;
  readonly err: Stream;
  readonly env: Readonly<Record<string, string | undefined>>;
  /** For studies; left out: everything runs on this thread. */
  readonly threads?: StudyThreads;
}

async function runCommand(args: readonly string[], { out, err, threads }: Streams): Promise<void> {
  const [name, ...rest] = args;
  const speak = terminal(out, err, rest.includes('--progress'));
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
  await command.run(
    read.operand,
    read.given,
    speak,
    threads ?? { worker: null, count: 1 },
    read.second,
  );
}

/** Says why it ended, and gives the exit status. */
export function explain(error: unknown, { err, env }: Streams): number {
  const say = (text: string) => err.write(`${text}\n`);
  if (error instanceof InputFaults) {
    for (const fault of error.faults) say(faultText(fault));
    return status.inputAtFault;
  }
  if (error instanceof WrongUsage) {
    say(error.message);
    return status.wrongUsage;
  }
  const known = error instanceof Error;
  const message = known ? error.message : String(error);
  say(`Stopped: ${message}. This is a fault of the program, not of your input.`);
  if (env.INGLENOOK_TRACE) say((known && error.stack) || message);
  else say('With INGLENOOK_TRACE=1 the same command prints where it happened.');
  return status.programAtFault;
}

/** Runs one command line and gives its exit status; never throws. */
export async function runCli(args: readonly string[], streams: Streams): Promise<number> {
  try {
    await runCommand(args, streams);
    return status.done;
  } catch (error) {
    return explain(error, streams);
  }
}
