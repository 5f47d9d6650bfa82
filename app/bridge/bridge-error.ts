import type { ReplyError } from './contract.ts';

/** Why a call was not answered. Thrown by handlers, carried over the wire, thrown again in the window. */
export class BridgeError extends Error {
  readonly kind: ReplyError['kind'];
  readonly faults: ReplyError['faults'];
  constructor(kind: ReplyError['kind'], message: string, faults: ReplyError['faults'] = []) {
    super(message);
    this.name = 'BridgeError';
    this.kind = kind;
    this.faults = faults;
  }
}
