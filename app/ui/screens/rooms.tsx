// One room as plain tables: its sizes, its surfaces, its windows. No drawing is needed.

import { useState } from 'react';
import {
  addSurface,
  copyRoom,
  nameOf,
  type ProjectForm,
  type RoomForm,
  removeRoom,
  surfaceRowsEdit,
} from '../../project/index.ts';
import { figure } from '../format/index.ts';
import { CopyTable } from '../parts/copy-table.tsx';
import { FormCell } from '../parts/form-cell.tsx';
import { PasteDialog } from '../parts/paste-dialog.tsx';
import { TextCell } from '../parts/text-cell.tsx';
import { useApp, useAppState, useEditedProject } from '../state/index.ts';
import { OpeningTable } from './rooms-openings.tsx';
import { surfaceColumns, surfaceRow } from './rooms-paste.ts';
import { SurfaceTable } from './rooms-surfaces.tsx';

export function Rooms() {
  const app = useApp();
  const project = useEditedProject();
  const [isPasting, setPasting] = useState(false);
  const chosen = useAppState((state) => state.chosen.rooms);
  if (!project) return null;
  const { form, building } = project;
  const index = Math.max(
    0,
    form.rooms.findIndex(({ id }) => id === chosen),
  );
  const room = form.rooms[index];
  if (!room) return null;
  const path = `rooms[${index}]`;
  const wall = room.surfaces[0]?.construction ?? building.constructions[0]?.id ?? '';

  return (
    <div key={room.id}>
      <div className="sheet-head">
        <h1 className="unseen">{room.name}</h1>
        <TextCell
          label="Name of the room"
          className="is-title"
          value={room.name}
          onCommit={(name) =>
            app.edit({
              name: `${room.name} named ${name}`,
              changes: [{ path: `${path}.name`, value: name }],
            })
          }
        />
        <span className="quiet">as a table of surfaces</span>
        <span className="sheet-acts">
          <button type="button" className="button" onClick={() => app.edit(addSurface(room, wall))}>
            Add surface
          </button>
          <button type="button" className="button" onClick={() => setPasting(true)}>
            Paste surfaces…
          </button>
          <button
            type="button"
            className="button"
            onClick={() => {
              const { edit, id } = copyRoom(form, room);
              app.edit(edit);
              app.choose('rooms', id);
            }}
          >
            Copy room
          </button>
          <button
            type="button"
            className="button"
            disabled={form.rooms.length === 1}
            onClick={() => app.edit(removeRoom(form, room))}
          >
            Remove room
          </button>
        </span>
      </div>
      <RoomSizes form={form} room={room} path={path} />
      <CopyTable label={`Surfaces of ${room.name}`} />
      <SurfaceTable form={form} building={building} room={room} path={path} />
      <OpeningTable building={building} room={room} path={path} />
      {isPasting && (
        <PasteDialog
          label="Paste surfaces"
          note="One surface a row. A surface of the same name is changed, others are added, outdoors."
          columns={surfaceColumns(building)}
          onTake={(rows) => app.edit(surfaceRowsEdit(room, rows.map(surfaceRow)))}
          onClose={() => setPasting(false)}
        />
      )}
    </div>
  );
}

function RoomSizes({ room, path }: { form: ProjectForm; room: RoomForm; path: string }) {
  const app = useApp();
  const { box } = room;
  const name = nameOf(room);
  return (
    <div className="fields">
      <span>Floor area</span>
      <FormCell
        label={`${name}, floor area`}
        quantity="area"
        hasUnit
        path={`${path}.floorAreaM2`}
        value={room.floorAreaM2}
        min={0.01}
        max={1e5}
        help="Inside, wall to wall. Gains per area and kWh/m² are reckoned with it"
      />
      <span>Volume</span>
      <FormCell
        label={`${name}, volume`}
        quantity="volume"
        hasUnit
        path={`${path}.volumeM3`}
        value={room.volumeM3}
        min={0.01}
        max={1e6}
        help="Of the air. Air changes are reckoned with it"
      />
      {box && (
        <>
          <span>Inside box</span>
          <span className="quiet">
            {figure(box.lengthM, 2)} × {figure(box.depthM, 2)} × {figure(box.heightM, 2)} m; view
            factors are exact{' '}
            <button
              type="button"
              className="link"
              title="Then surfaces of any size may be given; view factors are approximate"
              onClick={() =>
                app.edit({
                  name: `${name} is no box`,
                  changes: [{ path: `${path}.box` }],
                })
              }
            >
              Leave the box out
            </button>
          </span>
        </>
      )}
    </div>
  );
}
