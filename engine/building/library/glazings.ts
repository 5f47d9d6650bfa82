// Generic glazings: panes and gaps from outside to inside, and plain pairs of U and g. Argon gaps are
// full of argon; real units hold about 90 %, which costs 0.02 to 0.05 W/(m²·K).
import type { Glazing, Pane, PaneGlazing } from '../schema-fabric.ts';
import type { LibraryGlazing } from './types.ts';

const source = 'generic pane values and typical U and g: common practice, no source';

const plain = {
  conductivityWPerMK: 1,
  densityKgPerM3: 2500,
  specificHeatJPerKgK: 750,
  refractiveIndex: 1.526,
  frontEmissivity: 0.84,
  backEmissivity: 0.84,
} as const;

/** Clear glass: its reflectance follows from the refractive index. */
const clear = (thicknessM: number, solarTransmittance: number): Pane => ({
  ...plain,
  thicknessM,
  solarTransmittance,
});
const clear4 = clear(0.004, 0.84);
const clear6 = clear(0.006, 0.8);
const lowIron4 = clear(0.004, 0.9);
const tinted6: Pane = {
  ...plain,
  thicknessM: 0.006,
  solarTransmittance: 0.5,
  frontSolarReflectance: 0.055,
  backSolarReflectance: 0.055,
};

/** A thin metal coating on one face; the coated side reflects more. */
function coated(
  thicknessM: number,
  transmittance: number,
  coatedReflectance: number,
  glassReflectance: number,
  emissivity: number,
  side: 'front' | 'back',
): Pane {
  const front = side === 'front';
  return {
    ...plain,
    thicknessM,
    solarTransmittance: transmittance,
    frontSolarReflectance: front ? coatedReflectance : glassReflectance,
    backSolarReflectance: front ? glassReflectance : coatedReflectance,
    frontEmissivity: front ? emissivity : 0.84,
    backEmissivity: front ? 0.84 : emissivity,
  };
}
const warm = (side: 'front' | 'back') => coated(0.004, 0.6, 0.3, 0.23, 0.04, side);
const warmBright = (side: 'front' | 'back') => coated(0.004, 0.72, 0.18, 0.15, 0.06, side);
const hard = (side: 'front' | 'back') => coated(0.004, 0.72, 0.12, 0.11, 0.17, side);
const sunControl = coated(0.006, 0.3, 0.46, 0.36, 0.03, 'back');
const sunControlMild = coated(0.006, 0.42, 0.38, 0.3, 0.03, 'back');

type Range = readonly [number, number];
type Gas = PaneGlazing['gaps'][number]['gas'];

/** The same gas and thickness in every gap. */
function panes(
  id: string,
  name: string,
  list: readonly Pane[],
  gas: Gas,
  gapM: number,
  typicalUWPerM2K: Range,
  typicalG: Range,
): LibraryGlazing {
  const gaps = list.slice(1).map(() => ({ gas, thicknessM: gapM }));
  const glazing: Glazing = { kind: 'panes', id, name, panes: [...list], gaps, source };
  return { glazing, typicalUWPerM2K, typicalG };
}

function simple(id: string, name: string, uValueWPerM2K: number, gValue: number): LibraryGlazing {
  return {
    glazing: { kind: 'simple', id, name, uValueWPerM2K, gValue, source },
    typicalUWPerM2K: [uValueWPerM2K, uValueWPerM2K],
    typicalG: [gValue, gValue],
  };
}

