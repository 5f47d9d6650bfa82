// Predicted mean vote and share of dissatisfied for people indoors, by the heat balance of the body.

/** What a person feels: the room, and the person. */
export interface ThermalEnvironment {
  readonly airC: number;
  readonly meanRadiantC: number;
  /** Air speed relative to the body [m/s]. */
  readonly airMPerS: number;
  /** 0 to 1. */
  readonly relativeHumidity: number;
  /** Metabolic rate [W per m² of body]; 1 met is 58.15. */
  readonly metabolicWPerM2: number;
  /** Effective mechanical power, nearly always 0 [W per m² of body]. */
  readonly workWPerM2: number;
  /** Clothing [m²·K/W]; 1 clo is 0.155. */
  readonly clothingM2KPerW: number;
}

/** The vote with what it was reckoned from. */
export interface ThermalVote {
  /** −3 cold to +3 hot. */
  readonly pmv: number;
  /** Share of dissatisfied people, 0.05 to 1. */
  readonly ppd: number;
  readonly clothingC: number;
  readonly convectiveWPerM2K: number;
  /** Clothed over bare surface of the body, 1 or more. */
  readonly clothingAreaFactor: number;
  readonly vapourPa: number;
}

export const cloM2KPerW = 0.155;

const fourth = (x: number): number => x * x * (x * x);

/** Saturation pressure as the comfort standard has it [Pa]. Source: ISO 7730:2005, Annex D. */
function comfortSaturationPa(airC: number): number {
  return 1000 * Math.exp(16.6536 - 4030.183 / (airC + 235));
}

/**
 * PMV and PPD.
 *
 *   PMV = (0.303·e^(−0.036·M) + 0.028)·L
 *
 * with L the body's heat production less its losses at comfort; the clothing's temperature balances
 * what passes through it with what it gives off, and is found to 1e-9 K.
 * Made for PMV from −2 to 2, air 10 to 30 °C, radiant 10 to 40 °C, up to 1 m/s, 0.8 to 4 met, 0 to 2 clo.
 *
 * Source: ISO 7730:2005, 4.1, equations (1) to (5).
 */
export function predictedMeanVote(e: ThermalEnvironment): ThermalVote {
  const { airC, meanRadiantC, clothingM2KPerW: icl, metabolicWPerM2: m } = e;
  const inner = m - e.workWPerM2; // W/m², heat produced inside the body
  const vapourPa = e.relativeHumidity * comfortSaturationPa(airC);
  const area = icl <= 0.078 ? 1 + 1.29 * icl : 1.05 + 0.645 * icl;
  const forced = 12.1 * Math.sqrt(e.airMPerS);
  const convective = (clothC: number) =>
    Math.max(2.38 * Math.sqrt(Math.sqrt(Math.abs(clothC - airC))), forced);
  const dry = (clothC: number) =>
    3.96e-8 * area * (fourth(clothC + 273) - fourth(meanRadiantC + 273)) +
    area * convective(clothC) * (clothC - airC);
  const clothingC = rootOf(
    (t) => t - (35.7 - 0.028 * inner - icl * dry(t)),
    Math.min(airC, meanRadiantC) - 100,
    Math.max(airC, meanRadiantC, 36) + 1,
  );
  const load =
    inner -
    3.05e-3 * (5733 - 6.99 * inner - vapourPa) -
    Math.max(0, 0.42 * (inner - 58.15)) -
    1.7e-5 * m * (5867 - vapourPa) -
    0.0014 * m * (34 - airC) -
    dry(clothingC);
  const pmv = (0.303 * Math.exp(-0.036 * m) + 0.028) * load;
  return {
    pmv,
    ppd: predictedDissatisfied(pmv),
    clothingC,
    convectiveWPerM2K: convective(clothingC),
    clothingAreaFactor: area,
    vapourPa,
  };
}

/**
 * Share of dissatisfied people at a vote, 0.05 to 1.
 *
 *   PPD = 100 − 95·exp(−0.03353·PMV⁴ − 0.2179·PMV²), in percent
 *
 * Source: ISO 7730:2005, 4.2, equation (5).
 */
export function predictedDissatisfied(pmv: number): number {
  const square = pmv * pmv;
  return 1 - 0.95 * Math.exp(-0.03353 * square * square - 0.2179 * square);
}

/**
 * Operative temperature (air and radiant alike) at which people vote as asked.
 *
 * @param pmv −2 to 2, @param person with the air speed and humidity; its temperatures are not read
 *
 * Source: ISO 7730:2005, equations (1) to (4), inverted.
 */
export function operativeForVoteC(
  pmv: number,
  person: Omit<ThermalEnvironment, 'airC' | 'meanRadiantC'>,
): number {
  return rootOf(
    (t) => predictedMeanVote({ ...person, airC: t, meanRadiantC: t }).pmv - pmv,
    -40,
    60,
  );
}

/** Root of a rising function between two bounds, by false position (Illinois variant) to 1e-9. */
function rootOf(f: (x: number) => number, low: number, high: number): number {
  let [a, b] = [low, high];
  let [fa, fb] = [f(a), f(b)];
  let moved = 0; // which end moved last: −1 the lower, +1 the upper
  for (let round = 0; round < 100; round++) {
    const x = (a * fb - b * fa) / (fb - fa);
    const fx = f(x);
    if (Math.abs(fx) < 1e-9) return x;
    if (fx < 0) {
      [a, fa] = [x, fx];
      if (moved === -1) fb /= 2; // the same end twice: draw the other one in
      moved = -1;
    } else {
      [b, fb] = [x, fx];
      if (moved === 1) fa /= 2;
      moved = 1;
    }
  }
  return (a + b) / 2;
}
