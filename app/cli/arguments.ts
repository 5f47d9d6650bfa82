// Reads a command's arguments strictly: whatever it does not know is an error that names it.

import { parseArgs } from 'node:util';
import type { Command, Given } from './command.ts';
import { nearest } from './nearest.ts';
import { WrongUsage } from './stop.ts';

export interface Arguments {
  readonly operand: string;
  /** Null where the command takes one operand. */
  readonly second: string | null;
  readonly given: Given;
}

/** The arguments after the command's name; null when its help is asked for. */
export function readArguments(command: Command, args: readonly string[]): Arguments | null {
  const names = Object.keys(command.options);
  const { tokens } = parseArgs({
    args: [...args],
    strict: false,
    tokens: true,
    allowPositionals: true,
    options: Object.fromEntries([
      ['help', { type: 'boolean' as const, short: 'h' }],
      ...names.map((name) => {
        const takesValue = command.options[name]?.value !== undefined;
        return [name, { type: takesValue ? ('string' as const) : ('boolean' as const) }];
      }),
    ]),
  });
  const hint = `"inglenook ${command.name} --help" shows how it is written.`;
  const wrong = (text: string) => new WrongUsage(`${command.name}: ${text} ${hint}`);

  const operands: string[] = [];
  const given: Record<string, string | true> = {};
  for (const token of tokens) {
    if (token.kind === 'positional') operands.push(token.value);
    if (token.kind !== 'option') continue;
    if (token.name === 'help') return null;
    const option = Object.hasOwn(command.options, token.name) ? command.options[token.name] : null;
    if (!option) {
      const near = nearest(token.name, names);
      throw wrong(`there is no option ${token.rawName}.${near ? ` Did you mean --${near}?` : ''}`);
    }
    if (Object.hasOwn(given, token.name)) throw wrong(`--${token.name} is given twice.`);
    // A value that looks like an option is one that was forgotten: "--out --json". A number is none.
    const forgotten =
      !token.inlineValue && (token.value === undefined || /^-(?![\d.])./.test(token.value));
    if (option.value !== undefined && (forgotten || token.value === '')) {
      throw wrong(`--${token.name} needs a value: --${token.name} ${option.value}.`);
    }
    if (option.value === undefined && token.value !== undefined) {
      throw wrong(`--${token.name} takes no value, found "${token.value}".`);
    }
    given[token.name] = token.value ?? true;
  }
  const [operand, ...rest] = operands;
  if (operand === undefined || operand === '') throw wrong(`${command.operand} is missing.`);
  const [second, ...more] = command.second === undefined ? [undefined, ...rest] : rest;
  if (command.second !== undefined && (second === undefined || second === ''))
    throw wrong(`${command.second} is missing.`);
  if (more.length > 0) throw wrong(`one ${command.operand} at a time, found also "${more[0]}".`);
  return { operand, second: second ?? null, given };
}

/** The text of an option that takes a value. */
export function textOf(given: Given, name: string): string | null {
  const value = given[name];
  return typeof value === 'string' ? value : null;
}
