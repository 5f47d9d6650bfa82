/**
 * The project as the text of its file: readable, one change a line in a diff, ended by a line break.
 * Fields stay in the order of the document; the same document gives the same bytes.
 */
export function projectText(document: unknown): string {
  const text: string | undefined = JSON.stringify(document, refuseLoss, 2);
  if (text === undefined) throw new Error('There is no document to write.');
  return `${text}\n`;
}

/** JSON writes null for a number that is none, silently: that would lose what the user entered. */
function refuseLoss(key: string, value: unknown): unknown {
  if (typeof value === 'number' && !Number.isFinite(value)) {
    throw new Error(`The document holds ${value} at "${key}", which a file cannot.`);
  }
  return value;
}
