// Rows from a spreadsheet, shown cell by cell before they are taken. What cannot be read is marked, and
// nothing is taken until all of it can.

import { useId, useState } from 'react';
import { rowsOfText } from '../../project/index.ts';
import { SheetDialog } from './sheet-dialog.tsx';

export type ReadCell =
  | { readonly ok: true; readonly shown: string; readonly value: string | number }
  | { readonly ok: false; readonly why: string };

export interface PasteColumn {
  readonly name: string;
  readonly read: (text: string) => ReadCell;
}

export interface PasteDialogProps {
  readonly label: string;
  readonly note: string;
  readonly columns: readonly PasteColumn[];
  readonly onTake: (rows: readonly (readonly (string | number)[])[]) => void;
  readonly onClose: () => void;
}

const shownRows = 300;

export function PasteDialog({ label, note, columns, onTake, onClose }: PasteDialogProps) {
  const id = useId();
  const [text, setText] = useState('');
  const all = rowsOfText(text);
  const read = all.map((row) => columns.map(({ read: readCell }, c) => readCell(row[c] ?? '')));
  // A first row without a number where the second has them is the heading.
  const isHeading = read.length > 1 && isHeadingOf(read[0] ?? [], read[1] ?? []);
  const cells = isHeading ? read.slice(1) : read;
  const texts = isHeading ? all.slice(1) : all;
  const wrong = cells.flat().filter((cell) => !cell.ok).length;

  function take() {
    onTake(cells.map((row) => row.map((cell) => (cell.ok ? cell.value : ''))));
    onClose();
  }

  return (
    <SheetDialog label={label} className="versions-dialog" onClose={onClose}>
      <div className="dialog-head">
        <h2>{label}</h2>
        <button type="button" className="button" onClick={onClose}>
          Leave
        </button>
      </div>
      <p className="quiet">{note}</p>
      <label htmlFor={id} className="note">
        {columns.map(({ name }) => name).join(', ')}: paste here
      </label>
      <textarea
        id={id}
        className="paste-text"
        rows={4}
        spellCheck={false}
        value={text}
        onChange={(event) => setText(event.target.value)}
      />
      {cells.length > 0 && (
        // biome-ignore lint/a11y/noNoninteractiveTabindex: a scrolled region must take the arrow keys
        <section className="differences" tabIndex={0} aria-label="As it was read">
          <table>
            <thead>
              <tr>
                <th scope="col">Row</th>
                {columns.map(({ name }) => (
                  <th key={name} scope="col">
                    {name}
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {cells.slice(0, shownRows).map((row, r) => (
                // biome-ignore lint/suspicious/noArrayIndexKey: a row is its place
                <tr key={r}>
                  <th scope="row">{r + 1}</th>
                  {row.map((cell, c) => (
                    <td key={columns[c]?.name} className={cell.ok ? '' : 'is-unread'}>
                      {cell.ok ? cell.shown : `${texts[r]?.[c] || 'nothing'}: ${cell.why}`}
                    </td>
                  ))}
                </tr>
              ))}
            </tbody>
          </table>
        </section>
      )}
      <div className="dialog-foot">
        <span className="note" role="status">
          {cells.length === 0
            ? ''
            : wrong > 0
              ? `${wrong} cells cannot be read; put them right above`
              : `${cells.length} rows read${isHeading ? ', the heading left out' : ''}`}
        </span>
        <button
          type="button"
          className="button is-filled"
          disabled={cells.length === 0 || wrong > 0}
          onClick={take}
        >
          Take {cells.length} rows
        </button>
      </div>
    </SheetDialog>
  );
}

function isHeadingOf(first: readonly ReadCell[], second: readonly ReadCell[]): boolean {
  const numbers = second.map((cell) => cell.ok && typeof cell.value === 'number');
  return numbers.includes(true) && first.every((cell, c) => !numbers[c] || !cell.ok);
}
