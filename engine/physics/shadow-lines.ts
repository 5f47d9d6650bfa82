// Sunlit share of a shaded window by lines: fast, for tables and for diffuse light.
//
// The window is read along level lines. On each, a plate's shadow is one stretch; what is left of the
// line after the union of all stretches is lit. Along a line this is exact; across the lines it is the
// midpoint rule between the level edges of the shadows, within 0.005 of the exact cut in
// `window-shading.ts` (test/engine/assembly/sunlit-table.test.ts).
import type { Fin, ShadedWindow, SunFromWindow } from './window-shading.ts';

const linesInAll = 24;
const farM = 1e5; // in place of Infinity

/** A level plate on y, or an upright one on x, from `from` to `to` along it and `near` to `far` outwards. */
interface Plate {
  readonly upright: boolean;
  readonly at: number;
  readonly from: number;
  readonly to: number;
  readonly near: number;
  readonly far: number;
}

/** Share of the window that the sun reaches, as a function of where the sun stands, 0 to 1. */
export function sunlitByLines(window: ShadedWindow): (sun: SunFromWindow) => number {
  const plates = platesOf(window);
  const { widthM, heightM } = window;
  const start = new Float64Array(plates.length);
  const end = new Float64Array(plates.length);
  const edge = new Float64Array(4 * plates.length + 2);
  return (sun) => {
    if (sun.out <= 0) return 0;
    const side = -sun.right / sun.out; // move of a shadow per metre of depth
    const down = -sun.up / sun.out;
    let lit = 0;
    const bands = bandEdges(plates, down, heightM, edge);
    for (let band = 0; band < bands; band++) {
      const bottom = edge[band];
      const high = edge[band + 1] - bottom;
      if (high <= 0) continue;
      const lines = Math.max(2, Math.ceil((linesInAll * high) / heightM));
      for (let line = 0; line < lines; line++) {
        const y = bottom + ((line + 0.5) / lines) * high;
        let count = 0;
        for (const plate of plates)
          count = shadowOnLine(plate, y, side, down, widthM, start, end, count);
        lit += (widthM - covered(start, end, count)) * (high / lines);
      }
    }
    return lit / (heightM * widthM);
  };
}

/** Heights between which no level edge of a shadow lies, in order, from 0 to the head; gives their number. */
function bandEdges(
  plates: readonly Plate[],
  down: number,
  heightM: number,
  edge: Float64Array,
): number {
  let count = 1;
  edge[0] = 0;
  const note = (y: number) => {
    if (y <= 0 || y >= heightM) return;
    let i = count++;
    for (; i > 1 && edge[i - 1] > y; i--) edge[i] = edge[i - 1];
    edge[i] = y;
  };
  for (const { upright, at, from, to, near, far } of plates)
    for (const depth of [near, far]) {
      if (upright) {
        note(from + depth * down);
        note(to + depth * down);
      } else note(at + depth * down);
    }
  edge[count] = heightM;
  return count;
}

/** Adds the stretch of the line at height y that a plate shades; gives the number of stretches then. */
function shadowOnLine(
  plate: Plate,
  y: number,
  side: number,
  down: number,
  widthM: number,
  start: Float64Array,
  end: Float64Array,
  count: number,
): number {
  // Depths of the plate whose shadow crosses this line.
  let low = plate.near;
  let high = plate.far;
  if (!plate.upright) {
    const depth = (y - plate.at) / down;
    if (!(depth >= low && depth <= high)) return count;
    return insert(start, end, count, plate.from + depth * side, plate.to + depth * side, widthM);
  }
  if (down === 0) {
    if (y < plate.from || y > plate.to) return count;
  } else {
    const a = (y - plate.to) / down;
    const b = (y - plate.from) / down;
    low = Math.max(low, Math.min(a, b));
    high = Math.min(high, Math.max(a, b));
    if (high <= low) return count;
  }
  const p = plate.at + low * side;
  const q = plate.at + high * side;
  return insert(start, end, count, Math.min(p, q), Math.max(p, q), widthM);
}

/** Puts a stretch, cut to the window, in order of its start. */
function insert(
  start: Float64Array,
  end: Float64Array,
  count: number,
  from: number,
  to: number,
  width: number,
): number {
  const a = Math.max(0, from);
  const b = Math.min(width, to);
  if (b <= a) return count;
  let i = count;
  for (; i > 0 && start[i - 1] > a; i--) {
    start[i] = start[i - 1];
    end[i] = end[i - 1];
  }
  start[i] = a;
  end[i] = b;
  return count + 1;
}

/** Length of the union of stretches that stand in order. */
function covered(start: Float64Array, end: Float64Array, count: number): number {
  let sum = 0;
  let reach = 0;
  for (let i = 0; i < count; i++) {
    const from = Math.max(reach, start[i]);
    if (end[i] > from) {
      sum += end[i] - from;
      reach = end[i];
    }
  }
  return sum;
}

function platesOf({
  widthM: w,
  heightM: h,
  revealM,
  overhang,
  leftFin,
  rightFin,
}: ShadedWindow): Plate[] {
  const plates: Plate[] = [];
  const reach = (length: number) => Math.min(length, farM);
  if (revealM > 0)
    plates.push(
      { upright: false, at: h, from: 0, to: w, near: 0, far: revealM },
      { upright: false, at: 0, from: 0, to: w, near: 0, far: revealM },
      { upright: true, at: 0, from: 0, to: h, near: 0, far: revealM },
      { upright: true, at: w, from: 0, to: h, near: 0, far: revealM },
    );
  if (overhang && overhang.depthM > 0)
    plates.push({
      upright: false,
      at: h + overhang.gapM,
      from: -reach(overhang.leftM),
      to: w + reach(overhang.rightM),
      near: revealM,
      far: revealM + overhang.depthM,
    });
  const fin = (at: number, { depthM, aboveM, belowM }: Fin) =>
    plates.push({
      upright: true,
      at,
      from: -reach(belowM),
      to: h + reach(aboveM),
      near: revealM,
      far: revealM + depthM,
    });
  if (leftFin && leftFin.depthM > 0) fin(-leftFin.gapM, leftFin);
  if (rightFin && rightFin.depthM > 0) fin(w + rightFin.gapM, rightFin);
  return plates;
}
