// Everything wrong with a file, together: where, what was found, what was expected, how to mend it.

import type { Fault } from '../../../weather/index.ts';
import { figure } from '../format/index.ts';

export function placeText({ place }: Fault): string {
  if ('path' in place) return place.path || 'the whole file';
  return `row ${figure(place.row)}, column ${place.column}`;
}

export interface FaultListProps {
  readonly faults: readonly Fault[];
  /** Leads to the field, where the window has one for it; null where not. */
  readonly jumpOf?: (fault: Fault) => (() => void) | null;
}

export function FaultList({ faults, jumpOf }: FaultListProps) {
  const files = [...new Set(faults.map((fault) => fault.file))];
  return (
    <section className="faults" aria-label="Faults">
      {files.map((file) => {
        const own = faults.filter((fault) => fault.file === file);
        return (
          <table key={file}>
            <caption>
              <strong>{file}</strong>{' '}
              {own.length === 1 ? '1 fault' : `${figure(own.length)} faults`}
            </caption>
            <thead>
              <tr>
                <th scope="col">Where</th>
                <th scope="col">Found</th>
                <th scope="col">Expected</th>
                <th scope="col">To mend it</th>
              </tr>
            </thead>
            <tbody>
              {own.map((fault) => (
                <tr key={`${placeText(fault)} ${fault.found} ${fault.expected}`}>
                  <th scope="row">
                    <Place fault={fault} jump={jumpOf?.(fault) ?? null} />
                  </th>
                  <td>{fault.found}</td>
                  <td>{fault.expected}</td>
                  <td>{fault.mend}</td>
                </tr>
              ))}
            </tbody>
          </table>
        );
      })}
    </section>
  );
}

function Place({ fault, jump }: { fault: Fault; jump: (() => void) | null }) {
  if (!jump) return placeText(fault);
  return (
    <button type="button" className="link" onClick={jump}>
      {placeText(fault)}
    </button>
  );
}
