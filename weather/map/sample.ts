// What is looked at to find out how a table is written: its first lines, its last, and some between.
import { createDecoder } from '../read/decode.ts';

export interface Sample {
  /** First lines of the file, from row 1. */
  readonly head: readonly string[];
  /** Runs of whole lines from all over the file, the last lines last. */
  readonly runs: readonly (readonly string[])[];
  readonly encoding: string;
  /** Whether the head is the whole file. */
  readonly isWhole: boolean;
}

const headLength = 1 << 17;
const runLength = 1 << 14;
const runCount = 24;

/** Takes samples of a text, or of the bytes of a file. */
export function sampleOf(source: string | Uint8Array): Sample {
  const { length } = source;
  const isWhole = length <= headLength;
  const first = partOf(source, 0, Math.min(length, headLength));
  const head = linesOf(first.text, false, !isWhole);
  const runs: string[][] = [];
  if (!isWhole) {
    const stride = (length - headLength - runLength) / (runCount - 1);
    for (let k = 0; k < runCount; k++) {
      const from = Math.max(headLength, Math.floor(headLength + k * stride));
      const even = from - (from % 4); // whole letters of UTF-16
      const isLast = k === runCount - 1;
      const to = isLast ? length : Math.min(length, even + runLength);
      const { text } = partOf(source, even, to, first.encoding === 'UTF-16' ? source : undefined);
      runs.push(linesOf(text, true, !isLast));
    }
  }
  return { head, runs, encoding: first.encoding, isWhole };
}

function partOf(source: string | Uint8Array, from: number, to: number, wide?: string | Uint8Array) {
  if (typeof source === 'string') return { text: source.slice(from, to), encoding: 'UTF-8' };
  const decoder = createDecoder();
  // The mark of UTF-16 stands only at the start: it is shown to the decoder again.
  let text = '';
  if (typeof wide === 'object' && wide[0] >= 0xfe) decoder.decode(wide.subarray(0, 4));
  text += decoder.decode(source.subarray(from, to));
  return { text: text + decoder.end(), encoding: decoder.encoding };
}

function linesOf(text: string, cutsFirst: boolean, cutsLast: boolean): string[] {
  const lines = text
    .replace(/^\uFEFF/, '')
    .replace(/\r\n?/g, '\n')
    .split('\n');
  if (cutsFirst) lines.shift();
  if (cutsLast || lines.at(-1) === '') lines.pop();
  return lines;
}
