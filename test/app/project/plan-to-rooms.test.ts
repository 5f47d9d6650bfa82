import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  emptyProject,
  overlaps,
  type Plan,
  type PlanRoom,
  piecesOf,
  type RoomForm,
  roomsOfPlan,
} from '../../../app/project/index.ts';
import { parseProjectDocument } from '../../../engine/index.ts';

const fabric = {
  outside: 'wall-render-eps-160',
  partition: 'partition-block-100',
  roof: 'roof-flat-timber',
  between: 'between-timber',
  ground: 'ground-slab-80',
  exposed: 'floor-exposed-timber-200',
};
const [blank] = emptyProject('House').rooms;
function blankRoom(id: string): RoomForm {
  if (!blank) throw new Error('no room in the template');
  const { box: _, ...rest } = blank;
  return { ...rest, id, name: id, surfaces: [] };
}

/** The rooms of a plan, drawn from nothing. */
function draw(plan: Plan) {
  return roomsOfPlan(
    plan,
    plan.rooms.map(({ room }) => blankRoom(room)),
    fabric,
  );
}

/** Grids of rooms: walls of any spacing, so that neighbours touch, on one to three storeys. */
const cuts = fc
  .array(fc.integer({ min: 10, max: 60 }), { minLength: 1, maxLength: 3 })
  .map((steps) => {
    const at = [0];
    for (const step of steps) at.push((at.at(-1) ?? 0) + step / 10);
    return at;
  });
const plans: fc.Arbitrary<Plan> = fc
  .record({
    top: fc.integer({ min: 0, max: 359 }),
    storeys: fc.array(
      fc.record({ xs: cuts, ys: cuts, heightM: fc.integer({ min: 20, max: 35 }), skip: fc.nat(8) }),
      { minLength: 1, maxLength: 3 },
    ),
  })
  .map(({ top, storeys }) => ({
    topAzimuthDeg: top,
    storeys: storeys.map(({ heightM }, s) => ({
      id: `s${s}`,
      name: `Storey ${s}`,
      heightM: heightM / 10,
    })),
    rooms: storeys.flatMap(({ xs, ys, skip }, s) =>
      xs.slice(1).flatMap((x, i) =>
        ys.slice(1).flatMap((y, j): PlanRoom[] =>
          // A room left out now and then makes the outline rectilinear.
          i * 3 + j === skip && xs.length * ys.length > 4
            ? []
            : [
                {
                  room: `r${s}-${i}-${j}`,
                  storey: `s${s}`,
                  xM: xs[i] ?? 0,
                  yM: ys[j] ?? 0,
                  widthM: x - (xs[i] ?? 0),
                  depthM: y - (ys[j] ?? 0),
                },
              ],
        ),
      ),
    ),
  }));

describe('whatever is drawn', () => {
  test('the faces of every room are those of its box, and partitions have two equal faces', () => {
    fc.assert(
      fc.property(plans, (plan) => {
        const { rooms } = draw(plan);
        for (const room of rooms) {
          const place = plan.rooms.find((one) => one.room === room.id);
          const height = plan.storeys.find((one) => one.id === place?.storey)?.heightM ?? 0;
          const [wide, deep] = [place?.widthM ?? 0, place?.depthM ?? 0];
          const area = (is: (tilt: number) => boolean) =>
            room.surfaces.filter((s) => is(s.tiltDeg)).reduce((sum, s) => sum + s.areaM2, 0);
          expect(area((tilt) => tilt === 90)).toBeCloseTo(2 * (wide + deep) * height, 3);
          expect(area((tilt) => tilt === 0)).toBeCloseTo(wide * deep, 2);
          expect(area((tilt) => tilt === 180)).toBeCloseTo(wide * deep, 2);
          for (const surface of room.surfaces) {
            const { boundary } = surface;
            if (boundary.kind !== 'room') continue;
            const other = rooms
              .find(({ id }) => id === boundary.room)
              ?.surfaces.find(({ id }) => id === boundary.surface);
            expect(other?.areaM2).toBeCloseTo(surface.areaM2, 5);
            expect(other?.boundary).toEqual({ kind: 'room', room: room.id, surface: surface.id });
            expect(other?.construction).toBe(surface.construction);
            expect(Boolean(other?.reversed)).toBe(!surface.reversed);
          }
        }
      }),
      { numRuns: 60 },
    );
  });

  test('the project passes the parser, which checks boxes, partitions and references itself', () => {
    fc.assert(
      fc.property(plans, (plan) => {
        const { rooms } = draw(plan);
        const project = { ...emptyProject('House'), plan, rooms };
        const parsed = parseProjectDocument(JSON.parse(JSON.stringify(project)), 'house');
        expect(parsed.ok ? [] : parsed.faults).toEqual([]);
      }),
      { numRuns: 25 },
    );
  });

  test('drawing it again changes nothing', () => {
    fc.assert(
      fc.property(plans, (plan) => {
        const once = draw(plan).rooms;
        expect(roomsOfPlan(plan, once, fabric).rooms).toEqual(once);
      }),
      { numRuns: 25 },
    );
  });
});

