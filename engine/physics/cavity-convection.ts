// Convection in the gas between two panes of any tilt, with the temperatures of the moment.
import type { FillGas, GasShare } from './fill-gas.ts';

/** A gas filling as straight lines in absolute temperature, ready for the hot loop. */
export interface CavityGas {
  /** λ = conductivity0 + conductivity1·T [W/(m·K)], T in K; likewise below. */
  readonly conductivity0: number;
  readonly conductivity1: number;
  /** Pa·s. */
  readonly viscosity0: number;
  readonly viscosity1: number;
  /** J/(kg·K). */
  readonly specificHeat0: number;
  readonly specificHeat1: number;
  readonly molarKgPerMol: number;
}

type Row = readonly [number, number, number, number, number, number, number];

// Conductivity, viscosity, specific heat (constant and slope), molar mass.
// Source: ISO 15099:2003, Annex B (from memory); sulphur hexafluoride is not in it.
const rows: Readonly<Partial<Record<FillGas, Row>>> = {
  air: [2.873e-3, 7.76e-5, 3.723e-6, 4.94e-8, 1002.737, 1.2324e-2, 0.02897],
  argon: [2.285e-3, 5.149e-5, 3.379e-6, 6.451e-8, 521.9285, 0, 0.039948],
  krypton: [9.443e-4, 2.826e-5, 2.213e-6, 7.777e-8, 248.0907, 0, 0.0838],
  xenon: [4.538e-4, 1.723e-5, 1.069e-6, 7.414e-8, 158.3397, 0, 0.1313],
};

const gasConstantJPerMolK = 8.31446261815324;
const gravityMPerS2 = 9.81;

/**
 * Properties of a filling. Mixtures are the mean by volume share (as EN 673 does); ISO 15099 mixes by
 * kinetic theory, which is not done here.
 *
 * @param filling shares that add up to 1; a gas without data here is an error
 */
export function cavityGas(filling: readonly GasShare[]): CavityGas {
  const sum = [0, 0, 0, 0, 0, 0, 0];
  for (const { gas, share } of filling) {
    const row = rows[gas];
    if (row === undefined) throw new Error(`no cavity data for the gas ${gas}`);
    for (let k = 0; k < row.length; k++) sum[k] += share * row[k];
  }
  return {
    conductivity0: sum[0],
    conductivity1: sum[1],
    viscosity0: sum[2],
    viscosity1: sum[3],
    specificHeat0: sum[4],
    specificHeat1: sum[5],
    molarKgPerMol: sum[6],
  };
}

/**
 * Rayleigh number of a gap.
 *
 *   Ra = ρ²·s³·g·c·ΔT/(T_m·μ·λ),  ρ = p·M/(R·T_m)
 *
 * @param meanK absolute mean temperature of the panes [K]
 *
 * Source: ISO 15099:2003, equation (40).
 */
export function cavityRayleigh(
  gas: CavityGas,
  thicknessM: number,
  differenceK: number,
  meanK: number,
  pressurePa: number,
): number {
  const density = (pressurePa * gas.molarKgPerMol) / (gasConstantJPerMolK * meanK);
  const conductivity = gas.conductivity0 + gas.conductivity1 * meanK;
  const viscosity = gas.viscosity0 + gas.viscosity1 * meanK;
  const specificHeat = gas.specificHeat0 + gas.specificHeat1 * meanK;
  return (
    (density * density * thicknessM ** 3 * gravityMPerS2 * specificHeat * Math.abs(differenceK)) /
    (meanK * viscosity * conductivity)
  );
}

/**
 * Nusselt number of a gap heated from below (tilt under 90°), upright, or heated from above.
 *
 * @param rayleigh of the gap
 * @param heightM over @param thicknessM gives the aspect ratio
 * @param tiltDeg 0 flat and heated from below, 90 upright, 180 flat and heated from above [°]
 *
 * Source: ISO 15099:2003, 5.3.3.2 to 5.3.3.6 (after Hollands et al. 1976, ElSherbiny et al. 1982,
 * Wright 1996; constants from memory).
 */
export function cavityNusselt(
  rayleigh: number,
  heightM: number,
  thicknessM: number,
  tiltDeg: number,
): number {
  const aspect = heightM / thicknessM;
  if (tiltDeg < 60) return nusseltFlat(rayleigh, tiltDeg);
  if (tiltDeg < 90) {
    const share = (tiltDeg - 60) / 30;
    return (1 - share) * nusseltAt60(rayleigh, aspect) + share * nusseltUpright(rayleigh, aspect);
  }
  const upright = nusseltUpright(rayleigh, aspect);
  return tiltDeg === 90 ? upright : 1 + (upright - 1) * Math.sin((tiltDeg * Math.PI) / 180);
}

function nusseltUpright(ra: number, aspect: number): number {
  let conducting = 1 + 1.7596678e-10 * ra ** 2.2984755;
  if (ra > 5e4) conducting = 0.0673838 * Math.cbrt(ra);
  else if (ra > 1e4) conducting = 0.028154 * ra ** 0.4134;
  return Math.max(conducting, 0.242 * (ra / aspect) ** 0.272);
}

function nusseltAt60(ra: number, aspect: number): number {
  const g = 0.5 / (1 + (ra / 3160) ** 20.6) ** 0.1;
  const first = (1 + ((0.0936 * ra ** 0.314) / (1 + g)) ** 7) ** (1 / 7);
  return Math.max(first, (0.104 + 0.175 / aspect) * ra ** 0.283);
}

function nusseltFlat(ra: number, tiltDeg: number): number {
  const tilt = (tiltDeg * Math.PI) / 180;
  const driven = ra * Math.cos(tilt);
  if (driven === 0) return 1;
  const onset = 1 - (1708 * Math.sin(1.8 * tilt) ** 1.6) / driven;
  const first = 1.44 * Math.max(0, 1 - 1708 / driven) * onset;
  return 1 + first + Math.max(0, Math.cbrt(driven / 5830) - 1);
}

/**
 * Convective conductance of a gap between panes, Nu·λ/s.
 *
 * @param outerC and @param innerC temperatures of the panes [°C]
 * @param glazingTiltDeg slope of the glazing, 0 skylight, 90 upright [°]; whether the gap is heated
 *   from below follows from which pane is the warmer
 * @param pressurePa of the gas; that of the site where the unit breathes or was sealed there
 *
 * Source: ISO 15099:2003, 5.3.3.
 */
export function cavityConvectiveWPerM2K(
  gas: CavityGas,
  thicknessM: number,
  heightM: number,
  glazingTiltDeg: number,
  outerC: number,
  innerC: number,
  pressurePa = 101_325,
): number {
  const meanK = (outerC + innerC) / 2 + 273.15;
  const rayleigh = cavityRayleigh(gas, thicknessM, innerC - outerC, meanK, pressurePa);
  const fromBelow = innerC >= outerC ? glazingTiltDeg : 180 - glazingTiltDeg;
  const nusselt = cavityNusselt(rayleigh, heightM, thicknessM, fromBelow);
  return (nusselt * (gas.conductivity0 + gas.conductivity1 * meanK)) / thicknessM;
}
