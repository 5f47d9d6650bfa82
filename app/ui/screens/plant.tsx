// Heaters, coolers and air of every room in one table; carriers and what they cost.

import type { Building } from '../../../engine/index.ts';
import { nameOf, type ProjectForm, type RoomForm } from '../../project/index.ts';
import { shownUnit } from '../format/index.ts';
import { FormCell, FormChoice } from '../parts/form-cell.tsx';
import { useApp, useAppState, useEditedProject } from '../state/index.ts';
import { AirTable } from './plant-air.tsx';
import { Carriers } from './plant-carriers.tsx';

type Side = 'heating' | 'cooling';

export function Plant() {
  const project = useEditedProject();
  if (!project) return null;
  const { form, building } = project;
  return (
    <>
      <div className="sheet-head">
        <h1>Plant</h1>
        <span className="quiet">what heats, cools and airs each room</span>
      </div>
      <PlantTable side="heating" title="Heating" form={form} building={building} />
      <PlantTable side="cooling" title="Cooling" form={form} building={building} />
      <AirTable form={form} building={building} />
      <Carriers form={form} building={building} />
    </>
  );
}

interface PlantTableProps {
  readonly side: Side;
  readonly title: string;
  readonly form: ProjectForm;
  readonly building: Building;
}

function PlantTable({ side, title, form, building }: PlantTableProps) {
  const system = useAppState((state) => state.units);
  return (
    <>
      <h2 className="table-head">{title}</h2>
      <table className="layers grid-table" aria-label={title}>
        <thead>
          <tr>
            <th scope="col">Room</th>
            <th scope="col" className="word">
              Set-point
            </th>
            <th scope="col">{shownUnit('temperature', system).unit}</th>
            <th scope="col">Capacity {shownUnit('power', system).unit}</th>
            <th scope="col">Convective share</th>
            <th scope="col" className="word">
              Sensor
            </th>
            <th scope="col" className="word">
              Starts early
            </th>
            <th scope="col">
              <span className="unseen">Acts</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {form.rooms.map((room, i) => (
            <PlantRow
              key={room.id}
              room={room}
              side={side}
              building={building}
              path={`rooms[${i}].${side}`}
            />
          ))}
        </tbody>
      </table>
    </>
  );
}

interface PlantRowProps {
  readonly room: RoomForm;
  readonly side: Side;
  readonly building: Building;
  readonly path: string;
}

const usualC = { heating: 20, cooling: 26 } as const;

function PlantRow({ room, side, building, path }: PlantRowProps) {
  const app = useApp();
  const plant = room[side];
  const name = nameOf(room);
  if (!plant) {
    return (
      <tr>
        <th scope="row">{name}</th>
        <td colSpan={6} className="quiet">
          not {side === 'heating' ? 'heated' : 'cooled'}
        </td>
        <td className="row-acts">
          <button
            type="button"
            className="text-button"
            onClick={() =>
              app.edit({
                name: `${side === 'heating' ? 'Heater' : 'Cooler'} added to ${name}`,
                changes: [{ path, value: { setPointC: usualC[side] } }],
              })
            }
          >
            {side === 'heating' ? 'Heat it' : 'Cool it'}
            <span className="unseen">: {name}</span>
          </button>
        </td>
      </tr>
    );
  }
  const { setPointC } = plant;
  const isConstant = typeof setPointC === 'number';
  const schedules = building.schedules.map((one) => ({ value: one.id, name: one.name ?? one.id }));
  return (
    <tr>
      <th scope="row">{name}</th>
      <td>
        <FormChoice<string>
          label={`${name}, ${side} set-point`}
          path={`${path}.setPointC`}
          value={isConstant ? '' : setPointC.schedule}
          options={[{ value: '', name: 'Constant' }, ...schedules]}
          toField={(value) => (value === '' ? usualC[side] : { schedule: value })}
        />
      </td>
      <td className="number">
        {isConstant && (
          <FormCell
            label={`${name}, ${side} set-point, constant`}
            quantity="temperature"
            path={`${path}.setPointC`}
            value={setPointC}
            min={-20}
            max={60}
            step={0.5}
          />
        )}
      </td>
      <td className="number">
        <FormCell
          label={`${name}, ${side} capacity`}
          quantity="power"
          isOptional
          path={`${path}.maxW`}
          value={plant.maxW}
          min={0}
          max={1e7}
          step={100}
          help="Empty: without limit. A limit shows where the room is not kept warm enough"
        />
      </td>
      <td className="number">
        <FormCell
          label={`${name}, ${side} convective share`}
          quantity="share"
          isOptional
          path={`${path}.convectiveShare`}
          value={plant.convectiveShare}
          min={0}
          max={1}
          step={0.05}
          help="The rest goes to the surfaces as radiation. Air 1, convector 0.9, panel 0.7, floor 0.4; common practice"
        />
      </td>
      <td>
        <FormChoice<string>
          label={`${name}, ${side} sensor`}
          path={`${path}.sensor`}
          value={plant.sensor ?? 'air'}
          options={[
            { value: 'air', name: 'Air' },
            { value: 'operative', name: 'Operative' },
          ]}
        />
      </td>
      <td>
        {side === 'heating' && (
          <FormChoice<string>
            label={`${name}, heating starts early`}
            path={`${path}.optimumStart`}
            value={plant.optimumStart ? 'yes' : 'no'}
            options={[
              { value: 'no', name: 'At the set-point' },
              { value: 'yes', name: 'As early as needed' },
            ]}
            toField={(value) => (value === 'yes' ? {} : undefined)}
          />
        )}
      </td>
      <td className="row-acts">
        <button
          type="button"
          className="text-button"
          onClick={() =>
            app.edit({
              name: `${side === 'heating' ? 'Heater' : 'Cooler'} of ${name} removed`,
              changes: [{ path }],
            })
          }
        >
          Remove<span className="unseen"> from {name}</span>
        </button>
      </td>
    </tr>
  );
}
