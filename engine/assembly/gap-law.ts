// The convective conductance of a gas gap as a table, so that the march looks it up.
import type { PaneGlazing } from '../building/index.ts';
import type { ConductanceTable } from '../network/index.ts';
import { cavityConvectiveWPerM2K, cavityGas } from '../physics/index.ts';

export interface GapLaw {
  /** From the temperatures of the two faces, outer first [W/(m²·K)]. */
  readonly conductanceWPerM2K: (outerC: number, innerC: number) => number;
  /** The same for a gap of this area, as the network looks it up [W/K]. */
  readonly tableOf: (areaM2: number) => ConductanceTable;
  readonly method: string;
}

const differenceStepK = 0.5;
const mostDifferenceK = 80;
const meanStepK = 20;
const [coldestC, hottestC] = [-50, 110];

/**
 * Tables ISO 15099 over the difference (0.5 K apart) and the mean (20 K apart) of the faces, straight
 * in between: within 0.2 % of the formula where the gap convects. Outside the table its edge holds.
 */
export function gapLaw(
  gap: PaneGlazing['gaps'][number],
  place: { readonly tiltDeg: number; readonly heightM: number; readonly pressurePa: number },
): GapLaw {
  const gas = cavityGas([{ gas: gap.gas, share: 1 }]);
  const columns = (2 * mostDifferenceK) / differenceStepK + 1;
  const rows = (hottestC - coldestC) / meanStepK + 1;
  const table = new Float64Array(rows * columns);
  for (let r = 0; r < rows; r++)
    for (let c = 0; c < columns; c++) {
      const meanC = coldestC + r * meanStepK;
      const differenceK = -mostDifferenceK + c * differenceStepK; // inner less outer
      table[r * columns + c] = cavityConvectiveWPerM2K(
        gas,
        gap.thicknessM,
        place.heightM,
        place.tiltDeg,
        meanC - differenceK / 2,
        meanC + differenceK / 2,
        place.pressurePa,
      );
    }
  const lastRow = rows - 1.000001;
  const lastColumn = columns - 1.000001;
  return {
    method: 'natural convection in a glazing cavity (ISO 15099), at the site’s pressure',
    tableOf: (areaM2) => ({
      factor: areaM2,
      values: table,
      rows,
      columns,
      firstMeanC: coldestC,
      rowStepK: meanStepK,
      firstDifferenceK: -mostDifferenceK,
      columnStepK: differenceStepK,
    }),
    conductanceWPerM2K(outerC, innerC) {
      const row = Math.min(lastRow, Math.max(0, ((outerC + innerC) / 2 - coldestC) / meanStepK));
      const column = Math.min(
        lastColumn,
        Math.max(0, (innerC - outerC + mostDifferenceK) / differenceStepK),
      );
      const r = Math.floor(row);
      const c = Math.floor(column);
      const v = column - c;
      const at = r * columns + c;
      const upper = table[at] + v * (table[at + 1] - table[at]);
      const lower = table[at + columns] + v * (table[at + columns + 1] - table[at + columns]);
      return upper + (row - r) * (lower - upper);
    },
  };
}
