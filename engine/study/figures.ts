// The figures by which cases are compared, of a room or the whole building.
import type { SpaceFindings } from '../findings/index.ts';

export interface FigureKind {
  readonly label: string;
  readonly unit: string;
  readonly digits: number;
  /** Counted in whole hours: a count that moves at all is no surer than one of them. */
  readonly counted?: boolean;
  /** NaN where the run has none. */
  readonly of: (space: SpaceFindings) => number;
}

const sum = (values: Readonly<Record<string, number>> | undefined) =>
  values === undefined ? Number.NaN : Object.values(values).reduce((a, b) => a + b, 0);

export const figureKinds = {
  heatingKWh: { label: 'Heating', unit: 'kWh', digits: 0, of: (s) => s.heatingKWh },
  coolingKWh: { label: 'Cooling', unit: 'kWh', digits: 0, of: (s) => s.coolingKWh },
  finalEnergyKWh: {
    label: 'Final energy',
    unit: 'kWh',
    digits: 0,
    of: (s) => sum(s.finalEnergyKWh),
  },
  cost: { label: 'Running cost', unit: 'a year', digits: 0, of: (s) => s.cost ?? Number.NaN },
  co2Kg: { label: 'CO₂', unit: 'kg', digits: 0, of: (s) => s.co2Kg ?? Number.NaN },
  peakHeatingW: { label: 'Peak heating', unit: 'W', digits: 0, of: (s) => s.peakHeatingW },
  peakCoolingW: { label: 'Peak cooling', unit: 'W', digits: 0, of: (s) => s.peakCoolingW },
  hoursBelowBand: {
    label: 'Below the band',
    unit: 'h',
    counted: true,
    digits: 0,
    of: (s) => s.hoursBelowBand,
  },
  hoursAboveBand: {
    label: 'Above the band',
    unit: 'h',
    counted: true,
    digits: 0,
    of: (s) => s.hoursAboveBand,
  },
  degreeHoursBelow: {
    label: 'Below the band',
    unit: 'K·h',
    digits: 0,
    of: (s) => s.degreeHoursBelow,
  },
  degreeHoursAbove: {
    label: 'Above the band',
    unit: 'K·h',
    digits: 0,
    of: (s) => s.degreeHoursAbove,
  },
  lowestOperativeC: {
    label: 'Lowest operative',
    unit: '°C',
    digits: 1,
    of: (s) => s.operativeTemperatureC.min,
  },
  highestOperativeC: {
    label: 'Highest operative',
    unit: '°C',
    digits: 1,
    of: (s) => s.operativeTemperatureC.max,
  },
} as const satisfies Readonly<Record<string, FigureKind>>;

export type FigureName = keyof typeof figureKinds;
export const figureNames = Object.keys(figureKinds) as FigureName[];

/** One figure of a case beside the base. */
export interface Figure {
  readonly value: number;
  /** Case less base; 0 for the base itself. */
  readonly difference: number;
  /** Numerical uncertainty of the difference, 0 or more; null where it was not asked for. */
  readonly uncertainty: number | null;
}

export type Figures = Readonly<Partial<Record<FigureName, Figure>>>;

/** Whether a difference may be called one; null where the uncertainty is not known. */
export function isDifference({ difference, uncertainty }: Figure): boolean | null {
  return uncertainty === null ? null : Math.abs(difference) > uncertainty;
}

/** Figures of a case: one run each of case and base, and where wanted a second pair cut in another way. */
export function figuresOf(
  ofCase: SpaceFindings,
  ofBase: SpaceFindings,
  second: { readonly ofCase: SpaceFindings; readonly ofBase: SpaceFindings } | null,
  factor: number,
): Figures {
  const list = figureNames.flatMap((name): [FigureName, Figure][] => {
    const kind: FigureKind = figureKinds[name];
    const { of } = kind;
    const value = of(ofCase);
    if (Number.isNaN(value)) return [];
    const difference = value - of(ofBase);
    const other = second && of(second.ofCase) - of(second.ofBase);
    const least = kind.counted && difference !== 0 ? 1 : 0;
    const uncertainty =
      other === null ? null : Math.max(least, factor * Math.abs(other - difference));
    return [[name, { value, difference, uncertainty }]];
  });
  return Object.fromEntries(list) as Figures;
}