export const libraryGlazings: readonly LibraryGlazing[] = [
  panes('single-clear-4', 'Single clear 4', [clear4], 'air', 0, [5.6, 5.9], [0.84, 0.89]),
  panes('single-low-iron-4', 'Single low-iron 4', [lowIron4], 'air', 0, [5.6, 5.9], [0.88, 0.92]),
  panes(
    'single-hard-coat-4',
    'Single 4, hard coat inside',
    [hard('back')],
    'air',
    0,
    [3.3, 5.9],
    [0.7, 0.83],
  ),
  panes(
    'double-clear-air-12',
    'Double clear 4-12-4, air',
    [clear4, clear4],
    'air',
    0.012,
    [2.7, 2.9],
    [0.73, 0.79],
  ),
  panes(
    'double-clear-air-16',
    'Double clear 4-16-4, air',
    [clear4, clear4],
    'air',
    0.016,
    [2.6, 2.8],
    [0.73, 0.79],
  ),
  panes(
    'double-clear-6-argon',
    'Double clear 6-16-6, argon',
    [clear6, clear6],
    'argon',
    0.016,
    [2.5, 2.7],
    [0.68, 0.75],
  ),
  panes(
    'double-old-box',
    'Old double window, 60 mm air',
    [clear4, clear4],
    'air',
    0.06,
    [2.6, 2.9],
    [0.73, 0.79],
  ),
  panes(
    'double-hard-coat',
    'Double 4-16-4, hard coat, argon',
    [clear4, hard('front')],
    'argon',
    0.016,
    [1.4, 1.7],
    [0.66, 0.76],
  ),
  panes(
    'double-warm-air',
    'Double 4-16-4, low emissivity, air',
    [clear4, warm('front')],
    'air',
    0.016,
    [1.3, 1.5],
    [0.56, 0.66],
  ),
  panes(
    'double-warm-argon',
    'Double 4-16-4, low emissivity, argon',
    [clear4, warm('front')],
    'argon',
    0.016,
    [1.0, 1.2],
    [0.56, 0.66],
  ),
  panes(
    'double-warm-krypton',
    'Double 4-10-4, low emissivity, krypton',
    [clear4, warm('front')],
    'krypton',
    0.01,
    [0.9, 1.2],
    [0.56, 0.66],
  ),
  panes(
    'double-sun-control',
    'Double sun control, 6-16-4, argon',
    [sunControl, clear4],
    'argon',
    0.016,
    [1.0, 1.2],
    [0.27, 0.36],
  ),
  panes(
    'double-sun-mild',
    'Double mild sun control, 6-16-4, argon',
    [sunControlMild, clear4],
    'argon',
    0.016,
    [1.0, 1.2],
    [0.37, 0.46],
  ),
  panes(
    'double-tinted',
    'Double tinted 6-12-6, air',
    [tinted6, clear6],
    'air',
    0.012,
    [2.7, 2.9],
    [0.45, 0.55],
  ),
  panes(
    'triple-clear',
    'Triple clear 4-12-4-12-4, air',
    [clear4, clear4, clear4],
    'air',
    0.012,
    [1.8, 2.0],
    [0.64, 0.72],
  ),
  panes(
    'triple-warm-argon',
    'Triple, two coats, argon 12',
    [warm('back'), clear4, warm('front')],
    'argon',
    0.012,
    [0.6, 0.8],
    [0.42, 0.56],
  ),
  panes(
    'triple-bright-argon',
    'Triple, two bright coats, argon 18',
    [warmBright('back'), lowIron4, warmBright('front')],
    'argon',
    0.018,
    [0.5, 0.65],
    [0.54, 0.65],
  ),
  panes(
    'triple-warm-krypton',
    'Triple, two coats, krypton 12',
    [warm('back'), clear4, warm('front')],
    'krypton',
    0.012,
    [0.4, 0.6],
    [0.42, 0.56],
  ),
  panes(
    'triple-sun-control',
    'Triple sun control, argon 14',
    [sunControl, clear4, warm('front')],
    'argon',
    0.014,
    [0.55, 0.75],
    [0.2, 0.32],
  ),
  simple('simple-single', 'Single glazing by U and g', 5.8, 0.85),
  simple('simple-double', 'Double glazing by U and g', 2.8, 0.76),
  simple('simple-double-warm', 'Low-emissivity double glazing by U and g', 1.1, 0.6),
  simple('simple-triple', 'Triple glazing by U and g', 0.7, 0.5),
  simple('simple-rooflight', 'Twin-wall plastic rooflight by U and g', 2.4, 0.7),
];
