// The frame of every drawing: its heading, its text equivalent, and its data as a table on demand.

import { type ReactNode, useId, useState } from 'react';

export interface DrawingTable {
  readonly columns: readonly string[];
  /** First cell is the row's head. Called only when the table is shown. */
  readonly rows: () => readonly (readonly string[])[];
}

export interface DrawingProps {
  readonly title: string;
  readonly note?: ReactNode;
  /** What the drawing shows, in a sentence or two, for those who do not see it. */
  readonly equivalent: string;
  readonly table?: DrawingTable;
  readonly aside?: ReactNode;
  readonly children: ReactNode;
}

export function Drawing({ title, note, equivalent, table, aside, children }: DrawingProps) {
  const id = useId();
  const [isTable, setTable] = useState(false);
  return (
    <section className="drawing" aria-labelledby={id} aria-describedby={`${id}-text`}>
      <div className="drawing-head">
        <h2 id={id}>{title}</h2>
        {note && <span className="note">{note}</span>}
        <span className="drawing-aside">
          {aside}
          {table && (
            <button type="button" className="text-button" onClick={() => setTable(!isTable)}>
              {isTable ? 'Drawing' : 'Table'}
              <span className="unseen"> of {title}</span>
            </button>
          )}
        </span>
      </div>
      <p id={`${id}-text`} className="unseen">
        {equivalent}
      </p>
      {isTable && table ? <DataTable label={title} table={table} /> : children}
    </section>
  );
}

function DataTable({ label, table }: { label: string; table: DrawingTable }) {
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: a scrolled region must take the arrow keys
    <section className="data-table" tabIndex={0} aria-label={`${label}, data`}>
      <table>
        <thead>
          <tr>
            {table.columns.map((column) => (
              <th key={column} scope="col">
                {column}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {table.rows().map(([head, ...cells]) => (
            <tr key={head}>
              <th scope="row">{head}</th>
              {cells.map((cell, i) => (
                <td key={table.columns[i + 1]}>{cell}</td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
