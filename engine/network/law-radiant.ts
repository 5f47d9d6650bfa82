// Constants of exchange by the fourth power of absolute temperature.

/** Stefan-Boltzmann constant [W/(m²·K⁴)], exact since 2019: CODATA 2018. */
export const stefanBoltzmann = 5.670374419e-8;

/** 0 °C in kelvin, by definition of the Celsius scale. */
export const zeroC = 273.15;
