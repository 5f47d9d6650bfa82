// State-dependent links: flow and slopes of every law, link by link, block by block.
//
// Every link is written as  flow = slopeFrom·T_from − slopeTo·T_to + rest  around the state at which
// it was evaluated, so that one loop serves all laws. A boundary end has no slope: it is known.
// Slopes are never negative, which keeps the matrix an M-matrix: the films' flows rise with the
// difference by their form; a function or table that falls faster than the difference rises counts as
// level, which leaves the solution as it is and only slows the iteration.

import { stefanBoltzmann, zeroC } from './law-radiant.ts';
import type { ConductanceTable, Network } from './problem.ts';

/** What a link does; its numbers are `numbers[width · l]` on. */
export const film = 0; // warmer, cooler, base, exponent, softening
export const joinedFilm = 1; // warmer, cooler, roughness, exponent, area
export const radiant = 2; // σ · exchange area
export const called = 3;
export const tabled = 4; // area, then the place of the table
export const width = 5;

/** z^(exponent/2): by roots where the exponent is a usual one, since `pow` is slow. */
const [third, whole, quarter, half, twoThirds, any] = [0, 1, 2, 3, 4, 5];

/** All state-dependent links; the order is that of the blocks. */
export interface StateLinks {
  readonly count: number;
  /** Place of link k of group g: `place[offset[g] + k]`. */
  readonly offset: Int32Array;
  readonly place: Int32Array;
  readonly kind: Uint8Array;
  readonly root: Uint8Array;
  readonly from: Int32Array;
  readonly to: Int32Array;
  readonly series: Int32Array;
  readonly numbers: Float64Array;
  /** 1 where the end is unknown, 0 where it is a boundary. */
  readonly freeFrom: Float64Array;
  readonly freeTo: Float64Array;
  /** Slopes at the state last evaluated, 0 at boundaries [W/K], and the flow there [W]. */
  readonly slopeFrom: Float64Array;
  readonly slopeTo: Float64Array;
  readonly flowW: Float64Array;
  readonly functions: readonly ConductanceFunction[];
  readonly tables: readonly ConductanceTable[];
}

type ConductanceFunction = (fromC: number, toC: number, step: number) => number;

/** Half-width of the difference quotient [K]. */
const probeK = 1e-4;

interface One {
  readonly kind: number;
  readonly from: number;
  readonly to: number;
  readonly numbers: readonly number[];
  readonly series: number;
  readonly call: ConductanceFunction | null;
  readonly table: ConductanceTable | null;
  readonly flat: number;
}

/** The links of a network one by one, in the order of its groups. */
function listed(network: Network, slotOf: Int32Array): { all: One[]; offset: Int32Array } {
  const all: One[] = [];
  const offset = new Int32Array(network.links.length);
  network.links.forEach((group, g) => {
    offset[g] = all.length;
    if (group.law === 'constant' || group.law === 'scaled') return;
    for (let k = 0; k < group.from.length; k++) {
      const ends = { from: slotOf[group.from[k]], to: slotOf[group.to[k]], flat: all.length };
      const plain = { ...ends, series: -1, call: null, table: null };
      switch (group.law) {
        case 'buoyant': {
          const { warmerFrom, coolerFrom, baseWPerK, exponent, softeningK2, baseSeries } = group;
          const numbers = [warmerFrom[k], coolerFrom[k], baseWPerK[k], exponent, softeningK2];
          all.push({ ...plain, kind: film, numbers, series: baseSeries[k] });
          break;
        }
        case 'mixed-film': {
          const { warmerFrom, coolerFrom, roughness, exponent, areaM2, forcedSeries } = group;
          const numbers = [warmerFrom[k], coolerFrom[k], roughness[k], exponent, areaM2[k]];
          all.push({ ...plain, kind: joinedFilm, numbers, series: forcedSeries[k] });
          break;
        }
        case 'radiant':
          all.push({
            ...plain,
            kind: radiant,
            numbers: [stefanBoltzmann * group.exchangeAreaM2[k]],
          });
          break;
        case 'function': {
          const table = group.tables?.[k] ?? null;
          const { conductanceWPerK: of } = group;
          if (table) all.push({ ...plain, kind: tabled, numbers: [table.factor], table });
          else {
            const call: ConductanceFunction = (a, b, step) => of(k, a, b, step);
            all.push({ ...plain, kind: called, numbers: [], call });
          }
          break;
        }
        default:
          group satisfies never;
      }
    }
  });
  return { all, offset };
}

