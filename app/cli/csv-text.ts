// Words of the user's in a CSV of ours.

/**
 * A cell of text: quoted where it has to be, and never one that a spreadsheet would work out. What begins
 * with = + - @ (also after blanks) gets an apostrophe before it, which spreadsheets take for "text".
 */
export function csvText(text: string): string {
  const plain = text.replace(/[\r\n]+/g, ' ');
  const safe = /^\s*[=+\-@]/.test(plain) ? `'${plain}` : plain;
  return /[",;\t]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}
