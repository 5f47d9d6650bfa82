// A day given as MM-DD.

import { monthLengths } from '../../weather/index.ts';
import { WrongUsage } from './stop.ts';

/** Day of the year, 0 for 1 January; null where none is given. */
export function dayOfMonth(command: string, text: string | null, days: number): number | null {
  if (text === null) return null;
  const match = /^(\d\d)-(\d\d)$/.exec(text);
  const lengths = monthLengths(days);
  const [month, day] = match ? [Number(match[1]), Number(match[2])] : [0, 0];
  if (month < 1 || month > 12 || day < 1 || day > lengths[month - 1])
    throw new WrongUsage(
      `${command}: --day: found "${text}", expected a day as MM-DD, e.g. 01-16.`,
    );
  return lengths.slice(0, month - 1).reduce((sum, length) => sum + length, 0) + day - 1;
}
