// Text that is markup, kept apart from text that is not: whatever goes in is escaped, unless it was
// made here.

export interface Markup {
  readonly markup: string;
}

export type Part = Markup | string | number | readonly Part[];

const entities: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

/** Control characters have no place in a page; a tab and a new line have. */
const forbidden = /[\p{Cc}\p{Cs}]/gu;

export function escapeText(text: string): string {
  return text
    .replace(forbidden, (c) => (c === '\n' || c === '\t' ? c : '\ufffd'))
    .replace(/[&<>"']/g, (c) => entities[c] ?? c);
}

function written(part: Part): string {
  if (typeof part === 'string') return escapeText(part);
  if (typeof part === 'number') return String(part);
  if ('markup' in part) return part.markup;
  return part.map(written).join('');
}

/** A template whose parts are escaped: markup`<b>${name}</b>`. */
export function markup(pieces: TemplateStringsArray, ...parts: readonly Part[]): Markup {
  const text = pieces.map((piece, i) => {
    const part = parts[i];
    return part === undefined ? piece : piece + written(part);
  });
  return { markup: text.join('') };
}

export const nothing: Markup = { markup: '' };
