import type { PointerEvent } from 'react';
import {
  type Plan,
  type PlanRoom,
  type ProjectForm,
  piecesOf,
  type Side,
  sideLengthM,
  sides,
} from '../../../project/index.ts';
import { figure } from '../../format/index.ts';
import type { Tool } from './plan.tsx';
import type { PlanScale } from './plan-scale.ts';
import type { Grabbed } from './use-plan-drag.ts';

export interface RoomPictureProps {
  readonly place: PlanRoom;
  readonly plan: Plan;
  readonly form: ProjectForm;
  readonly scale: PlanScale;
  readonly isChosen: boolean;
  readonly tool: Tool;
  readonly onGrab: (event: PointerEvent<SVGElement>, what: Grabbed) => void;
}

/** A stretch of a side, from its left end as seen from inside, as a line in pixels. */
function stretch(place: PlanRoom, side: Side, fromM: number, toM: number, scale: PlanScale) {
  const { xM, yM, widthM, depthM } = place;
  const at = (along: number) => {
    if (side === 'top') return [xM + along, yM + depthM] as const;
    if (side === 'bottom') return [xM + widthM - along, yM] as const;
    if (side === 'right') return [xM + widthM, yM + depthM - along] as const;
    return [xM, yM + along] as const;
  };
  const [a, b] = [at(fromM), at(toM)];
  return { x1: scale.x(a[0]), y1: scale.y(a[1]), x2: scale.x(b[0]), y2: scale.y(b[1]) };
}

const wideEnoughPx = 70;

export function RoomPicture(props: RoomPictureProps) {
  const { place, plan, form, scale, isChosen, tool, onGrab } = props;
  const room = form.rooms.find(({ id }) => id === place.room);
  const x = scale.x(place.xM);
  const y = scale.y(place.yM + place.depthM);
  const width = place.widthM * scale.pxPerM;
  const height = place.depthM * scale.pxPerM;
  const grabSide = (event: PointerEvent<SVGElement>, side: Side) => {
    if (tool === 'room') return;
    onGrab(
      event,
      tool === 'window' ? { kind: 'window', place, side } : { kind: 'side', place, side },
    );
  };
  return (
    <g>
      <rect
        className={isChosen ? 'plan-room is-chosen' : 'plan-room'}
        x={x}
        y={y}
        width={width}
        height={height}
        onPointerDown={(event) => {
          if (tool !== 'room') onGrab(event, { kind: 'room', place });
        }}
      />
      {width > wideEnoughPx && (
        <text className="strong" x={x + width / 2} y={y + height / 2 - 4} textAnchor="middle">
          {room?.name ?? place.room}
        </text>
      )}
      <text x={x + width / 2} y={y + height / 2 + 12} textAnchor="middle">
        {figure(place.widthM * place.depthM, 2)}
        {width > wideEnoughPx && ' m²'}
      </text>
      {sides.map((side) => (
        <g key={side}>
          {piecesOf(plan, place, side).map(({ fromM, toM, behind }) => (
            <line
              key={fromM}
              className={behind === null ? 'plan-wall' : 'plan-wall is-inner'}
              {...stretch(place, side, fromM, toM, scale)}
            />
          ))}
          <line
            className={`plan-grip is-${side}`}
            {...stretch(place, side, 0, sideLengthM(place, side), scale)}
            onPointerDown={(event) => grabSide(event, side)}
          />
          {room?.surfaces
            .filter(({ id }) => id === side || id.startsWith(`${side}-`))
            .flatMap((surface) => surface.openings ?? [])
            .map(({ id, rectangle }) =>
              rectangle ? (
                <g
                  key={id}
                  onPointerDown={(event) =>
                    onGrab(event, { kind: 'opening', place, side, id, leftM: rectangle.leftM })
                  }
                >
                  <line
                    className="plan-window"
                    {...stretch(
                      place,
                      side,
                      rectangle.leftM,
                      rectangle.leftM + rectangle.widthM,
                      scale,
                    )}
                  />
                  <line
                    className="plan-glass"
                    {...stretch(
                      place,
                      side,
                      rectangle.leftM,
                      rectangle.leftM + rectangle.widthM,
                      scale,
                    )}
                  />
                </g>
              ) : null,
            )}
          {isChosen && tool === 'select' && (
            <Handle
              {...stretch(place, side, 0, sideLengthM(place, side), scale)}
              side={side}
              onGrab={grabSide}
            />
          )}
        </g>
      ))}
      {isChosen && <Sizes place={place} scale={scale} />}
    </g>
  );
}

interface HandleProps {
  readonly x1: number;
  readonly y1: number;
  readonly x2: number;
  readonly y2: number;
  readonly side: Side;
  readonly onGrab: (event: PointerEvent<SVGElement>, side: Side) => void;
}

function Handle({ x1, y1, x2, y2, side, onGrab }: HandleProps) {
  const isUpright = side === 'left' || side === 'right';
  const [width, height] = isUpright ? [10, 32] : [32, 10];
  return (
    <rect
      className={`plan-handle is-${side}`}
      x={(x1 + x2) / 2 - width / 2}
      y={(y1 + y2) / 2 - height / 2}
      width={width}
      height={height}
      onPointerDown={(event) => onGrab(event, side)}
    />
  );
}

/** Width and depth of the chosen room, inside it. */
function Sizes({ place, scale }: { place: PlanRoom; scale: PlanScale }) {
  const x = scale.x(place.xM);
  const y = scale.y(place.yM);
  const right = scale.x(place.xM + place.widthM);
  const top = scale.y(place.yM + place.depthM);
  return (
    <>
      <text className="select-word" x={(x + right) / 2} y={y - 14} textAnchor="middle">
        {figure(place.widthM, 2)}
      </text>
      <text className="select-word" x={x + 14} y={(y + top) / 2 + 30}>
        {figure(place.depthM, 2)}
      </text>
    </>
  );
}
