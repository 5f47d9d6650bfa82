import type { Building } from '../../../engine/index.ts';
import {
  nameOf,
  type OpeningForm,
  openingAreaEdit,
  openingSizeEdit,
  type RoomForm,
  removeOpening,
  type SurfaceForm,
} from '../../project/index.ts';
import { shownUnit } from '../format/index.ts';
import { CopyTable } from '../parts/copy-table.tsx';
import { FormCell, FormChoice } from '../parts/form-cell.tsx';
import { NumberCell } from '../parts/number-cell.tsx';
import { useApp, useAppState } from '../state/index.ts';

export interface OpeningTableProps {
  readonly building: Building;
  readonly room: RoomForm;
  readonly path: string;
}

const sizes = [
  ['widthM', 'Width', 0.05],
  ['heightM', 'Height', 0.05],
  ['bottomM', 'Sill', 0],
  ['leftM', 'From left', 0],
] as const;

export function OpeningTable({ building, room, path }: OpeningTableProps) {
  const system = useAppState((state) => state.units);
  const rows = room.surfaces.flatMap((surface, j) =>
    (surface.openings ?? []).map((opening, k) => ({
      surface,
      opening,
      at: `${path}.surfaces[${j}].openings[${k}]`,
    })),
  );
  const length = shownUnit('length', system).unit;
  return (
    <>
      <h2 className="table-head">
        Windows and glazed doors{' '}
        {rows.length > 0 && <CopyTable label={`Windows of ${room.name}`} />}
      </h2>
      {rows.length === 0 ? (
        <p className="quiet">None yet. "Add window" stands at each surface that looks outdoors.</p>
      ) : (
        <table className="layers grid-table" aria-label={`Windows of ${room.name}`}>
          <thead>
            <tr>
              <th scope="col">Window, in</th>
              <th scope="col">Area {shownUnit('area', system).unit}</th>
              {sizes.map(([field, name]) => (
                <th key={field} scope="col">
                  {name} {length}
                </th>
              ))}
              <th scope="col">Overhang {length}</th>
              <th scope="col">Reveal {length}</th>
              <th scope="col" className="word">
                Glazing
              </th>
              <th scope="col">
                <span className="unseen">Acts</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => (
              <OpeningRow key={row.at} {...row} room={room} building={building} />
            ))}
          </tbody>
        </table>
      )}
    </>
  );
}

interface OpeningRowProps {
  readonly building: Building;
  readonly room: RoomForm;
  readonly surface: SurfaceForm;
  readonly opening: OpeningForm;
  readonly at: string;
}

function OpeningRow({ building, room, surface, opening, at }: OpeningRowProps) {
  const app = useApp();
  const name = nameOf(opening);
  const { rectangle, shading } = opening;
  return (
    <tr>
      <th scope="row">
        {name} <span className="note">{nameOf(surface).toLowerCase()}</span>
      </th>
      <td className="number">
        <NumberCell
          label={`${name}, area`}
          quantity="area"
          path={`${at}.areaM2`}
          value={opening.areaM2}
          min={0.01}
          max={1000}
          step={0.1}
          help="Of the whole window, frame included"
          onCommit={(areaM2) => app.edit(openingAreaEdit(room, surface, opening, areaM2))}
        />
      </td>
      {sizes.map(([field, word, min]) => (
        <td key={field} className="number">
          <NumberCell
            label={`${name}, ${word.toLowerCase()}`}
            quantity="length"
            path={`${at}.rectangle`}
            value={rectangle?.[field]}
            min={min}
            max={200}
            step={0.05}
            help="Needed for shading and for where the sun falls; left is as seen from inside"
            onCommit={(value) =>
              app.edit(openingSizeEdit(room, surface, opening, { [field]: value }))
            }
          />
        </td>
      ))}
      <td className="number">
        <NumberCell
          label={`${name}, overhang`}
          quantity="length"
          path={`${at}.shading.overhang`}
          value={shading?.overhang?.depthM}
          min={0.01}
          max={100}
          step={0.1}
          help="How far a plate above the head stands out from the wall"
          onEmpty={() =>
            app.edit({
              name: `Overhang of ${name} removed`,
              changes: [{ path: `${at}.shading.overhang` }],
            })
          }
          onCommit={(depthM) =>
            app.edit({
              name: `${name}, overhang`,
              changes: [{ path: `${at}.shading.overhang.depthM`, value: depthM }],
            })
          }
        />
      </td>
      <td className="number">
        <FormCell
          label={`${name}, reveal`}
          quantity="length"
          isOptional
          path={`${at}.shading.revealM`}
          value={shading?.revealM}
          min={0}
          max={10}
          step={0.01}
          help="How far the glass stands behind the outer face; usual 0.05 to 0.2 m"
        />
      </td>
      <td>
        <FormChoice
          label={`${name}, glazing`}
          path={`${at}.glazing`}
          value={opening.glazing}
          options={building.glazings.map(({ id, name: word }) => ({ value: id, name: word }))}
        />
      </td>
      <td className="row-acts">
        <button
          type="button"
          className="text-button"
          onClick={() => app.edit(removeOpening(room, surface, opening))}
        >
          Remove<span className="unseen"> {name}</span>
        </button>
      </td>
    </tr>
  );
}
