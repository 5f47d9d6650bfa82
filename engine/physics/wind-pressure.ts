// Wind pressure on the faces of a low building.

/** Mean coefficient of a wall that the wind meets head-on. */
const headOn = 0.6;

/**
 * Wind pressure coefficient of a wall, averaged over it.
 *
 *   C_p(θ) = 0.6 · ln[1.248 − 0.703·sin(θ/2) − 1.175·sin²θ + 0.131·sin³(2θG) + 0.769·cos(θ/2)
 *            + 0.07·G²·sin²(θ/2) + 0.717·cos²(θ/2)],   G = ln(width of this wall / width of the next)
 *
 * Low buildings standing free, about square in plan where G is 0. 0.6 to windward, −0.44 along the wall,
 * −0.36 to leeward.
 *
 * @param incidenceDeg angle between the wall's outward normal and where the wind comes from, 0 to 180 [°]
 * @param sideRatioLog G
 *
 * Source: M. V. Swami and S. Chandra, "Correlations for pressure distribution on buildings and
 * calculation of natural-ventilation airflow", ASHRAE Transactions 94 (1988) (constants from memory).
 */
export function wallWindCoefficient(incidenceDeg: number, sideRatioLog = 0): number {
  const angle = (incidenceDeg * Math.PI) / 180;
  const half = angle / 2;
  const sine = Math.sin(angle);
  const skew = Math.sin(2 * angle * sideRatioLog);
  const inner =
    1.248 -
    0.703 * Math.sin(half) -
    1.175 * sine * sine +
    0.131 * skew * skew * skew +
    0.769 * Math.cos(half) +
    0.07 * sideRatioLog * sideRatioLog * Math.sin(half) ** 2 +
    0.717 * Math.cos(half) ** 2;
  return headOn * Math.log(inner);
}

/**
 * Coefficient of a roof of little slope, averaged over it and over all winds.
 *
 * Source: ASHRAE Handbook of Fundamentals, chapter on airflow around buildings (from memory).
 */
export const roofWindCoefficient = -0.5;

/** Angle between two directions of the compass, 0 to 180 [°]. */
export function angleBetweenDeg(oneDeg: number, otherDeg: number): number {
  return Math.abs(((((oneDeg - otherDeg) % 360) + 540) % 360) - 180);
}