function rootOf(kind: number, exponent: number): number {
  if (kind !== film && kind !== joinedFilm) return 0;
  if (exponent === 1 / 3) return third;
  if (exponent === 1) return whole;
  if (exponent === 1 / 4) return quarter;
  if (exponent === 1 / 2) return half;
  return exponent === 2 / 3 ? twoThirds : any;
}

/**
 * @param slotOf place of each node in the state vector that the laws read
 * @param firstFixed slots from here on are boundaries
 * @param blockOf block of an unknown's slot: links are put in the order of their blocks
 */
export function compileLinks(
  network: Network,
  slotOf: Int32Array,
  firstFixed: number,
  blockOf: (slot: number) => number,
): StateLinks {
  const { all, offset } = listed(network, slotOf);
  const block = (one: One) => blockOf(one.from < firstFixed ? one.from : one.to);
  const sorted = [...all].sort((a, b) => block(a) - block(b) || a.kind - b.kind || a.flat - b.flat);
  const place = new Int32Array(all.length);
  const numbers = new Float64Array(width * all.length);
  const functions: ConductanceFunction[] = [];
  const tables: ConductanceTable[] = [];
  sorted.forEach((one, l) => {
    place[one.flat] = l;
    numbers.set(one.numbers, width * l);
    if (one.call) numbers[width * l + 1] = functions.push(one.call) - 1;
    if (one.table) numbers[width * l + 1] = tables.push(one.table) - 1;
  });
  const ints = (of: (one: One) => number) => Int32Array.from(sorted, of);
  const results = () => new Float64Array(all.length);
  return {
    count: all.length,
    offset,
    place,
    kind: Uint8Array.from(sorted, (one) => one.kind),
    root: Uint8Array.from(sorted, (one) => rootOf(one.kind, one.numbers[3])),
    from: ints((one) => one.from),
    to: ints((one) => one.to),
    series: ints((one) => one.series),
    numbers,
    freeFrom: Float64Array.from(sorted, (one) => (one.from < firstFixed ? 1 : 0)),
    freeTo: Float64Array.from(sorted, (one) => (one.to < firstFixed ? 1 : 0)),
    slopeFrom: results(),
    slopeTo: results(),
    flowW: results(),
    functions,
    tables,
  };
}

function raise(z: number, root: number, exponent: number): number {
  if (root === third) return Math.cbrt(Math.sqrt(z));
  if (root === whole) return Math.sqrt(z);
  if (root === quarter) return Math.sqrt(Math.sqrt(Math.sqrt(z)));
  if (root === half) return Math.sqrt(Math.sqrt(z));
  if (root === twoThirds) return Math.cbrt(z);
  return z ** (exponent / 2);
}

/**
 * Evaluates links `first` to `last` − 1 at state `x`.
 *
 * film:        flow = G·d, G = base·series + c·z^(n/2), z = d² + ε; slope = G + n·c·z^(n/2)·d²/z.
 * joined film: flow = A·h·d, h = hn + R·(s − hn), hn = c·|d|^n, s = √(hn² + hf²);
 *              slope = A·(h + n·hn·(1 − R + R·hn/s)).
 * radiant:     flow = σA·(a⁴ − b⁴); slopes 4σA·a³ and 4σA·b³.
 */
