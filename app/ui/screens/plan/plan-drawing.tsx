// The storey as a drawing: rooms, walls, windows, a handle on each side of the chosen room.

import { type PointerEvent, useState } from 'react';
import type { Plan, PlanRoom, ProjectForm, Storey } from '../../../project/index.ts';
import { useWidth } from '../../chart/use-width.ts';
import type { Tool } from './plan.tsx';
import { type PlanScale, planScale } from './plan-scale.ts';
import { RoomPicture } from './room-picture.tsx';
import { type Grabbed, usePlanDrag } from './use-plan-drag.ts';

export interface PlanDrawingProps {
  readonly form: ProjectForm;
  readonly plan: Plan;
  readonly storey: Storey;
  readonly chosen: PlanRoom | null;
  readonly tool: Tool;
  readonly snapM: number;
  readonly onDraw: (rectangle: Omit<PlanRoom, 'room' | 'storey'>) => void;
}

const mostHeight = 440;

export function PlanDrawing(props: PlanDrawingProps) {
  const { form, plan, storey, chosen, tool } = props;
  const [ref, width] = useWidth<HTMLDivElement>(520);
  const [frozen, setFrozen] = useState<PlanScale | null>(null);
  // While something is dragged the paper stays where it is.
  const scale = frozen ?? planScale(plan, width, mostHeight);
  const drag = usePlanDrag(props, scale);
  const here = plan.rooms.filter((room) => room.storey === storey.id);
  const index = plan.storeys.findIndex(({ id }) => id === storey.id);
  const below = plan.rooms.filter((room) => room.storey === plan.storeys[index - 1]?.id);

  function grab(event: PointerEvent<SVGElement>, what: Grabbed) {
    event.stopPropagation();
    const svg = event.currentTarget.closest('svg');
    svg?.setPointerCapture(event.pointerId);
    setFrozen(scale);
    drag.grab(at(event, svg), what);
  }
  const at = (event: PointerEvent, svg: Element | null) => {
    const box = (svg ?? event.currentTarget).getBoundingClientRect();
    return scale.toM(event.clientX - box.left, event.clientY - box.top);
  };
  function drop() {
    drag.drop();
    setFrozen(null);
  }
  const dots: { x: number; y: number }[] = [];
  const { x: _, y: lowY } = scale.toM(0, scale.height - 40);
  const { y: highY } = scale.toM(0, 12);
  for (let x = scale.fromX; x <= scale.toX; x++)
    for (let y = Math.ceil(lowY); y <= highY; y++) dots.push({ x, y });

  return (
    <div ref={ref} className={`plan-drawing is-${tool}`}>
      <svg
        width={width}
        height={scale.height}
        aria-hidden="true"
        className="section-picture"
        onPointerDown={(event) => {
          if (tool === 'room') grab(event, { kind: 'new' });
        }}
        onPointerMove={(event) => drag.move(at(event, event.currentTarget))}
        onPointerUp={drop}
        onPointerCancel={drop}
      >
        {dots.map(({ x, y }) => (
          <path
            key={`${x} ${y}`}
            className="plan-dot"
            d={`M${scale.x(x) - 2} ${scale.y(y)}h4M${scale.x(x)} ${scale.y(y) - 2}v4`}
          />
        ))}
        {below.map((room) => (
          <rect
            key={room.room}
            className="plan-below"
            x={scale.x(room.xM)}
            y={scale.y(room.yM + room.depthM)}
            width={room.widthM * scale.pxPerM}
            height={room.depthM * scale.pxPerM}
          />
        ))}
        {here.map((room) => (
          <RoomPicture
            key={room.room}
            place={room}
            plan={plan}
            form={form}
            scale={scale}
            isChosen={room.room === chosen?.room}
            tool={tool}
            onGrab={grab}
          />
        ))}
        {drag.fresh && (
          <rect
            className="plan-fresh"
            x={scale.x(drag.fresh.xM)}
            y={scale.y(drag.fresh.yM + drag.fresh.depthM)}
            width={drag.fresh.widthM * scale.pxPerM}
            height={drag.fresh.depthM * scale.pxPerM}
          />
        )}
        <PlanEdge scale={scale} />
        <NorthArrow x={width - 22} y={26} topAzimuthDeg={plan.topAzimuthDeg} />
      </svg>
      <p className="note plan-say" role="status">
        {drag.words ||
          {
            select: 'Drag a room, or a handle of the chosen one; shared walls move together.',
            room: 'Drag from corner to corner to draw a room.',
            window: 'Click on an outside wall to place a window; drag a window along its wall.',
          }[tool]}
      </p>
    </div>
  );
}

/** The measured edge under the plan, in metres. */
function PlanEdge({ scale }: { scale: PlanScale }) {
  const y = scale.height - 22;
  const unit = [1, 2, 5, 10].find((one) => one * scale.pxPerM >= 24) ?? 20;
  const marks: number[] = [];
  for (let m = Math.ceil(scale.fromX / unit) * unit; m < scale.toX; m += unit) marks.push(m);
  return marks.map((m, i) => (
    <g key={m}>
      <rect
        className={i % 2 === 0 ? 'edge-bar is-filled' : 'edge-bar'}
        x={scale.x(m)}
        y={y}
        width={Math.max(0, Math.min(unit, scale.toX - m) * scale.pxPerM)}
        height={4}
      />
      <text x={scale.x(m)} y={y + 18} textAnchor="middle">
        {m}
        {i === 0 && ' m'}
      </text>
    </g>
  ));
}

function NorthArrow({ x, y, topAzimuthDeg }: { x: number; y: number; topAzimuthDeg: number }) {
  return (
    <g transform={`translate(${x} ${y}) rotate(${-topAzimuthDeg})`}>
      <path className="north" d="M0 -16L5 12L0 8L-5 12Z" />
      <text className="strong" y={-19} textAnchor="middle">
        N
      </text>
    </g>
  );
}
