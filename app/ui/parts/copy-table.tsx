// Copies the table beside it for a spreadsheet: tabs between cells, the user's own decimal sign.

import { textOfRows } from '../../project/index.ts';
import { useApp } from '../state/index.ts';

const decimalSign = () => (1.5).toLocaleString(navigator.language).charAt(1);

/** What a cell shows: the figure of a field, the words of a choice, else its text. */
function cellText(cell: Element): string {
  const field = cell.querySelector('input');
  if (field) return field.value;
  const select = cell.querySelector('select');
  if (select) return select.selectedOptions[0]?.text ?? '';
  const copy = cell.cloneNode(true) as Element;
  for (const part of copy.querySelectorAll('button, .unseen')) {
    if (!part.classList.contains('row-name')) part.remove();
  }
  return copy.textContent ?? '';
}

export function CopyTable({ label }: { label: string }) {
  const app = useApp();
  async function copy() {
    const table = document.querySelector(`table[aria-label="${CSS.escape(label)}"]`);
    if (!table) return;
    const rows = [...table.querySelectorAll('tr')].map((row) => [...row.children].map(cellText));
    try {
      await navigator.clipboard.writeText(textOfRows(rows, decimalSign()));
      app.set({ notice: `${label} copied, ${rows.length - 1} rows.` });
    } catch {
      app.set({ notice: 'Not copied: this window may not use the clipboard.' });
    }
  }
  return (
    <button type="button" className="text-button" onClick={() => void copy()}>
      Copy table<span className="unseen">: {label}</span>
    </button>
  );
}
