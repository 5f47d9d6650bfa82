// The fingerprint of a table's layout: the same for next year's file of the same logger, so that its
// mapping is offered again. Values, rows and the lines above the headings do not enter.
import type { Delimiter } from './mapping.ts';

/** 64 bits of FNV-1a over delimiter, headings and units, as 16 hexadecimal digits. */
export function tableShape(
  delimiter: Delimiter,
  headings: readonly string[],
  units: readonly string[],
  columnCount: number,
): string {
  const key = (text: string) => text.replace(/\s+/g, ' ').trim().toLowerCase();
  const named = headings.length > 0 ? headings.map(key).join('\u001f') : `${columnCount} columns`;
  const text = [delimiter, named, units.map(key).join('\u001f')].join('\u001e');
  return hash(text, 0x811c9dc5) + hash(text, 0x050c5d1f);
}

function hash(text: string, start: number): string {
  let h = start;
  for (let i = 0; i < text.length; i++) h = Math.imul(h ^ text.charCodeAt(i), 0x01000193);
  return (h >>> 0).toString(16).padStart(8, '0');
}
