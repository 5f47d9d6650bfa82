// The rooms of a storey as figures: what is dragged in the drawing is typed here.

import {
  addWindow,
  compassWord,
  type Plan,
  type PlanRoom,
  type ProjectForm,
  placeEdit,
  removePlanRoom,
  type Side,
  type Storey,
  sideAzimuthDeg,
  sideLengthM,
  sides,
} from '../../../project/index.ts';
import { figure, shownUnit } from '../../format/index.ts';
import { NumberCell } from '../../parts/number-cell.tsx';
import { TextCell } from '../../parts/text-cell.tsx';
import { useApp, useAppState } from '../../state/index.ts';

export interface PlanTableProps {
  readonly form: ProjectForm;
  readonly plan: Plan;
  readonly storey: Storey;
  readonly chosen: string | null;
  readonly onDraw: (rectangle: Omit<PlanRoom, 'room' | 'storey'>) => void;
}

const fields = [
  ['widthM', 'Width', 0.3, 300],
  ['depthM', 'Depth', 0.3, 300],
  ['xM', 'From left', -10_000, 10_000],
  ['yM', 'From bottom', -10_000, 10_000],
] as const;
const usual = { widthM: 4, depthM: 3 };

export function PlanTable({ form, plan, storey, chosen, onDraw }: PlanTableProps) {
  const app = useApp();
  const unit = shownUnit(
    'length',
    useAppState((state) => state.units),
  ).unit;
  const rooms = plan.rooms.filter((place) => place.storey === storey.id);
  const right = Math.max(0, ...rooms.map(({ xM, widthM }) => xM + widthM));
  const bottom = rooms.length === 0 ? 0 : Math.min(...rooms.map(({ yM }) => yM));
  return (
    <>
      <h2 className="table-head">Rooms of the {storey.name.toLowerCase()}</h2>
      <table className="layers grid-table" aria-label={`Rooms of the ${storey.name.toLowerCase()}`}>
        <thead>
          <tr>
            <th scope="col">Room</th>
            {fields.map(([field, name]) => (
              <th key={field} scope="col">
                {name} {unit}
              </th>
            ))}
            <th scope="col">Floor m²</th>
            <th scope="col" className="word">
              Add window to
            </th>
            <th scope="col">
              <span className="unseen">Acts</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {rooms.map((place) => {
            const index = form.rooms.findIndex(({ id }) => id === place.room);
            const name = form.rooms[index]?.name ?? place.room;
            return (
              <tr
                key={place.room}
                className={place.room === chosen ? 'is-chosen' : ''}
                onFocus={() => place.room !== chosen && app.choose('plan', place.room)}
              >
                <th scope="row">
                  <TextCell
                    label={`Name of ${name}`}
                    value={name}
                    onCommit={(next) =>
                      app.edit({
                        name: `${name} named ${next}`,
                        changes: [{ path: `rooms[${index}].name`, value: next }],
                      })
                    }
                  />
                </th>
                {fields.map(([field, word, min, max]) => (
                  <td key={field} className="number">
                    <NumberCell
                      label={`${name}, ${word.toLowerCase()}`}
                      quantity="length"
                      value={place[field]}
                      min={min}
                      max={max}
                      step={0.05}
                      onCommit={(value) =>
                        app.edit(
                          placeEdit(
                            form,
                            plan,
                            [{ ...place, [field]: value }],
                            `${name}, ${word.toLowerCase()} ${figure(value, 2)} m`,
                          ),
                        )
                      }
                    />
                  </td>
                ))}
                <td className="number">{figure(place.widthM * place.depthM, 2)}</td>
                <td className="row-acts">
                  {sides.map((side) => (
                    <WindowButton
                      key={side}
                      side={side}
                      name={name}
                      place={place}
                      plan={plan}
                      form={form}
                    />
                  ))}
                </td>
                <td className="row-acts">
                  <button
                    type="button"
                    className="text-button"
                    disabled={form.rooms.length === 1}
                    onClick={() => {
                      const edit = removePlanRoom(form, plan, place.room);
                      if (edit) app.edit(edit);
                    }}
                  >
                    Remove<span className="unseen"> {name}</span>
                  </button>
                </td>
              </tr>
            );
          })}
        </tbody>
      </table>
      <button
        type="button"
        className="button after-table"
        onClick={() => onDraw({ ...usual, xM: right, yM: bottom })}
      >
        Add room
      </button>
    </>
  );
}

interface WindowButtonProps {
  readonly side: Side;
  readonly name: string;
  readonly place: PlanRoom;
  readonly plan: Plan;
  readonly form: ProjectForm;
}

/** In the middle of a side, where that is an outside wall. */
function WindowButton({ side, name, place, plan, form }: WindowButtonProps) {
  const app = useApp();
  const word = compassWord(sideAzimuthDeg(plan, side));
  const edit = addWindow(form, plan, place, side, sideLengthM(place, side) / 2);
  return (
    <button
      type="button"
      className="text-button"
      disabled={!edit}
      onClick={() => edit && app.edit(edit)}
    >
      {word}
      <span className="unseen"> wall of {name}</span>
    </button>
  );
}