export function evaluateLinks(
  links: StateLinks,
  first: number,
  last: number,
  x: Float64Array,
  series: Float64Array,
  step: number,
): void {
  const { kind, root, from, to, numbers, freeFrom, freeTo, slopeFrom, slopeTo, flowW } = links;
  for (let l = first; l < last; l++) {
    const a = x[from[l]];
    const b = x[to[l]];
    const d = a - b;
    const p = width * l;
    const what = kind[l];
    if (what === film) {
      const square = d * d;
      const z = square + numbers[p + 4];
      const exponent = numbers[p + 3];
      const natural = (d > 0 ? numbers[p] : numbers[p + 1]) * raise(z, root[l], exponent);
      const s = links.series[l];
      const g = natural + (s < 0 ? numbers[p + 2] : numbers[p + 2] * series[s]);
      const slope = z > 0 ? g + (exponent * natural * square) / z : g;
      slopeFrom[l] = slope * freeFrom[l];
      slopeTo[l] = slope * freeTo[l];
      flowW[l] = g * d;
    } else if (what === joinedFilm) {
      const exponent = numbers[p + 3];
      const natural = (d > 0 ? numbers[p] : numbers[p + 1]) * raise(d * d, root[l], exponent);
      const forced = series[links.series[l]];
      const rough = numbers[p + 2];
      const joined = Math.sqrt(natural * natural + forced * forced);
      const h = natural + rough * (joined - natural);
      const bend = joined > 0 ? 1 - rough + (rough * natural) / joined : 0;
      const slope = numbers[p + 4] * (h + exponent * natural * bend);
      slopeFrom[l] = slope * freeFrom[l];
      slopeTo[l] = slope * freeTo[l];
      flowW[l] = numbers[p + 4] * h * d;
    } else if (what === radiant) {
      const hot = a + zeroC;
      const cold = b + zeroC;
      const s = numbers[p];
      const hot2 = hot * hot;
      const cold2 = cold * cold;
      slopeFrom[l] = 4 * s * hot2 * hot * freeFrom[l];
      slopeTo[l] = 4 * s * cold2 * cold * freeTo[l];
      flowW[l] = s * d * (hot + cold) * (hot2 + cold2);
    } else if (what === tabled) evaluateTable(links, l, a, b);
    else {
      const of = links.functions[numbers[p + 1]];
      const flow = of(a, b, step) * d;
      const up = of(a + probeK, b, step) * (d + probeK) - flow;
      const down = of(a, b + probeK, step) * (d - probeK) - flow;
      slopeFrom[l] = Math.max(0, up / probeK) * freeFrom[l];
      slopeTo[l] = Math.max(0, -down / probeK) * freeTo[l];
      flowW[l] = flow;
    }
  }
}

/** flow = G·(a − b), G straight in mean and difference between the table's points. */
function evaluateTable(links: StateLinks, l: number, a: number, b: number): void {
  const { numbers, slopeFrom, slopeTo, flowW, freeFrom, freeTo } = links;
  const table = links.tables[numbers[width * l + 1]];
  const { rows, columns, values, rowStepK, columnStepK } = table;
  const d = a - b;
  const u = ((a + b) / 2 - table.firstMeanC) / rowStepK;
  const v = (-d - table.firstDifferenceK) / columnStepK;
  const r = Math.max(0, Math.min(rows - 2, Math.floor(u)));
  const c = Math.max(0, Math.min(columns - 2, Math.floor(v)));
  const up = Math.max(0, Math.min(1, u - r));
  const along = Math.max(0, Math.min(1, v - c));
  const at = r * columns + c;
  const low = values[at] + along * (values[at + 1] - values[at]);
  const next = at + columns;
  const high = values[next] + along * (values[next + 1] - values[next]);
  const factor = numbers[width * l];
  const g = factor * (low + up * (high - low));
  // Beyond the table its edge holds: no slope there.
  const byMean = up === u - r ? (factor * (high - low)) / rowStepK : 0;
  const across = values[at + 1] - values[at];
  const acrossHigh = values[next + 1] - values[next];
  const byDifference =
    along === v - c ? (factor * (across + up * (acrossHigh - across))) / columnStepK : 0;
  slopeFrom[l] = Math.max(0, g + d * (byMean / 2 - byDifference)) * freeFrom[l];
  slopeTo[l] = Math.max(0, g - d * (byMean / 2 + byDifference)) * freeTo[l];
  flowW[l] = g * d;
}
