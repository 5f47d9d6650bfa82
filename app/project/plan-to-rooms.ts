// The drawing → rooms with their surfaces: walls outdoors, partitions with both their faces, floors,
// ceilings and roofs. What a person has given to a surface before (construction, shading, windows, the
// ground under it) is kept as long as the surface is there.

import type { BoundaryForm, OpeningForm, RoomForm, SurfaceForm } from './form.ts';
import {
  floorLevelM,
  type Plan,
  type PlanRoom,
  piecesOf,
  type Side,
  sideAzimuthDeg,
  sideLengthM,
  sides,
  stackedOf,
} from './plan-geometry.ts';
import { refitOpenings } from './plan-openings.ts';

/** Construction ids for surfaces that are new. */
export interface PlanFabric {
  readonly outside: string;
  readonly partition: string;
  readonly roof: string;
  readonly between: string;
  readonly ground: string;
  /** A floor over open air. */
  readonly exposed: string;
}

export interface Drawn {
  readonly rooms: readonly RoomForm[];
  /** Windows that no longer fit any wall of their side, in words. */
  readonly lost: readonly string[];
}

const round = (value: number) => Number(value.toFixed(6));
const compass = [
  'North',
  'North-east',
  'East',
  'South-east',
  'South',
  'South-west',
  'West',
  'North-west',
];
export function compassWord(azimuthDeg: number): string {
  return compass[Math.round(azimuthDeg / 45) % 8] ?? '';
}

/** Ids that both faces of a partition can be named by. */
const faceId = {
  wall: (side: Side, behind: string | null, n: number) =>
    behind === null ? `${side}${n === 0 ? '' : `-${n + 1}`}` : `${side}-to-${behind}`.slice(0, 60),
  floor: (below: string | null) => (below === null ? 'floor' : `floor-to-${below}`.slice(0, 60)),
  ceiling: (above: string | null) => (above === null ? 'roof' : `ceiling-to-${above}`.slice(0, 60)),
};
const opposite: Readonly<Record<Side, Side>> = {
  top: 'bottom',
  bottom: 'top',
  left: 'right',
  right: 'left',
};
const defaultGround: BoundaryForm = { kind: 'ground', temperatureC: 10 };

/** Rooms of the drawing made anew; rooms that are not drawn stay as they are. */
export function roomsOfPlan(plan: Plan, rooms: readonly RoomForm[], fabric: PlanFabric): Drawn {
  const lost: string[] = [];
  const drawn = rooms.map((room) => {
    const place = plan.rooms.find((one) => one.room === room.id);
    return place ? drawRoom(plan, place, room, rooms, fabric, lost) : room;
  });
  return { rooms: drawn, lost };
}

