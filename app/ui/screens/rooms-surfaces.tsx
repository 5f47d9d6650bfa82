import type { Building } from '../../../engine/index.ts';
import {
  addOpening,
  boundaryEdit,
  nameOf,
  type ProjectForm,
  type RoomForm,
  removeSurface,
  type SurfaceForm,
  surfaceEdit,
} from '../../project/index.ts';
import { shownUnit } from '../format/index.ts';
import { Choice } from '../parts/choice.tsx';
import { FormCell } from '../parts/form-cell.tsx';
import { NumberCell } from '../parts/number-cell.tsx';
import { useApp, useAppState } from '../state/index.ts';

export interface SurfaceTableProps {
  readonly form: ProjectForm;
  readonly building: Building;
  readonly room: RoomForm;
  readonly path: string;
}

/** What may lie behind a surface of this room, as choices. */
function behindChoices({ form, room }: SurfaceTableProps) {
  return [
    { value: 'outdoors', name: 'Outdoors' },
    ...form.rooms
      .filter(({ id }) => id !== room.id)
      .map(({ id, name }) => ({ value: `room:${id}`, name })),
    { value: 'ground', name: 'Ground, at a temperature' },
    ...(form.groundContacts ?? []).map((contact) => ({
      value: `contact:${contact.id}`,
      name: `Ground: ${contact.name ?? contact.id}`,
    })),
    { value: 'adiabatic', name: 'The same as here' },
    { value: 'fixed', name: 'A fixed temperature' },
  ];
}

function behindOf({ boundary }: SurfaceForm): string {
  if (boundary.kind === 'room') return `room:${boundary.room}`;
  if (boundary.kind === 'ground-contact') return `contact:${boundary.contact}`;
  return boundary.kind;
}

export function SurfaceTable(props: SurfaceTableProps) {
  const { room } = props;
  const system = useAppState((state) => state.units);
  return (
    <table className="layers grid-table" aria-label={`Surfaces of ${room.name}`}>
      <thead>
        <tr>
          <th scope="col">Surface</th>
          <th scope="col">Area {shownUnit('area', system).unit}</th>
          <th scope="col" title="0 a roof, 90 a wall, 180 a floor">
            Tilt °
          </th>
          <th scope="col" title="Where it looks, clockwise from north">
            Azimuth °
          </th>
          <th scope="col" className="word">
            Construction
          </th>
          <th scope="col" className="word">
            Behind it
          </th>
          <th scope="col">
            <span className="unseen">Acts</span>
          </th>
        </tr>
      </thead>
      <tbody>
        {room.surfaces.map((surface, j) => (
          <SurfaceRow key={surface.id} {...props} surface={surface} index={j} />
        ))}
      </tbody>
    </table>
  );
}

interface SurfaceRowProps extends SurfaceTableProps {
  readonly surface: SurfaceForm;
  readonly index: number;
}

function SurfaceRow(props: SurfaceRowProps) {
  const { form, building, room, path, surface, index } = props;
  const app = useApp();
  const name = nameOf(surface);
  const at = `${path}.surfaces[${index}]`;
  const set =
    (field: 'construction' | 'areaM2' | 'tiltDeg' | 'azimuthDeg', words: string) =>
    (value: string | number) =>
      app.edit(surfaceEdit(form, room, surface, field, value, `${room.name}, ${name}: ${words}`));
  const { boundary } = surface;
  const isFlat = surface.tiltDeg < 5 || surface.tiltDeg > 175;
  return (
    <tr>
      <th scope="row">{name}</th>
      <td className="number">
        <NumberCell
          label={`${name}, area`}
          quantity="area"
          path={`${at}.areaM2`}
          value={surface.areaM2}
          min={0.01}
          max={1e5}
          help="Gross: windows included. Of a partition, both faces follow"
          onCommit={set('areaM2', 'area')}
        />
      </td>
      <td className="number">
        <NumberCell
          label={`${name}, tilt`}
          quantity="angle"
          path={`${at}.tiltDeg`}
          value={surface.tiltDeg}
          min={0}
          max={180}
          step={5}
          help="0 a roof, 90 a wall, 180 a floor"
          onCommit={set('tiltDeg', 'tilt')}
        />
      </td>
      <td className="number">
        {!isFlat && (
          <NumberCell
            label={`${name}, azimuth`}
            quantity="angle"
            path={`${at}.azimuthDeg`}
            value={surface.azimuthDeg ?? 0}
            min={0}
            max={360}
            step={15}
            help="Where it looks: 0 north, 90 east, 180 south, 270 west"
            onCommit={set('azimuthDeg', 'azimuth')}
          />
        )}
      </td>
      <td>
        <Choice
          label={`${name}, construction`}
          path={`${at}.construction`}
          value={surface.construction}
          options={building.constructions.map(({ id, name: word }) => ({ value: id, name: word }))}
          onChoose={set('construction', 'construction')}
        />
      </td>
      <td>
        <Choice
          label={`${name}, what lies behind`}
          path={`${at}.boundary`}
          value={behindOf(surface)}
          options={behindChoices(props)}
          onChoose={(kind) => app.edit(boundaryEdit(form, room, surface, kind))}
        />{' '}
        {(boundary.kind === 'ground' || boundary.kind === 'fixed') &&
          (typeof boundary.temperatureC === 'number' ? (
            <FormCell
              label={`${name}, temperature behind`}
              quantity="temperature"
              path={`${at}.boundary.temperatureC`}
              value={boundary.temperatureC}
              min={-50}
              max={100}
            />
          ) : (
            <span className="note">by month or schedule</span>
          ))}
      </td>
      <td className="row-acts">
        <button
          type="button"
          className="text-button"
          disabled={boundary.kind !== 'outdoors'}
          onClick={() =>
            app.edit(addOpening(room, surface, building.glazings[0]?.id ?? 'double-warm-argon'))
          }
        >
          Add window<span className="unseen"> to {name}</span>
        </button>
        <button
          type="button"
          className="text-button"
          disabled={room.surfaces.length === 1}
          onClick={() => app.edit(removeSurface(form, room, surface))}
        >
          Remove<span className="unseen"> {name}</span>
        </button>
      </td>
    </tr>
  );
}
