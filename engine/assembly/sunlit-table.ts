// Sunlit shares of a shaded face, looked up by the direction of the sun.
//
// A shadow costs more than a step of the run can spend on it, but depends on two
// angles only: how far the sun stands to the side and how high, both seen from the face. A grid of
// 2.5° over them is filled where the sun really comes, and read in between by straight lines.
import type { SunFromWindow } from '../physics/index.ts';

const stepRad = (2.5 * Math.PI) / 180;
const half = 36; // cells from straight ahead to 90°
const width = 2 * half + 1;

/**
 * Tables the share of a face that the sun reaches, `litAt`. Weighted by the cosine of incidence it is within 0.02 of the
 * exact one, and within 0.002 in the mean over many suns (test/engine/assembly/sunlit-table.test.ts).
 */
export function sunlitTable(litAt: (sun: SunFromWindow) => number): (sun: SunFromWindow) => number {
  const table = new Float64Array(width * width).fill(Number.NaN);
  const at = (i: number, j: number): number => {
    const place = i * width + j;
    if (Number.isNaN(table[place])) {
      const side = Math.tan(Math.max(-1.55, Math.min(1.55, (i - half) * stepRad)));
      const high = Math.tan(Math.max(-1.55, Math.min(1.55, (j - half) * stepRad)));
      const length = Math.hypot(1, side, high);
      table[place] = litAt({
        right: side / length,
        up: high / length,
        out: 1 / length,
      });
    }
    return table[place];
  };
  return (sun) => {
    if (sun.out <= 0) return 0;
    const x = Math.atan2(sun.right, sun.out) / stepRad + half;
    const y = Math.atan2(sun.up, sun.out) / stepRad + half;
    const i = Math.min(width - 2, Math.floor(x));
    const j = Math.min(width - 2, Math.floor(y));
    const u = x - i;
    const v = y - j;
    const low = at(i, j) + v * (at(i, j + 1) - at(i, j));
    const next = at(i + 1, j) + v * (at(i + 1, j + 1) - at(i + 1, j));
    return low + u * (next - low);
  };
}
