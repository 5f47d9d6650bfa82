// Gases between panes: EN 673 properties by temperature, mixtures by volume share.

export type FillGas = 'air' | 'argon' | 'krypton' | 'xenon' | 'sulphur-hexafluoride';

export interface GasProperties {
  readonly densityKgPerM3: number;
  readonly viscosityPaS: number;
  readonly conductivityWPerMK: number;
  readonly specificHeatJPerKgK: number;
}

interface GasTable {
  readonly densityKgPerM3: readonly number[];
  readonly viscosityPaS: readonly number[];
  readonly conductivityWPerMK: readonly number[];
  readonly specificHeatJPerKgK: number;
}

// Rows at −10, 0, 10 and 20 °C. Source: EN 673:2011, Table 1 (from memory).
const tables: Readonly<Record<FillGas, GasTable>> = {
  air: {
    densityKgPerM3: [1.326, 1.277, 1.232, 1.189],
    viscosityPaS: [1.661e-5, 1.711e-5, 1.761e-5, 1.811e-5],
    conductivityWPerMK: [0.02336, 0.02416, 0.02496, 0.02576],
    specificHeatJPerKgK: 1008,
  },
  argon: {
    densityKgPerM3: [1.829, 1.762, 1.699, 1.64],
    viscosityPaS: [2.038e-5, 2.101e-5, 2.164e-5, 2.228e-5],
    conductivityWPerMK: [0.01584, 0.01634, 0.01684, 0.01734],
    specificHeatJPerKgK: 519,
  },
  krypton: {
    densityKgPerM3: [3.832, 3.69, 3.56, 3.43],
    viscosityPaS: [2.26e-5, 2.33e-5, 2.4e-5, 2.47e-5],
    conductivityWPerMK: [0.00842, 0.0087, 0.009, 0.00926],
    specificHeatJPerKgK: 245,
  },
  xenon: {
    densityKgPerM3: [6.121, 5.897, 5.689, 5.495],
    viscosityPaS: [2.078e-5, 2.152e-5, 2.226e-5, 2.299e-5],
    conductivityWPerMK: [0.00494, 0.00512, 0.00529, 0.00546],
    specificHeatJPerKgK: 161,
  },
  'sulphur-hexafluoride': {
    densityKgPerM3: [6.844, 6.602, 6.36, 6.118],
    viscosityPaS: [1.383e-5, 1.421e-5, 1.459e-5, 1.497e-5],
    conductivityWPerMK: [0.01119, 0.01197, 0.01275, 0.01354],
    specificHeatJPerKgK: 614,
  },
};

/** Linear between the rows, and on beyond them along the outer pair. */
function atTemperature(rows: readonly number[], tempC: number): number {
  const place = (tempC + 10) / 10;
  const k = Math.min(rows.length - 2, Math.max(0, Math.floor(place)));
  return rows[k] + (place - k) * (rows[k + 1] - rows[k]);
}

/**
 * Properties of a pure fill gas at atmospheric pressure.
 *
 * @param tempC mean temperature of the gap; the table covers −10 to 20, beyond it goes on straight [°C]
 *
 * Source: EN 673:2011, Table 1 (from memory).
 */
export function gasProperties(gas: FillGas, tempC: number): GasProperties {
  const table = tables[gas];
  return {
    densityKgPerM3: atTemperature(table.densityKgPerM3, tempC),
    viscosityPaS: atTemperature(table.viscosityPaS, tempC),
    conductivityWPerMK: atTemperature(table.conductivityWPerMK, tempC),
    specificHeatJPerKgK: table.specificHeatJPerKgK,
  };
}

/** One gas of a filling by its volume share; the shares of a filling add up to 1. */
export interface GasShare {
  readonly gas: FillGas;
  /** Volume share, 0 to 1. */
  readonly share: number;
}

/**
 * Properties of a gas mixture: each property is the mean by volume share.
 *
 * Source: EN 673:2011, clause 5.3.3.
 */
export function mixtureProperties(filling: readonly GasShare[], tempC: number): GasProperties {
  let density = 0;
  let viscosity = 0;
  let conductivity = 0;
  let specificHeat = 0;
  for (const { gas, share } of filling) {
    const p = gasProperties(gas, tempC);
    density += share * p.densityKgPerM3;
    viscosity += share * p.viscosityPaS;
    conductivity += share * p.conductivityWPerMK;
    specificHeat += share * p.specificHeatJPerKgK;
  }
  return {
    densityKgPerM3: density,
    viscosityPaS: viscosity,
    conductivityWPerMK: conductivity,
    specificHeatJPerKgK: specificHeat,
  };
}
