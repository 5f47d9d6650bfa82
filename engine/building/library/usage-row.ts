import type { Activity } from '../../physics/index.ts';
import type { DayShares, UsageDay, UsageProfile } from './types.ts';

/** Shares from spans: `[untilHour, share]`, from midnight on, the last one to 24. */
export function hours(...spans: readonly (readonly [number, number])[]): DayShares {
  const day: number[] = [];
  for (const [until, value] of spans) while (day.length < until) day.push(value);
  return day;
}

export function day(occupancy: DayShares, lighting: DayShares, equipment: DayShares): UsageDay {
  return { occupancy, lighting, equipment };
}

/** A day on which nobody comes: only what runs on stand-by. */
export function emptyDay(standby: number): UsageDay {
  return day(hours([24, 0]), hours([24, 0]), hours([24, standby]));
}

interface Load {
  readonly m2PerPerson: number;
  readonly activity: Activity;
  readonly lighting: number;
  readonly equipment: number;
  /** Heating set-point and set-back, cooling set-point and set-back [°C]. */
  readonly heat: readonly [number, number];
  readonly cool: readonly [number, number];
  /** Outdoor air for each person, and for each square metre [l/s]. */
  readonly air?: readonly [number, number];
}

/** Category II, building of low emissions: 7 l/s a person and 0.7 l/(s·m²). EN 16798-1:2019, Table B. */
const categoryTwo = [7, 0.7] as const;

const source =
  'form and air flows of EN 16798-1:2019 Annexes B and C (from memory); hours and loads: common practice, no source';

export function usage(
  id: string,
  name: string,
  load: Load,
  weekday: UsageDay,
  weekend: UsageDay,
): UsageProfile {
  const [perPerson, perArea] = load.air ?? categoryTwo;
  return {
    id,
    name,
    floorPerPersonM2: load.m2PerPerson,
    activity: load.activity,
    lightingWPerM2: load.lighting,
    equipmentWPerM2: load.equipment,
    airPerPersonM3PerS: perPerson / 1000,
    airPerAreaM3PerSM2: perArea / 1000,
    heatingSetPointC: load.heat[0],
    heatingSetBackC: load.heat[1],
    coolingSetPointC: load.cool[0],
    coolingSetBackC: load.cool[1],
    weekday,
    weekend,
    source,
  };
}
