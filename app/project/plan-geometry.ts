// Rectangles on a storey: which walls two rooms share, which floors lie over which ceilings.
//
// x runs to the right of the drawing, y to its top. A side is named by where it lies in the drawing. All
// lengths are inner sizes; a wall has no thickness in the drawing.

export interface PlanRoom {
  readonly room: string;
  readonly storey: string;
  readonly xM: number;
  readonly yM: number;
  readonly widthM: number;
  readonly depthM: number;
}

export interface Storey {
  readonly id: string;
  readonly name: string;
  readonly heightM: number;
}

export interface Plan {
  /** Where the top of the drawing looks to. */
  readonly topAzimuthDeg: number;
  /** From the ground up. */
  readonly storeys: readonly Storey[];
  readonly rooms: readonly PlanRoom[];
}

export type Side = 'top' | 'right' | 'bottom' | 'left';
export const sides: readonly Side[] = ['top', 'right', 'bottom', 'left'];

/** Closer than this counts as touching [m]. */
export const touchM = 0.001;

/** A piece of a side: measured from its left end as seen from inside the room. */
export interface Piece {
  readonly fromM: number;
  readonly toM: number;
  /** The room behind it; null for outdoors. */
  readonly behind: string | null;
}

export function sideLengthM(room: PlanRoom, side: Side): number {
  return side === 'top' || side === 'bottom' ? room.widthM : room.depthM;
}

export function sideAzimuthDeg(plan: Plan, side: Side): number {
  return (plan.topAzimuthDeg + 90 * sides.indexOf(side)) % 360;
}

/** The line a side lies on, and its ends along it. */
function lineOf({ xM, yM, widthM, depthM }: PlanRoom, side: Side) {
  if (side === 'top') return { at: yM + depthM, from: xM, to: xM + widthM };
  if (side === 'bottom') return { at: yM, from: xM, to: xM + widthM };
  if (side === 'right') return { at: xM + widthM, from: yM, to: yM + depthM };
  return { at: xM, from: yM, to: yM + depthM };
}

const opposite: Readonly<Record<Side, Side>> = {
  top: 'bottom',
  bottom: 'top',
  left: 'right',
  right: 'left',
};

/** Seen from inside, left is west of a north wall, south of a west wall, and so on round. */
const runsWithAxis: Readonly<Record<Side, boolean>> = {
  top: true,
  left: true,
  right: false,
  bottom: false,
};

/** The side cut into what lies behind it, from left to right as seen from inside. */
export function piecesOf(plan: Plan, room: PlanRoom, side: Side): Piece[] {
  const own = lineOf(room, side);
  const shared = plan.rooms
    .filter((other) => other.storey === room.storey && other.room !== room.room)
    .flatMap((other) => {
      const theirs = lineOf(other, opposite[side]);
      const from = Math.max(own.from, theirs.from);
      const to = Math.min(own.to, theirs.to);
      const isShared = Math.abs(theirs.at - own.at) < touchM && to - from > touchM;
      return isShared ? [{ from, to, behind: other.room }] : [];
    })
    .sort((a, b) => a.from - b.from);
  const along: { from: number; to: number; behind: string | null }[] = [];
  let at = own.from;
  for (const piece of shared) {
    if (piece.from - at > touchM) along.push({ from: at, to: piece.from, behind: null });
    along.push(piece);
    at = piece.to;
  }
  if (own.to - at > touchM) along.push({ from: at, to: own.to, behind: null });
  const pieces = along.map(({ from, to, behind }) =>
    runsWithAxis[side]
      ? { fromM: from - own.from, toM: to - own.from, behind }
      : { fromM: own.to - to, toM: own.to - from, behind },
  );
  return runsWithAxis[side] ? pieces : pieces.reverse();
}

export function overlapM2(a: PlanRoom, b: PlanRoom): number {
  const wide = Math.min(a.xM + a.widthM, b.xM + b.widthM) - Math.max(a.xM, b.xM);
  const deep = Math.min(a.yM + a.depthM, b.yM + b.depthM) - Math.max(a.yM, b.yM);
  return wide > touchM && deep > touchM ? wide * deep : 0;
}

/** Rooms of the storey above (+1) or below (−1) that lie over or under a room, with their shared area. */
export function stackedOf(
  plan: Plan,
  room: PlanRoom,
  step: 1 | -1,
): { readonly room: string; readonly areaM2: number }[] {
  const storey = plan.storeys[plan.storeys.findIndex(({ id }) => id === room.storey) + step];
  if (!storey) return [];
  return plan.rooms
    .filter((other) => other.storey === storey.id)
    .map((other) => ({ room: other.room, areaM2: overlapM2(room, other) }))
    .filter(({ areaM2 }) => areaM2 > 0);
}

/** Pairs of rooms that lie in each other. */
export function overlaps(plan: Plan): (readonly [PlanRoom, PlanRoom])[] {
  return plan.rooms.flatMap((a, i) =>
    plan.rooms
      .slice(i + 1)
      .filter((b) => a.storey === b.storey && overlapM2(a, b) > 0)
      .map((b) => [a, b] as const),
  );
}

/** Floor of a storey above the ground [m]. */
export function floorLevelM(plan: Plan, storeyId: string): number {
  const index = plan.storeys.findIndex(({ id }) => id === storeyId);
  return plan.storeys.slice(0, Math.max(0, index)).reduce((sum, { heightM }) => sum + heightM, 0);
}
