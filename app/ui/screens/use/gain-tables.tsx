// Gains of every room, the comfort band, and the calendar that people keep.

import type { Building } from '../../../../engine/index.ts';
import {
  addGain,
  amountOf,
  type GainAmount,
  gainAmountEdit,
  nameOf,
  type ProjectForm,
  type RoomForm,
  usualAmount,
} from '../../../project/index.ts';
import type { QuantityName } from '../../format/index.ts';
import { Choice } from '../../parts/choice.tsx';
import { FormCell, FormChoice } from '../../parts/form-cell.tsx';
import { NumberCell } from '../../parts/number-cell.tsx';
import { useApp } from '../../state/index.ts';

export interface GainTablesProps {
  readonly form: ProjectForm;
  readonly building: Building;
}

const kinds = [
  { value: 'people', name: 'People' },
  { value: 'lighting', name: 'Lighting' },
  { value: 'equipment', name: 'Equipment' },
] as const;
const amounts: readonly { readonly value: GainAmount; readonly name: string }[] = [
  { value: 'powerW', name: 'W' },
  { value: 'powerWPerM2', name: 'W/m²' },
  { value: 'persons', name: 'people' },
  { value: 'floorPerPersonM2', name: 'm² each person' },
];
const quantities: Readonly<Record<GainAmount, QuantityName>> = {
  powerW: 'power',
  powerWPerM2: 'powerPerArea',
  persons: 'number',
  floorPerPersonM2: 'area',
};

export function GainTables({ form, building }: GainTablesProps) {
  const schedules = building.schedules.map((one) => ({ value: one.id, name: nameOf(one) }));
  return (
    <>
      <table className="layers grid-table" aria-label="Gains">
        <thead>
          <tr>
            <th scope="col">Room, gain</th>
            <th scope="col" className="word">
              Kind
            </th>
            <th scope="col">Amount</th>
            <th scope="col" className="word">
              in
            </th>
            <th scope="col" className="word">
              When
            </th>
            <th scope="col">Radiant share</th>
            <th scope="col">
              <span className="unseen">Acts</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {form.rooms.map((room, i) => (
            <RoomGains key={room.id} room={room} index={i} schedules={schedules} />
          ))}
        </tbody>
      </table>
      <ComfortTable form={form} building={building} />
    </>
  );
}

interface RoomGainsProps {
  readonly room: RoomForm;
  readonly index: number;
  readonly schedules: readonly { readonly value: string; readonly name: string }[];
}

function RoomGains({ room, index, schedules }: RoomGainsProps) {
  const app = useApp();
  const name = nameOf(room);
  return (
    <>
      <tr className="group-row">
        <th scope="row">{name}</th>
        <td colSpan={5} className="quiet">
          {room.usage
            ? `by the usage profile ${typeof room.usage === 'string' ? room.usage : room.usage.profile}`
            : ''}
        </td>
        <td className="row-acts">
          <button type="button" className="text-button" onClick={() => app.edit(addGain(room))}>
            Add gain<span className="unseen"> to {name}</span>
          </button>
        </td>
      </tr>
      {(room.gains ?? []).map((gain, k) => {
        const path = `rooms[${index}].gains[${k}]`;
        const amount = amountOf(gain);
        const words = `${name}, ${nameOf(gain).toLowerCase()}`;
        return (
          <tr key={gain.id}>
            <th scope="row" className="is-inner">
              {nameOf(gain)}
            </th>
            <td>
              <FormChoice<string>
                label={`${words}, kind`}
                path={`${path}.kind`}
                value={gain.kind}
                options={kinds}
              />
            </td>
            <td className="number">
              <NumberCell
                label={`${words}, amount`}
                quantity={quantities[amount]}
                path={`${path}.${amount}`}
                value={gain[amount]}
                min={amount === 'floorPerPersonM2' ? 0.1 : 0}
                max={amount === 'powerW' ? 1e6 : 1e4}
                step={amount === 'powerW' ? 10 : 1}
                onCommit={(value) =>
                  app.edit(gainAmountEdit(path, `${words}, amount`, amount, value))
                }
              />
            </td>
            <td>
              <Choice<GainAmount>
                label={`${words}, unit`}
                value={amount}
                options={amounts}
                onChoose={(next) =>
                  app.edit(gainAmountEdit(path, `${words}, unit`, next, usualAmount[next]))
                }
              />
            </td>
            <td>
              <FormChoice<string>
                label={`${words}, when`}
                path={`${path}.schedule`}
                value={gain.schedule ?? ''}
                options={[{ value: '', name: 'Always' }, ...schedules]}
                toField={(value) => (value === '' ? undefined : value)}
              />
            </td>
            <td className="number">
              <FormCell
                label={`${words}, radiant share`}
                quantity="share"
                isOptional
                path={`${path}.radiantShare`}
                value={gain.radiantShare}
                min={0}
                max={1}
                step={0.05}
                help="The rest warms the air. People 0.5, lamps 0.6, machines 0.3; common practice"
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
      })}
    </>
  );
}

function ComfortTable({ form, building }: GainTablesProps) {
  const app = useApp();
  const schedules = [
    { value: '', name: 'Every hour' },
    ...building.schedules.map((one) => ({ value: one.id, name: nameOf(one) })),
  ];
  return (
    <>
      <h2 className="table-head">Comfort band, operative temperature</h2>
      <table className="layers grid-table" aria-label="Comfort band">
        <thead>
          <tr>
            <th scope="col">Room</th>
            <th scope="col">From</th>
            <th scope="col">To</th>
            <th scope="col" className="word">
              Judged when
            </th>
            <th scope="col">
              <span className="unseen">Acts</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {form.rooms.map((room, i) => {
            const { comfort } = room;
            const name = nameOf(room);
            const path = `rooms[${i}].comfort`;
            if (!comfort) {
              return (
                <tr key={room.id}>
                  <th scope="row">{name}</th>
                  <td colSpan={3} className="quiet">
                    not judged
                  </td>
                  <td className="row-acts">
                    <button
                      type="button"
                      className="text-button"
                      onClick={() =>
                        app.edit({
                          name: `Comfort band for ${name}`,
                          changes: [{ path, value: { bandLowC: 20, bandHighC: 26 } }],
                        })
                      }
                    >
                      Judge it<span className="unseen">: {name}</span>
                    </button>
                  </td>
                </tr>
              );
            }
            return (
              <tr key={room.id}>
                <th scope="row">{name}</th>
                {(['bandLowC', 'bandHighC'] as const).map((field) => {
                  const limit = comfort[field];
                  return (
                    <td key={field} className="number">
                      {typeof limit === 'number' ? (
                        <FormCell
                          label={`${name}, band ${field === 'bandLowC' ? 'from' : 'to'}`}
                          quantity="temperature"
                          path={`${path}.${field}`}
                          value={limit}
                          min={-20}
                          max={60}
                          step={0.5}
                        />
                      ) : (
                        <span className="note">by schedule</span>
                      )}
                    </td>
                  );
                })}
                <td>
                  <FormChoice<string>
                    label={`${name}, judged when`}
                    path={`${path}.occupied`}
                    value={comfort.occupied ?? ''}
                    options={schedules}
                    toField={(value) => (value === '' ? undefined : value)}
                  />
                </td>
                <td />
              </tr>
            );
          })}
        </tbody>
      </table>
    </>
  );
}
