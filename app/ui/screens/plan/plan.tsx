// The plan: storeys, rooms as rectangles, windows on their walls. Everything that is dragged can be
// typed in the tables under the drawing.

import { useState } from 'react';
import {
  addPlanRoom,
  addStorey,
  type Plan as Drawing,
  overlaps,
  type PlanRoom,
  type ProjectForm,
  planOf,
  startPlan,
  storeyHeightEdit,
  turnEdit,
} from '../../../project/index.ts';
import { figure } from '../../format/index.ts';
import { Choice } from '../../parts/choice.tsx';
import { NumberCell } from '../../parts/number-cell.tsx';
import { useApp, useAppState, useEditedProject } from '../../state/index.ts';
import { OpeningTable } from '../rooms-openings.tsx';
import { Axonometry } from './axonometry.tsx';
import { PlanDrawing } from './plan-drawing.tsx';
import { PlanTable } from './plan-table.tsx';

export type Tool = 'select' | 'room' | 'window';

export function Plan() {
  const app = useApp();
  const project = useEditedProject();
  if (!project) return null;
  const plan = planOf(project.form);
  if (plan) return <PlanSheet form={project.form} plan={plan} />;
  return (
    <>
      <div className="sheet-head">
        <h1>Plan</h1>
      </div>
      <p className="quiet">
        This house has rooms in tables and no drawing yet. Rooms that you draw are added to them;
        those in tables stay as they are, under Rooms.
      </p>
      <button
        type="button"
        className="button is-filled after-table"
        onClick={() => app.edit(startPlan(project.form))}
      >
        Start a drawing
      </button>
    </>
  );
}

const tools: readonly (readonly [Tool, string])[] = [
  ['select', 'Select'],
  ['room', 'Draw room'],
  ['window', 'Place window'],
];
const snaps = [
  { value: '0.05', name: 'Snap 0.05 m' },
  { value: '0.1', name: 'Snap 0.1 m' },
  { value: '0.5', name: 'Snap 0.5 m' },
] as const;

function PlanSheet({ form, plan }: { form: ProjectForm; plan: Drawing }) {
  const app = useApp();
  const building = useEditedProject()?.building;
  const [tool, setTool] = useState<Tool>('select');
  const [snap, setSnap] = useState<(typeof snaps)[number]['value']>('0.05');
  const [storeyId, setStorey] = useState(plan.storeys[0]?.id ?? '');
  const roomId = useAppState((state) => state.chosen.plan) ?? null;
  const storey = plan.storeys.find(({ id }) => id === storeyId) ?? plan.storeys[0];
  const place =
    plan.rooms.find(({ room, storey: at }) => room === roomId && at === storey?.id) ?? null;
  const index = form.rooms.findIndex(({ id }) => id === place?.room);
  const room = form.rooms[index];
  const undrawn = form.rooms.length - plan.rooms.length;
  if (!storey) return null;

  function draw(rectangle: Omit<PlanRoom, 'room' | 'storey'>) {
    if (!storey) return;
    const { edit, id } = addPlanRoom(form, plan, { ...rectangle, storey: storey.id });
    app.edit(edit);
    app.choose('plan', id);
    setTool('select');
  }

  return (
    <>
      <div className="sheet-head">
        <h1>Plan</h1>
        <span className="quiet">
          inner sizes
          {undrawn > 0
            ? `; ${undrawn === 1 ? '1 room is' : `${figure(undrawn)} rooms are`} in tables only`
            : ''}
        </span>
        <span className="sheet-acts">
          <Choice label="Snap to" value={snap} options={snaps} onChoose={setSnap} />
          <button
            type="button"
            className="button"
            onClick={() => {
              const { edit, id } = addStorey(form, plan);
              app.edit(edit);
              setStorey(id);
            }}
          >
            Add storey
          </button>
        </span>
      </div>
      <div className="plan-bar">
        <div className="tabs" role="tablist" aria-label="Storey">
          {plan.storeys.map(({ id, name }) => (
            <button
              key={id}
              id={`storey-${id}`}
              type="button"
              role="tab"
              aria-selected={id === storey.id}
              aria-controls="plan-panel"
              onClick={() => setStorey(id)}
            >
              {name}
            </button>
          ))}
        </div>
        <fieldset className="tools">
          <legend className="unseen">Drawing tool</legend>
          {tools.map(([name, label]) => (
            <button
              key={name}
              type="button"
              aria-pressed={tool === name}
              onClick={() => setTool(name)}
            >
              {label}
            </button>
          ))}
        </fieldset>
      </div>
      <Overlaps plan={plan} form={form} />
      <div role="tabpanel" id="plan-panel" aria-labelledby={`storey-${storey.id}`}>
        <div className="plan-pictures">
          <PlanDrawing
            form={form}
            plan={plan}
            storey={storey}
            chosen={place}
            tool={tool}
            snapM={Number(snap)}
            onDraw={draw}
          />
          <div className="plan-aside">
            <Axonometry form={form} plan={plan} chosen={place?.room ?? null} />
            <div className="pairs">
              <span>Storey height</span>
              <NumberCell
                label="Storey height"
                quantity="length"
                hasUnit
                value={storey.heightM}
                min={1.5}
                max={50}
                step={0.05}
                help="Inside, floor to ceiling; dwellings 2.3 to 2.8 m"
                onCommit={(heightM) => app.edit(storeyHeightEdit(form, plan, storey.id, heightM))}
              />
              <span>Top looks to</span>
              <NumberCell
                label="Top of the plan looks to"
                quantity="angle"
                hasUnit
                value={plan.topAzimuthDeg}
                min={0}
                max={359}
                step={5}
                help="0 north, 90 east. Turns the whole house"
                onCommit={(degrees) => app.edit(turnEdit(form, plan, degrees))}
              />
            </div>
          </div>
        </div>
        <PlanTable
          form={form}
          plan={plan}
          storey={storey}
          chosen={place?.room ?? null}
          onDraw={draw}
        />
        {room && building && (
          <OpeningTable building={building} room={room} path={`rooms[${index}]`} />
        )}
      </div>
    </>
  );
}

function Overlaps({ plan, form }: { plan: Drawing; form: ProjectForm }) {
  const pairs = overlaps(plan);
  const nameOf = (id: string) => form.rooms.find((room) => room.id === id)?.name ?? id;
  return pairs.map(([a, b]) => (
    <p key={`${a.room} ${b.room}`} className="caution">
      <b>Rooms in each other.</b> {nameOf(a.room)} and {nameOf(b.room)} cover the same floor. Move
      or shorten one, else its heat counts twice.
    </p>
  ));
}
