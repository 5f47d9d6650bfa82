// Metres of the drawing ↔ pixels, and snapping.

import type { Plan, PlanRoom } from '../../../project/index.ts';

export interface PlanScale {
  readonly pxPerM: number;
  readonly x: (metres: number) => number;
  readonly y: (metres: number) => number;
  readonly toM: (px: number, py: number) => { readonly x: number; readonly y: number };
  readonly width: number;
  readonly height: number;
  readonly fromX: number;
  readonly toX: number;
}

const steps = [120, 96, 80, 64, 56, 48, 40, 32, 26, 20, 16, 12, 9, 6, 4];
const margin = 34;
/** Room to draw on around what is there [m]. */
const around = 1.5;

/** The next whole scale at which all storeys fit, so that storeys lie over each other. */
export function planScale(plan: Plan, width: number, mostHeight: number): PlanScale {
  const { rooms } = plan;
  const low = (of: (room: PlanRoom) => number, none: number) =>
    rooms.length === 0 ? none : Math.min(...rooms.map(of));
  const high = (of: (room: PlanRoom) => number, none: number) =>
    rooms.length === 0 ? none : Math.max(...rooms.map(of));
  const fromX = Math.floor(low((one) => one.xM, 0) - around);
  const toX = Math.ceil(high((one) => one.xM + one.widthM, 10) + around);
  const fromY = Math.floor(low((one) => one.yM, 0) - around);
  const toY = Math.ceil(high((one) => one.yM + one.depthM, 8) + around);
  const wide = (width - 2 * margin) / (toX - fromX);
  const tall = (mostHeight - 2 * margin) / (toY - fromY);
  const pxPerM = steps.find((step) => step <= Math.min(wide, tall)) ?? Math.min(wide, tall);
  const height = (toY - fromY) * pxPerM + 2 * margin;
  return {
    pxPerM,
    width,
    height,
    fromX,
    toX,
    x: (metres) => margin + (metres - fromX) * pxPerM,
    y: (metres) => margin + (toY - metres) * pxPerM,
    toM: (px, py) => ({ x: fromX + (px - margin) / pxPerM, y: toY - (py - margin) / pxPerM }),
  };
}

export interface Snapped {
  readonly value: number;
  /** What was met, in words; empty on the grid. */
  readonly met: string;
}

const nearPx = 7;

/** To another room's edge where one is near, else to the grid. */
export function snapTo(
  value: number,
  gridM: number,
  edges: readonly number[],
  pxPerM: number,
): Snapped {
  const near = edges
    .map((edge) => ({ edge, by: Math.abs(edge - value) }))
    .filter(({ by }) => by * pxPerM < nearPx)
    .sort((a, b) => a.by - b.by)[0];
  if (near) return { value: near.edge, met: 'in line with another wall' };
  return { value: Number((Math.round(value / gridM) * gridM).toFixed(4)), met: '' };
}

/** Lines that other rooms of any storey have. */
export function edgesOf(plan: Plan, except: ReadonlySet<string>) {
  const others = plan.rooms.filter(({ room }) => !except.has(room));
  return {
    xs: others.flatMap(({ xM, widthM }) => [xM, xM + widthM]),
    ys: others.flatMap(({ yM, depthM }) => [yM, yM + depthM]),
  };
}
