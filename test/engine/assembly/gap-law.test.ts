// The gap's law as a table: its points hold the formula of ISO 15099 itself, and what the network looks up
// is what the function gives, between the points and beyond the edge.

import { expect, test } from 'vitest';
import { gapLaw } from '../../../engine/assembly/gap-law.ts';
import { cavityConvectiveWPerM2K, cavityGas } from '../../../engine/physics/index.ts';

const place = { tiltDeg: 90, heightM: 1.4, pressurePa: 98_000 };
const law = gapLaw({ gas: 'argon', thicknessM: 0.016 }, place);

test('the table’s points are the formula’s values', () => {
  const { values, columns, rows, firstMeanC, rowStepK, firstDifferenceK, columnStepK } =
    law.tableOf(2);
  const gas = cavityGas([{ gas: 'argon', share: 1 }]);
  for (const [r, c] of [
    [0, 0],
    [3, 161],
    [4, 200],
    [rows - 1, columns - 1],
  ]) {
    const meanC = firstMeanC + r * rowStepK;
    const half = (firstDifferenceK + c * columnStepK) / 2;
    const exact = cavityConvectiveWPerM2K(
      gas,
      0.016,
      place.heightM,
      place.tiltDeg,
      meanC - half,
      meanC + half,
      place.pressurePa,
    );
    expect(values[r * columns + c]).toBeCloseTo(exact, 12);
  }
});

test.each([
  [21, -4],
  [3.3, 17.7],
  [40, 41],
  [95, -60], // beyond the edge
])('faces at %d and %d °C: table and function agree', (outerC, innerC) => {
  const table = law.tableOf(1);
  const clamp = (v: number, most: number) => Math.max(0, Math.min(most, v));
  const u = clamp(
    ((outerC + innerC) / 2 - table.firstMeanC) / table.rowStepK,
    table.rows - 1 - 1e-9,
  );
  const v = clamp(
    (innerC - outerC - table.firstDifferenceK) / table.columnStepK,
    table.columns - 1 - 1e-9,
  );
  const [r, c] = [Math.floor(u), Math.floor(v)];
  const at = (i: number, j: number) => table.values[(r + i) * table.columns + c + j];
  const low = at(0, 0) + (v - c) * (at(0, 1) - at(0, 0));
  const high = at(1, 0) + (v - c) * (at(1, 1) - at(1, 0));
  expect(law.conductanceWPerM2K(outerC, innerC)).toBeCloseTo(low + (u - r) * (high - low), 5);
});
