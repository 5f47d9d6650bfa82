// Outdoor air of every room: what leaks in, and what is brought in.

import type { Building } from '../../../engine/index.ts';
import { nameOf, type ProjectForm } from '../../project/index.ts';
import { shownUnit } from '../format/index.ts';
import { FormCell, FormChoice } from '../parts/form-cell.tsx';
import { useApp, useAppState } from '../state/index.ts';

export function AirTable({ form, building }: { form: ProjectForm; building: Building }) {
  const app = useApp();
  const system = useAppState((state) => state.units);
  const schedules = [
    { value: '', name: 'Always' },
    ...building.schedules.map((one) => ({ value: one.id, name: one.name ?? one.id })),
  ];
  return (
    <>
      <h2 className="table-head">Outdoor air</h2>
      <table className="layers grid-table" aria-label="Outdoor air">
        <thead>
          <tr>
            <th scope="col">Room</th>
            <th scope="col">Infiltration 1/h</th>
            <th scope="col" className="word">
              Ventilation
            </th>
            <th scope="col">Flow {shownUnit('flow', system).unit}</th>
            <th scope="col">Heat recovery share</th>
            <th scope="col" className="word">
              When
            </th>
            <th scope="col">
              <span className="unseen">Acts</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {form.rooms.flatMap((room, i) => {
            const name = nameOf(room);
            const fans = room.ventilation ?? [];
            const taken = new Set(fans.map(({ id }) => id));
            const id = ['ventilation', 'ventilation-2', 'ventilation-3'].find(
              (one) => !taken.has(one),
            );
            const first = (
              <tr key={room.id}>
                <th scope="row">{name}</th>
                <td className="number">
                  <FormCell
                    label={`${name}, infiltration`}
                    quantity="perHour"
                    path={`rooms[${i}].infiltration.airChangesPerH`}
                    value={room.infiltration?.airChangesPerH ?? 0}
                    min={0}
                    max={100}
                    step={0.1}
                    help="Leaks in ordinary weather: old house 0.5 to 1, new house 0.1 to 0.3; common practice"
                  />
                </td>
                <td colSpan={4} />
                <td className="row-acts">
                  {id && (
                    <button
                      type="button"
                      className="text-button"
                      onClick={() =>
                        app.edit({
                          name: `Ventilation added to ${name}`,
                          changes: [
                            {
                              path: `rooms[${i}].ventilation[+]`,
                              value: { id, name: 'Ventilation', flowM3PerS: 0.01 },
                            },
                          ],
                        })
                      }
                    >
                      Add flow<span className="unseen"> to {name}</span>
                    </button>
                  )}
                </td>
              </tr>
            );
            const rest = fans.map((fan, k) => {
              const path = `rooms[${i}].ventilation[${k}]`;
              const words = `${name}, ${nameOf(fan).toLowerCase()}`;
              return (
                <tr key={`${room.id} ${fan.id}`}>
                  <td colSpan={2} />
                  <td>{nameOf(fan)}</td>
                  <td className="number">
                    <FormCell
                      label={`${words}, flow`}
                      quantity="flow"
                      path={`${path}.flowM3PerS`}
                      value={fan.flowM3PerS}
                      min={0}
                      max={1000}
                    />
                  </td>
                  <td className="number">
                    <FormCell
                      label={`${words}, heat recovery`}
                      quantity="share"
                      isOptional
                      path={`${path}.heatRecovery`}
                      value={typeof fan.heatRecovery === 'number' ? fan.heatRecovery : undefined}
                      min={0}
                      max={1}
                      step={0.05}
                    />
                  </td>
                  <td>
                    <FormChoice<string>
                      label={`${words}, when`}
                      path={`${path}.schedule`}
                      value={fan.schedule ?? ''}
                      options={schedules}
                      toField={(value) => (value === '' ? undefined : value)}
                    />
                  </td>
                  <td className="row-acts">
                    <button
                      type="button"
                      className="text-button"
                      onClick={() => app.edit({ name: `${words} removed`, changes: [{ path }] })}
                    >
                      Remove<span className="unseen"> {words}</span>
                    </button>
                  </td>
                </tr>
              );
            });
            return [first, ...rest];
          })}
        </tbody>
      </table>
    </>
  );
}