function drawRoom(
  plan: Plan,
  place: PlanRoom,
  room: RoomForm,
  rooms: readonly RoomForm[],
  fabric: PlanFabric,
  lost: string[],
): RoomForm {
  const heightM = plan.storeys.find(({ id }) => id === place.storey)?.heightM ?? 2.5;
  const level = floorLevelM(plan, place.storey);
  const nameOf = (id: string) => rooms.find((one) => one.id === id)?.name ?? id;
  const old = new Map(room.surfaces.map((surface) => [surface.id, surface]));
  /** The face of a partition that exists already says its construction, else the old one, else the usual. */
  const kept = (
    id: string,
    usual: string,
    other?: { readonly room: string; readonly id: string },
  ) => {
    const theirs = rooms
      .find((one) => one.id === other?.room)
      ?.surfaces.find((one) => one.id === other?.id);
    return old.get(id)?.construction ?? theirs?.construction ?? usual;
  };

  const walls = sides.flatMap((side) => {
    const azimuthDeg = sideAzimuthDeg(plan, side);
    const word = compassWord(azimuthDeg);
    let outdoors = 0;
    const made = piecesOf(plan, place, side).map(({ fromM, toM, behind }) => {
      const id = faceId.wall(side, behind, behind === null ? outdoors++ : 0);
      const common = {
        id,
        areaM2: round((toM - fromM) * heightM),
        tiltDeg: 90,
        azimuthDeg,
      };
      if (behind !== null) {
        const theirs = faceId.wall(opposite[side], room.id, 0);
        const surface: SurfaceForm = {
          ...common,
          name: `${word}, to ${nameOf(behind)}`,
          construction: kept(id, fabric.partition, { room: behind, id: theirs }),
          boundary: { kind: 'room', room: behind, surface: theirs },
          ...(room.id > behind ? { reversed: true } : {}),
        };
        return { surface, fromM, toM, behind };
      }
      const before = old.get(id);
      const surface: SurfaceForm = {
        ...common,
        name: `${word} wall`,
        construction: kept(id, fabric.outside),
        boundary: outsideOf(before),
        heightAboveGroundM: round(level + heightM / 2),
        ...(before?.shading ? { shading: before.shading } : {}),
      };
      return { surface, fromM, toM, behind };
    });
    const openings = room.surfaces
      .filter(({ id }) => id === side || id.startsWith(`${side}-`))
      .flatMap((surface) => surface.openings ?? []);
    return withOpenings(made, openings, heightM, sideLengthM(place, side), (opening) =>
      lost.push(`${opening.name ?? opening.id} of ${room.name}`),
    );
  });

  const areaM2 = place.widthM * place.depthM;
  const flat = (step: 1 | -1): SurfaceForm[] => {
    const stacked = stackedOf(plan, place, step);
    const rest = areaM2 - stacked.reduce((sum, one) => sum + one.areaM2, 0);
    const isFloor = step === -1;
    const tiltDeg = isFloor ? 180 : 0;
    const shared = stacked.map(({ room: other, areaM2: common }): SurfaceForm => {
      const id = isFloor ? faceId.floor(other) : faceId.ceiling(other);
      const theirs = isFloor ? faceId.ceiling(room.id) : faceId.floor(room.id);
      return {
        id,
        name: `${isFloor ? 'Floor' : 'Ceiling'}, to ${nameOf(other)}`,
        construction: kept(id, fabric.between, { room: other, id: theirs }),
        areaM2: round(common),
        tiltDeg,
        boundary: { kind: 'room', room: other, surface: theirs },
        // Layers run from below to above: as this floor sees them, and the ceiling under it does not.
        ...(isFloor ? {} : { reversed: true }),
      };
    });
    if (rest <= 1e-4 * areaM2) return shared;
    const isGround = isFloor && plan.storeys[0]?.id === place.storey;
    const id = isFloor ? faceId.floor(null) : faceId.ceiling(null);
    const before = old.get(id);
    const usual = isGround ? fabric.ground : isFloor ? fabric.exposed : fabric.roof;
    const wasGround =
      before && before.boundary.kind !== 'outdoors' && before.boundary.kind !== 'room';
    const isSame = before && (isGround ? wasGround : before.boundary.kind === 'outdoors');
    return [
      ...shared,
      {
        id,
        name: isFloor ? 'Floor' : 'Roof',
        construction: isSame ? before.construction : usual,
        areaM2: round(rest),
        tiltDeg,
        boundary: isGround ? (wasGround ? before.boundary : defaultGround) : { kind: 'outdoors' },
        ...(isFloor ? {} : { heightAboveGroundM: round(level + heightM) }),
        ...(!isFloor && before?.openings ? { openings: before.openings } : {}),
      },
    ];
  };

  return {
    ...room,
    floorAreaM2: round(areaM2),
    volumeM3: round(areaM2 * heightM),
    box: {
      lengthM: round(place.widthM),
      depthM: round(place.depthM),
      heightM,
      frontAzimuthDeg: sideAzimuthDeg(plan, 'bottom'),
    },
    surfaces: [...walls, ...flat(-1), ...flat(1)],
  };
}

/** A wall that was told to lie against something else than open air stays so. */
function outsideOf(before: SurfaceForm | undefined): BoundaryForm {
  return before && before.boundary.kind !== 'room' ? before.boundary : { kind: 'outdoors' };
}

interface Made {
  readonly surface: SurfaceForm;
  readonly fromM: number;
  readonly toM: number;
  readonly behind: string | null;
}

function withOpenings(
  made: readonly Made[],
  openings: readonly OpeningForm[],
  heightM: number,
  lengthM: number,
  onLost: (opening: OpeningForm) => void,
): SurfaceForm[] {
  const walls = made.filter(({ surface }) => surface.boundary.kind === 'outdoors');
  const fitted = refitOpenings(walls, openings, heightM, lengthM);
  fitted.lost.forEach(onLost);
  return made.map(({ surface }) => {
    const own = fitted.byWall.get(surface.id);
    return own && own.length > 0 ? { ...surface, openings: [...own] } : surface;
  });
}
