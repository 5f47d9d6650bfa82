import type { Command } from './command.ts';

const statuses =
  'Exit status: 0 done; 1 the input is at fault, and the message says where and how to mend it;\n' +
  '2 the command was written wrongly; 3 a fault of the program.';

const operandsOf = ({ operand, second }: Command) =>
  second === undefined ? operand : `${operand} ${second}`;

const usage = (command: Command) => {
  const options = Object.entries(command.options).map(([name, { value }]) =>
    value === undefined ? `[--${name}]` : `[--${name} ${value}]`,
  );
  return ['inglenook', command.name, operandsOf(command), ...options].join(' ');
};

function aligned(rows: readonly (readonly [string, string])[]): string {
  const to = Math.max(...rows.map(([left]) => left.length));
  return rows.map(([left, right]) => `  ${left.padEnd(to)}   ${right}`).join('\n');
}

export function generalHelp(commands: readonly Command[], version: string): string {
  return `Inglenook ${version}: rooms as thermal networks, hour by hour.

${aligned(commands.map((command) => [`${command.name} ${operandsOf(command)}`, command.summary]))}

"inglenook COMMAND --help" tells more of each. With --json a command writes one JSON document to
standard output and nothing else there. --version prints the version.

${statuses}`;
}

export function commandHelp(command: Command): string {
  const options = Object.entries(command.options).map(
    ([name, { value, help }]) =>
      [value === undefined ? `--${name}` : `--${name} ${value}`, help] as const,
  );
  return `${usage(command)}

${command.summary}

${aligned([...options, ['--help', 'this text']])}

Examples:
${command.examples.map((example) => `  ${example}`).join('\n')}

${statuses}`;
}