const one = (
  room: string,
  xM: number,
  yM: number,
  widthM: number,
  depthM: number,
  storey = 's',
) => ({
  room,
  storey,
  xM,
  yM,
  widthM,
  depthM,
});
const storey = { id: 's', name: 'Ground storey', heightM: 2.5 };

test('a side is cut where a neighbour ends, counted from the left as seen from inside', () => {
  const plan: Plan = {
    topAzimuthDeg: 0,
    storeys: [storey],
    rooms: [one('a', 0, 0, 6, 4), one('b', 1, 4, 2, 3)],
  };
  const [a] = plan.rooms;
  if (!a) throw new Error('no room');
  expect(piecesOf(plan, a, 'top')).toEqual([
    { fromM: 0, toM: 1, behind: null },
    { fromM: 1, toM: 3, behind: 'b' },
    { fromM: 3, toM: 6, behind: null },
  ]);
  // Seen from inside, the left end of a south wall is its eastern one.
  const below: Plan = { ...plan, rooms: [a, one('b', 1, -3, 2, 3)] };
  expect(piecesOf(below, a, 'bottom')).toEqual([
    { fromM: 0, toM: 3, behind: null },
    { fromM: 3, toM: 5, behind: 'b' },
    { fromM: 5, toM: 6, behind: null },
  ]);
});

test('azimuths follow the north arrow, and a room half over open air has both floors', () => {
  const plan: Plan = {
    topAzimuthDeg: 30,
    storeys: [storey, { id: 't', name: 'First storey', heightM: 2.4 }],
    rooms: [one('a', 0, 0, 4, 4), one('b', 2, 0, 4, 4, 't')],
  };
  const [a, b] = draw(plan).rooms;
  const azimuths = Object.fromEntries(
    (a?.surfaces ?? []).filter((s) => s.tiltDeg === 90).map((s) => [s.id, s.azimuthDeg]),
  );
  expect(azimuths).toEqual({ top: 30, right: 120, bottom: 210, left: 300 });
  const flat = (room: RoomForm | undefined) =>
    room?.surfaces
      .filter((s) => s.tiltDeg !== 90)
      .map((s) => [s.id, s.areaM2, s.boundary.kind, s.construction]);
  expect(flat(a)).toEqual([
    ['floor', 16, 'ground', fabric.ground],
    ['ceiling-to-b', 8, 'room', fabric.between],
    ['roof', 8, 'outdoors', fabric.roof],
  ]);
  expect(flat(b)).toEqual([
    ['floor-to-a', 8, 'room', fabric.between],
    ['floor', 8, 'outdoors', fabric.exposed],
    ['roof', 16, 'outdoors', fabric.roof],
  ]);
});

describe('windows', () => {
  const window = {
    id: 'w',
    name: 'Window',
    glazing: 'double-warm-argon',
    areaM2: 2.8,
    rectangle: { leftM: 3, bottomM: 0.9, widthM: 2, heightM: 1.4 },
  };
  const start: Plan = { topAzimuthDeg: 0, storeys: [storey], rooms: [one('a', 0, 0, 6, 4)] };
  const withWindow = draw(start).rooms.map((room) => ({
    ...room,
    surfaces: room.surfaces.map((s) =>
      s.id === 'top' ? { ...s, openings: [window], construction: 'wall-timber-frame-240' } : s,
    ),
  }));
  const redraw = (rooms: readonly PlanRoom[]) =>
    roomsOfPlan(
      { ...start, rooms },
      [...withWindow, ...rooms.slice(1).map(({ room }) => blankRoom(room))],
      fabric,
    );
  const top = ({ rooms }: ReturnType<typeof redraw>) =>
    rooms[0]?.surfaces.find((s) => s.id === 'top');

  test('keep their place and size while the wall holds them, and the wall its construction', () => {
    const wall = top(redraw([one('a', 0, 0, 7, 4)]));
    expect(wall?.openings).toEqual([window]);
    expect(wall?.construction).toBe('wall-timber-frame-240');
  });

  test('are pushed inside, then made smaller, with their area', () => {
    const pushed = top(redraw([one('a', 0, 0, 4, 4)]))?.openings?.[0];
    expect(pushed?.rectangle).toEqual({ leftM: 2, bottomM: 0.9, widthM: 2, heightM: 1.4 });
    const smaller = top(redraw([one('a', 0, 0, 1.5, 4)]))?.openings?.[0];
    expect(smaller?.rectangle?.widthM).toBe(1.5);
    expect(smaller?.areaM2).toBeCloseTo(1.5 * 1.4, 6);
  });

  test('are named when no outside wall is left on their side', () => {
    const drawn = redraw([one('a', 0, 0, 6, 4), one('b', 0, 4, 6, 3)]);
    expect(drawn.lost).toEqual(['Window of a']);
  });
});

test('rooms that lie in each other are found, those that touch are not', () => {
  const plan: Plan = {
    topAzimuthDeg: 0,
    storeys: [storey],
    rooms: [one('a', 0, 0, 4, 4), one('b', 4, 0, 4, 4), one('c', 3, 3, 2, 2)],
  };
  expect(overlaps(plan).map(([a, b]) => a.room + b.room)).toEqual(['ac', 'bc']);
});
