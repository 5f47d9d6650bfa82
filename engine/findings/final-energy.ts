// From heat and cold in the rooms to what is bought: carriers, cost and CO₂ by the user's own factors.
import type { RoomParts } from '../assembly/index.ts';
import type { Building, Supply } from '../building/index.ts';
import { supplyPower } from './supply-power.ts';

/** Bought over the year for one room, or for all. */
export interface SpaceEnergy {
  readonly finalEnergyKWh: Readonly<Record<string, number>>;
  /** In the project's currency. */
  readonly cost: number;
  readonly co2Kg: number;
}

/** One machine over the year. */
export interface SupplyFindings {
  readonly id: string;
  readonly kind: Supply['kind'];
  /** Heat or cold that left it, backup included [kWh]. */
  readonly outputKWh: number;
  readonly inputKWh: Readonly<Record<string, number>>;
  /** Output over all that it drew, auxiliaries and backup included; null where it never ran. */
  readonly yearlyEfficiency: number | null;
  readonly peakOutputW: number;
  /** Hours in which the rooms together took more than it can give, and how much [kWh]. */
  readonly hoursShort: number;
  readonly shortKWh: number;
}

export interface FinalEnergy {
  readonly rooms: readonly SpaceEnergy[];
  readonly building: SpaceEnergy;
  readonly supplies: readonly SupplyFindings[];
  readonly assumptions: readonly string[];
}

/** kWh by carrier, being added up. */
type Tally = Map<string, number>;
const add = (tally: Tally, carrier: string, kWh: number) =>
  tally.set(carrier, (tally.get(carrier) ?? 0) + kWh);

/**
 * Final energy of a run. Every hour the rooms that a supply serves add up to its output, distribution
 * losses on top (taken as lost); what it draws is shared between them by what they took in that hour,
 * and standing losses of hours without output by what they took in the year.
 *
 * A boiler stands warm on days on which it gives heat, and is cold on all others.
 *
 * @param powerW hourly power of a plant's own meter [W]
 * @returns null where the project names no carriers
 */
export function finalEnergy(
  building: Building,
  rooms: readonly RoomParts[],
  outdoorC: Float64Array,
  powerW: (meter: number) => Float64Array,
): FinalEnergy | null {
  const { carriers, supplies } = building.energy;
  if (carriers.length === 0) return null;
  const tallies = rooms.map((): Tally => new Map());
  const assumptions: string[] = [];
  const machines = supplies.map((supply) => runSupply(supply, rooms, outdoorC, powerW, tallies));
  rooms.forEach((parts, r) => {
    for (const { carrier, powerW: drawnW } of parts.drawn)
      add(tallies[r], carrier, drawnW.reduce((sum, w) => sum + w, 0) / 1000);
    for (const { field, plant } of parts.plants)
      if (plant.supply === undefined)
        assumptions.push(
          `Final energy leaves out ${fieldNames[field]} of ${parts.room.name}: it names no supply.`,
        );
  });
  const bought = tallies.map((tally) => spaceEnergy(building, tally));
  const whole: Tally = new Map();
  for (const tally of tallies) for (const [carrier, kWh] of tally) add(whole, carrier, kWh);
  return {
    rooms: bought,
    building: spaceEnergy(building, whole),
    supplies: machines,
    assumptions,
  };
}

const fieldNames = { heating: 'heating', backupHeating: 'backup heating', cooling: 'cooling' };

function spaceEnergy(building: Building, tally: Tally): SpaceEnergy {
  const { carriers } = building.energy;
  const kWhOf = (id: string) => tally.get(id) ?? 0;
  return {
    finalEnergyKWh: Object.fromEntries(carriers.map(({ id }) => [id, kWhOf(id)])),
    cost: carriers.reduce((sum, one) => sum + one.costPerKWh * kWhOf(one.id), 0),
    co2Kg: carriers.reduce((sum, one) => sum + one.co2KgPerKWh * kWhOf(one.id), 0),
  };
}

/** Hours of what a machine draws, by carrier. */
function runSupply(
  supply: Supply,
  rooms: readonly RoomParts[],
  outdoorC: Float64Array,
  powerW: (meter: number) => Float64Array,
  tallies: readonly Tally[],
): SupplyFindings {
  const hours = outdoorC.length;
  const takers = rooms.flatMap((parts, r) =>
    parts.plants
      .filter(({ plant }) => plant.supply === supply.id)
      .map(({ meter }) => ({ tally: tallies[r], takenW: powerW(meter) })),
  );
  const outputW = new Float64Array(hours);
  for (const { takenW } of takers)
    for (let h = 0; h < hours; h++) outputW[h] += Math.max(0, takenW[h]) / supply.distributionShare;
  const inputKWh: Tally = new Map();
  const standing: Tally = new Map();
  const yearW = takers.map(({ takenW }) => takenW.reduce((sum, w) => sum + Math.max(0, w), 0));
  const totalW = yearW.reduce((sum, w) => sum + w, 0);
  let outputKWh = 0;
  let peakOutputW = 0;
  let hoursShort = 0;
  let shortKWh = 0;
  for (let h = 0; h < hours; h++) {
    const ready = outputW[h] > 0 || runsThatDay(outputW, h);
    const power = supplyPower(supply, outputW[h], outdoorC[h], ready);
    outputKWh += outputW[h] / 1000;
    peakOutputW = Math.max(peakOutputW, outputW[h]);
    if (power.shortW > 1e-6 * outputW[h]) {
      hoursShort++;
      shortKWh += power.shortW / 1000;
    }
    for (const [carrier, w] of drawnW(supply, power, outputW[h])) {
      add(inputKWh, carrier, w / 1000);
      if (outputW[h] === 0) add(standing, carrier, w / 1000);
      else
        for (const { tally, takenW } of takers) {
          const share = Math.max(0, takenW[h]) / supply.distributionShare / outputW[h];
          add(tally, carrier, (share * w) / 1000);
        }
    }
  }
  for (const [carrier, kWh] of standing)
    takers.forEach(({ tally }, i) => {
      add(tally, carrier, (kWh * yearW[i]) / totalW);
    });
  const drawn = [...inputKWh.values()].reduce((sum, kWh) => sum + kWh, 0);
  return {
    id: supply.id,
    kind: supply.kind,
    outputKWh,
    inputKWh: Object.fromEntries(inputKWh),
    yearlyEfficiency: drawn > 0 ? outputKWh / drawn : null,
    peakOutputW,
    hoursShort,
    shortKWh,
  };
}

function runsThatDay(outputW: Float64Array, hour: number): boolean {
  const first = hour - (hour % 24);
  for (let h = first; h < first + 24; h++) if (outputW[h] > 0) return true;
  return false;
}

/** Carrier and power of machine, auxiliaries and backup. */
function drawnW(
  supply: Supply,
  power: ReturnType<typeof supplyPower>,
  outputW: number,
): [string, number][] {
  const list: [string, number][] = [];
  if (power.inputW > 0) list.push([supply.carrier, power.inputW]);
  if (outputW > 0 && supply.auxiliaryW > 0)
    list.push([supply.auxiliaryCarrier ?? supply.carrier, supply.auxiliaryW]);
  if (supply.kind === 'heat-pump' && supply.backup && power.backupHeatW > 0)
    list.push([supply.backup.carrier, power.backupHeatW / supply.backup.efficiency]);
  return list;
}
