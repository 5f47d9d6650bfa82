export {
  type Command,
  isPressed,
  type KeyPress,
  type MenuName,
  mayActWhileTyping,
} from './command.ts';
export { commands } from './commands.ts';
export { allHits, findHits, type Hit } from './search.ts';
