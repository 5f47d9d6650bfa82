// Timber, boards, and insulation between timbers as one even layer.
import { type MaterialRow, materialsOf, practice, table3 } from './material-row.ts';

const woods: readonly MaterialRow[] = [
  ['timber-450', 'Timber, 450 kg/m³', 0.12, 450, 1600, 50, table3],
  ['timber-500', 'Softwood', 0.13, 500, 1600, 50, table3],
  ['timber-700', 'Hardwood', 0.18, 700, 1600, 200, table3],
  ['cross-laminated-timber', 'Cross-laminated timber', 0.13, 500, 1600, 50, practice],
  ['plywood-500', 'Plywood, 500 kg/m³', 0.13, 500, 1600, 200, table3],
  ['plywood-700', 'Plywood, 700 kg/m³', 0.17, 700, 1600, 220, table3],
  ['particleboard-600', 'Particleboard, 600 kg/m³', 0.14, 600, 1700, 50, table3],
  ['particleboard-900', 'Particleboard, 900 kg/m³', 0.18, 900, 1700, 50, table3],
  ['particleboard-cement', 'Cement-bonded particleboard', 0.23, 1200, 1500, 50, table3],
  ['osb', 'Oriented strand board', 0.13, 650, 1700, 50, table3],
  ['fibreboard-400', 'Fibreboard, 400 kg/m³', 0.1, 400, 1700, 10, table3],
  ['fibreboard-600', 'Fibreboard, 600 kg/m³', 0.14, 600, 1700, 20, table3],
  ['fibreboard-800', 'Fibreboard, hard', 0.18, 800, 1700, 30, table3],
];

/** Share of the face that studs and rafters take in ordinary frames (common practice, no source). */
export const timberShare = 0.12;

/**
 * Insulation with 12 % softwood between it, as one layer: each value by area, so heat flow is at the
 * lower limit of resistance (ISO 6946, 6.7.2.3) and the element errs to the side of losing more.
 */
function framed(id: string, name: string, conductivity: number, density: number): MaterialRow {
  const rest = 1 - timberShare;
  const mixedDensity = rest * density + timberShare * 500;
  const heat = rest * density * 1030 + timberShare * 500 * 1600; // J/(m³·K)
  return [
    id,
    name,
    Number((rest * conductivity + timberShare * 0.13).toFixed(4)),
    Number(mixedDensity.toFixed(1)),
    Math.round(heat / mixedDensity),
    1,
    'by area from the two materials, 12 % timber: common practice, no source',
  ];
}

export const timberMaterials = materialsOf([
  ...woods,
  framed('framed-wool-032', 'Mineral wool 0.032 between timbers', 0.032, 50),
  framed('framed-wool-035', 'Mineral wool 0.035 between timbers', 0.035, 30),
  framed('framed-wool-040', 'Mineral wool 0.040 between timbers', 0.04, 15),
]);
