// The window's end: the bridge as an object of typed calls over any way of sending.

import { BridgeError } from './bridge-error.ts';
import { type Bridge, type CallName, contract, reply } from './contract.ts';

/** Takes a call to the host and brings the answer, unchecked. */
export type Send = (name: string, input: unknown) => Promise<unknown>;

export function client(send: Send): Bridge {
  async function call(name: CallName, input: unknown): Promise<unknown> {
    const answer = reply.parse(await send(name, input));
    if (answer.ok) return contract[name].out.parse(answer.value);
    throw new BridgeError(answer.error.kind, answer.error.message, answer.error.faults);
  }
  const calls = (Object.keys(contract) as CallName[]).map((name) => [
    name,
    (input: unknown) => call(name, input),
  ]);
  return Object.fromEntries(calls) as Bridge; // one entry a name, each parsed by that name's schema
}

/** Sends to the loopback host that served this page. */
export const sendByHttp: Send = async (name, input) => {
  const response = await fetch(`/rpc/${name}`, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(input),
  });
  if (response.status === 401 || response.status === 403) {
    throw new BridgeError('call', 'The host no longer knows this window. Start the program again.');
  }
  return response.json();
};

declare global {
  /** Put there by Electron's preload; absent in a browser. */
  var inglenookSend: Send | undefined;
}

/** The bridge of whichever shell holds this page. */
export function connectBridge(): Bridge {
  return client(globalThis.inglenookSend ?? sendByHttp);
}
