// The house as a picture that turns: parallel projection, storeys on top of each other.

import { useId, useState } from 'react';
import {
  floorLevelM,
  type Plan,
  type ProjectForm,
  piecesOf,
  type Side,
  sideLengthM,
  sides,
} from '../../../project/index.ts';
import { figure } from '../../format/index.ts';

export interface AxonometryProps {
  readonly form: ProjectForm;
  readonly plan: Plan;
  readonly chosen: string | null;
}

const size = 250;
const lift = 0.82; // of a metre upward
const squash = 0.5; // of a metre away

type Corner = readonly [number, number, number];

export function Axonometry({ form, plan, chosen }: AxonometryProps) {
  const id = useId();
  const [turnDeg, setTurn] = useState(35);
  const turn = (turnDeg * Math.PI) / 180;
  const project = ([x, y, z]: Corner) => {
    const across = x * Math.cos(turn) - y * Math.sin(turn);
    const away = x * Math.sin(turn) + y * Math.cos(turn);
    return { u: across, v: -away * squash - z * lift, depth: away };
  };
  const faces = facesOf(form, plan).map((face) => {
    const points = face.corners.map(project);
    const depth = points.reduce((sum, point) => sum + point.depth, 0) / points.length;
    return { ...face, points, depth };
  });
  const us = faces.flatMap(({ points }) => points.map(({ u }) => u));
  const vs = faces.flatMap(({ points }) => points.map(({ v }) => v));
  if (us.length === 0) return null;
  const [lowU, highU, lowV, highV] = [
    Math.min(...us),
    Math.max(...us),
    Math.min(...vs),
    Math.max(...vs),
  ];
  const scale = Math.min(
    (size - 12) / (highU - lowU || 1),
    (size * 0.8 - 12) / (highV - lowV || 1),
  );
  const height = (highV - lowV) * scale + 12;
  const path = (points: readonly { u: number; v: number }[]) =>
    `${points
      .map(
        ({ u, v }, i) =>
          `${i === 0 ? 'M' : 'L'}${(6 + (u - lowU) * scale).toFixed(1)} ${(6 + (v - lowV) * scale).toFixed(1)}`,
      )
      .join('')}Z`;
  // What is far away is drawn first; windows after their wall.
  const drawn = [...faces].sort(
    (a, b) => a.level - b.level || b.depth - a.depth || a.order - b.order,
  );

  return (
    <figure className="axonometry">
      <svg width={size} height={height} aria-hidden="true">
        {drawn.map((face) => (
          <path
            key={face.id}
            className={`axo-${face.kind}${face.room === chosen ? ' is-chosen' : ''}`}
            d={path(face.points)}
          />
        ))}
      </svg>
      <figcaption>
        <label htmlFor={id}>Turn the picture</label>
        <input
          id={id}
          type="range"
          min={0}
          max={355}
          step={5}
          value={turnDeg}
          aria-valuetext={`${figure(turnDeg)}°`}
          onChange={(event) => setTurn(Number(event.target.value))}
        />
      </figcaption>
    </figure>
  );
}

interface Face {
  readonly id: string;
  readonly room: string;
  readonly kind: 'floor' | 'wall' | 'window';
  readonly level: number;
  readonly order: number;
  readonly corners: readonly Corner[];
}

/** Floors, outside walls and windows; the walls are glassy, so that the rooms are seen. */
function facesOf(form: ProjectForm, plan: Plan): Face[] {
  return plan.rooms.flatMap((place) => {
    const storey = plan.storeys.find(({ id }) => id === place.storey);
    const room = form.rooms.find(({ id }) => id === place.room);
    if (!storey || !room) return [];
    const level = floorLevelM(plan, storey.id);
    const { xM, yM, widthM, depthM } = place;
    const at = (side: Side, along: number, z: number): Corner => {
      if (side === 'top') return [xM + along, yM + depthM, z];
      if (side === 'bottom') return [xM + widthM - along, yM, z];
      if (side === 'right') return [xM + widthM, yM + depthM - along, z];
      return [xM, yM + along, z];
    };
    const upright = (side: Side, from: number, to: number, low: number, high: number) => [
      at(side, from, low),
      at(side, to, low),
      at(side, to, high),
      at(side, from, high),
    ];
    const common = { room: place.room, level };
    const floor: Face = {
      ...common,
      id: `${place.room} floor`,
      kind: 'floor',
      order: 0,
      corners: [
        [xM, yM, level],
        [xM + widthM, yM, level],
        [xM + widthM, yM + depthM, level],
        [xM, yM + depthM, level],
      ],
    };
    const walls = sides.flatMap((side) => {
      const top = level + storey.heightM;
      const pieces = piecesOf(plan, place, side)
        .filter(({ behind }) => behind === null)
        .map(
          ({ fromM, toM }): Face => ({
            ...common,
            id: `${place.room} ${side} ${fromM}`,
            kind: 'wall',
            order: 1,
            corners: upright(side, fromM, toM, level, top),
          }),
        );
      const windows = room.surfaces
        .filter((surface) => surface.id === side || surface.id.startsWith(`${side}-`))
        .flatMap((surface) => surface.openings ?? [])
        .flatMap(({ id, rectangle }): Face[] => {
          if (!rectangle || sideLengthM(place, side) === 0) return [];
          const { leftM, bottomM, widthM: w, heightM: h } = rectangle;
          return [
            {
              ...common,
              id: `${place.room} ${id}`,
              kind: 'window',
              order: 2,
              corners: upright(side, leftM, leftM + w, level + bottomM, level + bottomM + h),
            },
          ];
        });
      return [...pieces, ...windows];
    });
    return [floor, ...walls];
  });
}
