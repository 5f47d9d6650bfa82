// Reads a file that the user named: only real files, only up to a limit; as text, only text.

import { createHash } from 'node:crypto';
import { open } from 'node:fs/promises';
import type { Fault, Parsed } from '../../weather/index.ts';
import { systemFault } from './system-fault.ts';

export interface ReadOptions {
  /** What the file should be, for the fault: "a project file". */
  readonly expected: string;
  readonly limitBytes: number;
}

export interface ReadTextOptions extends ReadOptions {
  /** Tables from other programs come in UTF-16 and in Windows' western code page: read them, with a note. */
  readonly allowLegacyText?: boolean;
}

export interface BytesFile {
  readonly data: Uint8Array;
  /** Of the bytes on disk, in hexadecimal. */
  readonly sha256: string;
}

export interface TextFile {
  readonly text: string;
  /** Of the bytes on disk, in hexadecimal. */
  readonly sha256: string;
  readonly bytes: number;
  /** What had to be assumed to read it. */
  readonly notes: readonly string[];
}

const megabytes = (bytes: number) => `${(bytes / 1e6).toFixed(1)} MB`;

/** First bytes of what is often taken for a text file. */
const signatures: readonly (readonly [bytes: readonly number[], found: string, mend: string])[] = [
  [[0x50, 0x4b, 0x03, 0x04], 'a ZIP archive or a workbook', 'Unpack it, or export it as text.'],
  [[0x1f, 0x8b], 'a gzip archive', 'Unpack it first.'],
  [[0x25, 0x50, 0x44, 0x46], 'a PDF document', 'Name the file with the data.'],
];

function notText(data: Uint8Array): readonly [found: string, mend: string] | null {
  for (const [bytes, found, mend] of signatures) {
    if (bytes.every((byte, i) => data[i] === byte)) return [found, mend];
  }
  return data.subarray(0, 65536).includes(0) ? ['binary data', 'Name a text file.'] : null;
}

/** The file's bytes as they are. */
export async function readBytes(file: string, options: ReadOptions): Promise<Parsed<BytesFile>> {
  const { expected, limitBytes } = options;
  const fault = (found: string, mend: string): Parsed<BytesFile> => {
    const one: Fault = { file, place: { path: '' }, found, expected, mend };
    return { ok: false, faults: [one] };
  };
  try {
    const handle = await open(file, 'r');
    try {
      const stat = await handle.stat();
      if (stat.isDirectory()) return fault('a folder', 'Name a file in it.');
      if (!stat.isFile()) return fault('a device or pipe', 'Name an ordinary file.');
      if (stat.size > limitBytes) {
        return fault(megabytes(stat.size), `Name a file of at most ${megabytes(limitBytes)}.`);
      }
      const data: Uint8Array = await handle.readFile();
      if (data.length === 0) {
        return fault('an empty file', 'Check that it was saved or copied whole.');
      }
      const sha256 = createHash('sha256').update(data).digest('hex');
      return { ok: true, value: { data, sha256 } };
    } finally {
      await handle.close();
    }
  } catch (error) {
    return { ok: false, faults: [systemFault(file, error, expected)] };
  }
}

/** The label of UTF-16 by its mark at the start, or null. */
function utf16Label(data: Uint8Array): string | null {
  if (data[0] === 0xff && data[1] === 0xfe) return 'utf-16le';
  return data[0] === 0xfe && data[1] === 0xff ? 'utf-16be' : null;
}

export async function readText(file: string, options: ReadTextOptions): Promise<Parsed<TextFile>> {
  const read = await readBytes(file, options);
  if (!read.ok) return read;
  const { data, sha256 } = read.value;
  const made = (text: string, notes: readonly string[] = []): Parsed<TextFile> => ({
    ok: true,
    value: { text, sha256, bytes: data.length, notes },
  });
  const fault = (found: string, mend: string): Parsed<TextFile> => ({
    ok: false,
    faults: [{ file, place: { path: '' }, found, expected: options.expected, mend }],
  });
  const wide = utf16Label(data);
  if (wide) {
    if (!options.allowLegacyText) return fault('text in UTF-16', 'Save it as UTF-8.');
    return made(new TextDecoder(wide).decode(data), ['The text is in UTF-16.']);
  }
  const other = notText(data);
  if (other) return fault(...other);
  try {
    return made(new TextDecoder('utf-8', { fatal: true }).decode(data));
  } catch {
    if (!options.allowLegacyText) return fault('bytes that are not UTF-8', 'Save it as UTF-8.');
    const text = new TextDecoder('windows-1252').decode(data);
    return made(text, ['The text is not UTF-8; it was read in the western Windows code page.']);
  }
}
