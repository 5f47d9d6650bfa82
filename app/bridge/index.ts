export { BridgeError } from './bridge-error.ts';
export { client, connectBridge, type Send } from './client.ts';
export {
  type Bridge,
  type CallIn,
  type CallName,
  type CallOut,
  contract,
  type Handlers,
  type Reply,
} from './contract.ts';
export { dispatch } from './dispatch.ts';
