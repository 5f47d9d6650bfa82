// The two ways in which a command ends early without the program being at fault.

import { type Fault, faultText, type Parsed } from '../../weather/index.ts';

/** The input is at fault: exit status 1. */
export class InputFaults extends Error {
  readonly faults: readonly Fault[];
  constructor(faults: readonly Fault[]) {
    super(faults.map(faultText).join('\n'));
    this.faults = faults;
  }
}

/** The command was written wrongly: exit status 2. */
export class WrongUsage extends Error {}

/** The value, or the end of the command with every fault. */
export function need<T>(parsed: Parsed<T>): T {
  if (parsed.ok) return parsed.value;
  throw new InputFaults(parsed.faults);
}
