// What a command is. The list of commands, the help and the reading of arguments are drawn from this.

import type { StudyThreads } from './study-threads.ts';
import type { Terminal } from './terminal.ts';

export interface Option {
  /** What the value is, in capitals, for options that take one. */
  readonly value?: string;
  readonly help: string;
}

/** What was given: a text for an option with a value, true for one without. */
export type Given = Readonly<Record<string, string | true | undefined>>;

export interface Command {
  readonly name: string;
  /** The operand, in capitals. */
  readonly operand: string;
  readonly summary: string;
  readonly options: Readonly<Record<string, Option>>;
  readonly examples: readonly string[];
  /** A second operand, in capitals, where the command takes one. */
  readonly second?: string;
  run(
    operand: string,
    given: Given,
    terminal: Terminal,
    threads: StudyThreads,
    second: string | null,
  ): Promise<void>;
}
