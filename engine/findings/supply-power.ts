// What a boiler, heat pump or chiller draws in an hour to give what the rooms take.
import type { Supply, SupplyOf } from '../building/index.ts';
import {
  boilerLoss,
  chillerEer,
  cyclingFactorAir,
  cyclingFactorWater,
  heatPumpCop,
  type RatedPoint,
  ratedAt,
} from '../physics/index.ts';

/** One hour of a machine, means in W. */
export interface SupplyPower {
  /** Drawn from its own carrier, auxiliaries left out. */
  readonly inputW: number;
  /** Heat made by its backup. */
  readonly backupHeatW: number;
  /** Asked for beyond what machine and backup have; it is reckoned as if they had it. */
  readonly shortW: number;
}

/**
 * Power for an output in one hour.
 *
 * @param outputW heat or cold that leaves the machine, 0 or more
 * @param ready whether a boiler stands warm in an hour without output
 */
export function supplyPower(
  supply: Supply,
  outputW: number,
  outdoorC: number,
  ready: boolean,
): SupplyPower {
  switch (supply.kind) {
    case 'direct':
      return { inputW: outputW / supply.efficiency, backupHeatW: 0, shortW: 0 };
    case 'boiler':
      return boilerPower(supply, outputW, ready);
    case 'heat-pump':
      return heatPumpPower(supply, outputW, outdoorC);
    case 'chiller':
      return chillerPower(supply, outputW, outdoorC);
    default:
      return supply satisfies never;
  }
}

/** Fuel is output and losses; losses follow the load from standing by over part load to full. */
function boilerPower(boiler: SupplyOf<'boiler'>, outputW: number, ready: boolean): SupplyPower {
  const { nominalW, fullLoadEfficiency, partLoadEfficiency, partLoadShare } = boiler;
  if (outputW === 0 && !ready) return { inputW: 0, backupHeatW: 0, shortW: 0 };
  const load = outputW / nominalW;
  const full = 1 / fullLoadEfficiency - 1;
  const part = partLoadShare * (1 / partLoadEfficiency - 1);
  const loss =
    load > 1 ? load * full : boilerLoss(load, boiler.standbyLossShare, part, full, partLoadShare);
  return {
    inputW: outputW + loss * nominalW,
    backupHeatW: 0,
    shortW: Math.max(0, outputW - nominalW),
  };
}

const at = (value: number | readonly RatedPoint[], outdoorC: number): number =>
  typeof value === 'number' ? value : ratedAt(value, outdoorC);

/** Factor on COP or EER below the least continuous output. */
function cyclingFactor(
  kind: 'water' | 'air' | 'none',
  outputW: number,
  capacityW: number,
  leastShare: number,
): number {
  const leastW = capacityW * leastShare;
  if (kind === 'none' || !(leastW < Number.POSITIVE_INFINITY) || outputW >= leastW) return 1;
  const ratio = outputW / leastW;
  return kind === 'water' ? cyclingFactorWater(ratio) : cyclingFactorAir(ratio);
}

function heatPumpPower(
  pump: SupplyOf<'heat-pump'>,
  outputW: number,
  outdoorC: number,
): SupplyPower {
  if (outputW === 0) return { inputW: 0, backupHeatW: 0, shortW: 0 };
  const sourceC = pump.sourceC ?? outdoorC;
  const { carnot } = pump;
  const cop = carnot
    ? heatPumpCop(sourceC, at(carnot.flowC, outdoorC), carnot.qualityShare, carnot.exchangerK)
    : ratedAt(pump.cop ?? [], sourceC);
  const capacityW = pump.capacityW ? ratedAt(pump.capacityW, sourceC) : Number.POSITIVE_INFINITY;
  const beyondW = Math.max(0, outputW - capacityW);
  const machineW = pump.backup ? outputW - beyondW : outputW;
  const factor = cyclingFactor(pump.cycling, machineW, capacityW, pump.leastShare);
  return {
    inputW: machineW === 0 ? 0 : machineW / (cop * factor),
    backupHeatW: pump.backup ? beyondW : 0,
    shortW: pump.backup ? 0 : beyondW,
  };
}

function chillerPower(
  chiller: SupplyOf<'chiller'>,
  outputW: number,
  outdoorC: number,
): SupplyPower {
  if (outputW === 0) return { inputW: 0, backupHeatW: 0, shortW: 0 };
  const { carnot } = chiller;
  const eer = carnot
    ? chillerEer(outdoorC, at(carnot.flowC, outdoorC), carnot.qualityShare, carnot.exchangerK)
    : ratedAt(chiller.eer ?? [], outdoorC);
  const capacityW = chiller.capacityW
    ? ratedAt(chiller.capacityW, outdoorC)
    : Number.POSITIVE_INFINITY;
  const factor = cyclingFactor(chiller.cycling, outputW, capacityW, chiller.leastShare);
  return {
    inputW: outputW / (eer * factor),
    backupHeatW: 0,
    shortW: Math.max(0, outputW - capacityW),
  };
}
