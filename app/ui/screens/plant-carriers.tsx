import type { Building } from '../../../engine/index.ts';
import { freeId, type ProjectForm } from '../../project/index.ts';
import { FormCell } from '../parts/form-cell.tsx';
import { TextCell } from '../parts/text-cell.tsx';
import { useApp } from '../state/index.ts';

/** What is bought, at the user's own prices; the program knows none. */
export function Carriers({ form, building }: { form: ProjectForm; building: Building }) {
  const app = useApp();
  const carriers = form.energy?.carriers ?? [];
  const currency = building.energy.currency || 'money';
  return (
    <>
      <h2 className="table-head">What is bought</h2>
      <table className="layers grid-table" aria-label="What is bought">
        <thead>
          <tr>
            <th scope="col">Carrier</th>
            <th scope="col">Price {currency}/kWh</th>
            <th scope="col">
              CO<sub>2</sub> kg/kWh
            </th>
            <th scope="col">
              <span className="unseen">Acts</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {carriers.map((carrier, i) => (
            <tr key={carrier.id}>
              <th scope="row">
                <TextCell
                  label={`Name of ${carrier.name}`}
                  value={carrier.name}
                  onCommit={(name) =>
                    app.edit({
                      name: `${carrier.name} named ${name}`,
                      changes: [{ path: `energy.carriers[${i}].name`, value: name }],
                    })
                  }
                />
              </th>
              <td className="number">
                <FormCell
                  label={`${carrier.name}, price`}
                  quantity="number"
                  path={`energy.carriers[${i}].costPerKWh`}
                  value={carrier.costPerKWh ?? 0}
                  min={-1000}
                  max={1000}
                  step={0.01}
                />
              </td>
              <td className="number">
                <FormCell
                  label={`${carrier.name}, carbon`}
                  quantity="number"
                  path={`energy.carriers[${i}].co2KgPerKWh`}
                  value={carrier.co2KgPerKWh ?? 0}
                  min={-10}
                  max={10}
                  step={0.01}
                />
              </td>
              <td className="row-acts">
                <button
                  type="button"
                  className="text-button"
                  onClick={() =>
                    app.edit({
                      name: `${carrier.name} removed`,
                      changes: [{ path: `energy.carriers[${i}]` }],
                    })
                  }
                >
                  Remove<span className="unseen"> {carrier.name}</span>
                </button>
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      <button
        type="button"
        className="button after-table"
        onClick={() =>
          app.edit({
            name: 'Carrier added',
            changes: [
              {
                path: 'energy.carriers[+]',
                value: {
                  id: freeId(
                    'carrier',
                    carriers.map(({ id }) => id),
                  ),
                  name: 'Gas or power',
                },
              },
            ],
          })
        }
      >
        Add carrier
      </button>
    </>
  );
}
