export { BridgeError } from './bridge-error.ts';
export { client, connectBridge, type Send } from './client.ts';
export type {
  Bridge,
  CallIn,
  CallName,
  CallOut,
  Handlers,
  Reply,
} from './contract.ts';
export { dispatch } from './dispatch.ts';
