// The host's end: takes a name and an unchecked input, and gives an answer whatever happens.

import { z } from 'zod';
import { BridgeError } from './bridge-error.ts';
import { type CallName, contract, type Handlers, type Reply } from './contract.ts';

const refuse = (error: BridgeError): Reply => ({
  ok: false,
  error: { kind: error.kind, message: error.message, faults: error.faults },
});

function isCall(name: string): name is CallName {
  return Object.hasOwn(contract, name);
}

/** Answers one call; never throws. `report` hears of faults of the program, for the host's log. */
export async function dispatch(
  handlers: Handlers,
  name: string,
  input: unknown,
  report: (error: unknown) => void = () => {},
): Promise<Reply> {
  if (!isCall(name)) return refuse(new BridgeError('call', 'There is no such call.'));
  const parsed = contract[name].in.safeParse(input);
  if (!parsed.success) {
    return refuse(new BridgeError('call', `${name}: ${z.prettifyError(parsed.error)}`));
  }
  try {
    // Each handler takes its own input type; the schema above has just made it that.
    const handler = handlers[name] as (checked: unknown) => Promise<unknown>;
    const value: unknown = contract[name].out.parse(await handler(parsed.data));
    return { ok: true, value };
  } catch (error) {
    if (error instanceof BridgeError) return refuse(error);
    report(error);
    const message = error instanceof Error ? error.message : String(error);
    return refuse(new BridgeError('program', `${name} failed in the program: ${message}`));
  }
}
