// Text from a spreadsheet as rows of cells, and rows as text for one. Spreadsheets put tabs between cells
// and quote cells that hold tabs, quotes or line breaks.

/** Rows of cells; empty rows are left out. Without any tab, semicolons part the cells. */
export function rowsOfText(text: string): string[][] {
  const sign = text.includes('\t') ? '\t' : text.includes(';') ? ';' : '\t';
  const rows: string[][] = [];
  let row: string[] = [];
  let cell = '';
  let isQuoted = false;
  const endCell = () => {
    row.push(cell.trim());
    cell = '';
  };
  const endRow = () => {
    endCell();
    if (row.some((one) => one !== '')) rows.push(row);
    row = [];
  };
  for (let i = 0; i < text.length; i++) {
    const letter = text[i] ?? '';
    if (isQuoted) {
      if (letter !== '"') cell += letter;
      else if (text[i + 1] === '"') {
        cell += '"';
        i++;
      } else isQuoted = false;
    } else if (letter === '"' && cell.trim() === '') isQuoted = true;
    else if (letter === sign) endCell();
    else if (letter === '\n') endRow();
    else if (letter !== '\r') cell += letter;
  }
  endRow();
  return rows;
}

/** @param decimalSign what stands before the decimals where the text goes to */
export function textOfRows(rows: readonly (readonly string[])[], decimalSign: string): string {
  return rows.map((row) => row.map((cell) => cellText(cell, decimalSign)).join('\t')).join('\n');
}

function cellText(cell: string, decimalSign: string): string {
  const plain = cell.replace(/\u2212/g, '-').trim();
  // Thousands are left out, as spreadsheets read them as text.
  if (/^-?[\d,]*\.?\d+$/.test(plain)) return plain.replace(/,/g, '').replace('.', decimalSign);
  return /["\t\n]/.test(plain) ? `"${plain.replace(/"/g, '""')}"` : plain;
}
