// Grey-body exchange by the fourth power of absolute temperature, for links and for enclosures.

import type { Law, StateLinks } from './laws.ts';
import type { RadiantLinks } from './problem.ts';

/** Stefan-Boltzmann constant [W/(m²·K⁴)], exact since 2019: CODATA 2018. */
export const stefanBoltzmann = 5.670374419e-8;

/** 0 °C in kelvin, by definition of the Celsius scale. */
export const zeroC = 273.15;

/** flow = σ·A·(T_from⁴ − T_to⁴): slopes 4·σ·A·T³ at either end. */
export function radiantLaw(group: RadiantLinks, set: Omit<StateLinks, 'laws'>, at: number): Law {
  const { exchangeAreaM2 } = group;
  const n = group.from.length;
  const { from, to, slopeFrom, slopeTo, flowW } = set;
  return (x) => {
    for (let k = 0; k < n; k++) {
      const l = at + k;
      const a = x[from[l]] + zeroC;
      const b = x[to[l]] + zeroC;
      const s = stefanBoltzmann * exchangeAreaM2[k];
      slopeFrom[l] = 4 * s * a * a * a;
      slopeTo[l] = 4 * s * b * b * b;
      flowW[l] = s * (a - b) * (a + b) * (a * a + b * b);
    }
  };
}
