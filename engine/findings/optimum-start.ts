// How early heating has to start so that the room is warm when its set-point rises: learned from a run
// in which it starts with the rise.
import type { Assembly, PlantParts } from '../assembly/index.ts';
import type { Run } from '../network/index.ts';

/** Set-points with the rises brought forward, and how far. */
export interface EarlyStarts {
  /** At both ends of every step [°C]. */
  readonly ramp: Float64Array;
  /** Time by which each rise comes earlier [h]. */
  readonly leadsH: readonly number[];
}

/** Nearer to the set-point than this counts as warm [K]. */
const warmK = 0.2;
/** Share by which the newest warm-up moves what was learned. */
const learning = 0.25;

/** A room as the learner sees it; times in hours from the start of the year. */
interface Learner {
  readonly ramp: Float64Array;
  readonly stepH: number;
  readonly mostHours: number;
  /** Temperature that the sensor reads at a time. */
  readonly atC: (timeH: number) => number;
}

interface Rise {
  readonly step: number;
  readonly toC: number;
}

/**
 * Brings every rise of a set-point forward. The rule is our own, as controllers learn:
 *
 *   rate ← rate + ¼·(rate of the last warm-up − rate)   [K/h]
 *   start at the last step from which (set-point − 0.2 K − room)/rate is no more than the time left
 *
 * Warm-ups are those of a run without early starts: from the rise until 0.2 K below the set-point, or
 * until it falls again. The first rate is the mean of the year. A start lies at most `mostHours` before
 * its rise and never before the rise that precedes it.
 */
export function earlyStarts(learner: Learner): EarlyStarts {
  const { ramp, stepH, mostHours } = learner;
  const rises = findRises(ramp);
  const rates = rises.map((rise) => warmUpRateKPerH(learner, rise));
  const known = rates.filter((rate): rate is number => rate !== null);
  const early = Float64Array.from(ramp);
  const leadsH: number[] = [];
  let rate = known.reduce((sum, one) => sum + one, 0) / known.length;
  rises.forEach(({ step, toC }, i) => {
    const least = Math.max(
      0,
      step - Math.floor(mostHours / stepH + 1e-9),
      i > 0 ? rises[i - 1].step + 1 : 0,
    );
    let start = step;
    if (known.length > 0)
      while (start > least && neededH(learner, toC, start, rate) > (step - start) * stepH + 1e-9)
        start--;
    for (let j = 2 * start; j < 2 * step; j++) early[j] = Math.max(early[j], toC);
    leadsH.push((step - start) * stepH);
    const last = rates[i];
    if (last !== null) rate += learning * (last - rate);
  });
  return { ramp: early, leadsH };
}

/** Time that warming up takes from a step on [h]. */
function neededH({ atC, stepH }: Learner, toC: number, step: number, rateKPerH: number): number {
  return Math.max(0, toC - warmK - atC(step * stepH)) / rateKPerH;
}

function findRises(ramp: Float64Array): Rise[] {
  const rises: Rise[] = [];
  for (let k = 1; k < ramp.length / 2; k++)
    if (ramp[2 * k] > ramp[2 * k - 1] + warmK) rises.push({ step: k, toC: ramp[2 * k] });
  return rises;
}

/** Mean rate of one warm-up [K/h]; null where the room is warm already or does not warm up. */
function warmUpRateKPerH({ ramp, stepH, atC }: Learner, { step, toC }: Rise): number | null {
  const fromC = atC(step * stepH);
  const goalC = toC - warmK;
  if (fromC >= goalC) return null;
  let k = step + 1;
  for (; k < ramp.length / 2 && ramp[2 * k] >= toC; k++) {
    const nowC = atC(k * stepH);
    if (nowC < goalC) continue;
    const beforeC = atC((k - 1) * stepH);
    const took = k - 1 - step + (goalC - beforeC) / (nowC - beforeC);
    return (goalC - fromC) / (Math.max(took, 0.1) * stepH);
  }
  const gained = atC((k - 1) * stepH) - fromC;
  return gained > 0.05 && k - 1 > step ? gained / ((k - 1 - step) * stepH) : null;
}

/** Early starts of all rooms that ask for them, by room id, from a run without any. */
export function learnStarts(assembly: Assembly, run: Run): Map<string, EarlyStarts> {
  const starts = new Map<string, EarlyStarts>();
  const stepH = run.problem.stepS / 3600;
  for (const { room, plants, airNode, faces } of assembly.rooms) {
    const main = plants.find((one) => one.field === 'heating');
    if (!main?.plant.optimumStart) continue;
    const sensorC = hourEndsC(run, main, airNode, faces);
    const atC = (timeH: number) => {
      const h = Math.min(run.records - 1, Math.max(0, timeH - 1));
      const low = Math.floor(h);
      const high = Math.min(run.records - 1, low + 1);
      return sensorC[low] + (h - low) * (sensorC[high] - sensorC[low]);
    };
    const { mostHours } = main.plant.optimumStart;
    starts.set(room.id, earlyStarts({ ramp: main.ramp, stepH, mostHours, atC }));
  }
  return starts;
}

/** What the sensor of a heater reads at the end of each hour. */
function hourEndsC(
  run: Run,
  { plant }: PlantParts,
  airNode: number,
  faces: readonly { readonly node: number; readonly areaM2: number }[],
): Float64Array {
  const { recordNodes } = run.problem;
  const width = recordNodes.length;
  const place = (node: number) => recordNodes.indexOf(node);
  const air = place(airNode);
  const total = faces.reduce((sum, face) => sum + face.areaM2, 0);
  const seen = faces.map((face) => ({ at: place(face.node), share: face.areaM2 / total }));
  return Float64Array.from({ length: run.records }, (_, h) => {
    const airC = run.endC[h * width + air];
    if (plant.sensor === 'air') return airC;
    const radiantC = seen.reduce((sum, { at, share }) => sum + share * run.endC[h * width + at], 0);
    return (airC + radiantC) / 2;
  });
}

/** A sentence for the results. */
export function startsText(name: string, { leadsH }: EarlyStarts): string {
  const used = leadsH.filter((lead) => lead > 0);
  if (used.length === 0) return `Heating of ${name} never has to start early.`;
  const mean = used.reduce((sum, lead) => sum + lead, 0) / used.length;
  return `Heating of ${name} starts ahead of ${used.length} of ${leadsH.length} rises, by ${mean.toFixed(1)} h on average and ${Math.max(...used)} h at most (learned from a run without early starts).`;
}
