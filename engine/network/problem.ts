// The solver's whole interface: a Problem (what to compute), a Method (how), a Run (what came out).
// The network knows nodes, links, sources and controlled sources; it knows no room and no sun.
//
//   C·dT/dt = Σ G·(Tj − Ti) + Σ Gdirected·(Tj − Ti) + radiation + sources + plant
//
// All indices point into the node list. Heat is positive into a node, a link's flow is positive from
// `from` to `to`.

/** A value for every step. `step`: constant over step k (`values[k]`, length stepCount). `linear`: at
 * the step's ends, straight in between (`values[k]` to `values[k + 1]`, length stepCount + 1). `ramp`:
 * straight within each step, with jumps between them (`values[2k]` to `values[2k + 1]`, length
 * 2 · stepCount). */
export interface Series {
  readonly name: string;
  readonly hold: 'step' | 'linear' | 'ramp';
  readonly values: Float64Array;
}

/** Symmetric links whose conductance does not change. */
export interface ConstantLinks {
  readonly law: 'constant';
  readonly from: Int32Array;
  readonly to: Int32Array;
  readonly conductanceWPerK: Float64Array;
}

/** Symmetric links whose conductance follows a series: G = conductance · series. */
export interface ScaledLinks {
  readonly law: 'scaled';
  readonly from: Int32Array;
  readonly to: Int32Array;
  readonly conductanceWPerK: Float64Array;
  readonly series: Int32Array;
}

/**
 * Buoyancy: G = base · series + c · (ΔT² + ε)^(n/2), with c = `warmerFrom` where T_from > T_to, else
 * `coolerFrom`. One exponent n and one softening ε a group (ε 0 for the plain power law).
 */
export interface BuoyantLinks {
  readonly law: 'buoyant';
  readonly from: Int32Array;
  readonly to: Int32Array;
  /** W/K per K^n. */
  readonly warmerFrom: Float64Array;
  readonly coolerFrom: Float64Array;
  readonly exponent: number;
  readonly softeningK2: number;
  /** Series index of the part that does not depend on ΔT, or −1. */
  readonly baseSeries: Int32Array;
  readonly baseWPerK: Float64Array;
}

/**
 * Outside film, natural and forced joined: with hn = c·|ΔT|^n and hf from a series (W/m²K),
 * G = area · (hn + roughness · (√(hn² + hf²) − hn)).
 */
export interface MixedFilmLinks {
  readonly law: 'mixed-film';
  readonly from: Int32Array;
  readonly to: Int32Array;
  readonly areaM2: Float64Array;
  /** W/m²K per K^n. */
  readonly warmerFrom: Float64Array;
  readonly coolerFrom: Float64Array;
  readonly exponent: number;
  readonly forcedSeries: Int32Array;
  readonly roughness: Float64Array;
}

/** Grey-body exchange of two nodes: q = σ · exchangeArea · (T_from⁴ − T_to⁴). */
export interface RadiantLinks {
  readonly law: 'radiant';
  readonly from: Int32Array;
  readonly to: Int32Array;
  readonly exchangeAreaM2: Float64Array;
}

/**
 * A conductance looked up: straight in between over the mean of the ends (rows) and T_to − T_from
 * (columns), the table's edge beyond it. G = factor · values[row · columns + column].
 */
export interface ConductanceTable {
  /** W/K for 1 of `values`: an area where these are W/(m²·K). */
  readonly factor: number;
  readonly values: Float64Array;
  readonly rows: number;
  readonly columns: number;
  readonly firstMeanC: number;
  readonly rowStepK: number;
  readonly firstDifferenceK: number;
  readonly columnStepK: number;
}

/** Any other law: conductance from the end temperatures and the step; slopes are taken numerically. */
export interface FunctionLinks {
  readonly law: 'function';
  readonly from: Int32Array;
  readonly to: Int32Array;
  /** Conductance [W/K] of link k of this group, 0 or more. */
  readonly conductanceWPerK: (k: number, fromC: number, toC: number, step: number) => number;
  /** Link k as a table, where it is one: the same law, looked up without a call. */
  readonly tables?: readonly (ConductanceTable | null)[];
}

export type LinkGroup =
  | ConstantLinks
  | ScaledLinks
  | BuoyantLinks
  | MixedFilmLinks
  | RadiantLinks
  | FunctionLinks;

/**
 * Many-surface grey enclosure: node i gains σ · Σj X_ij · (Tj⁴ − Ti⁴). X is symmetric, in m², row by
 * row: X_ij = `exchangeAreaM2[i * nodes.length + j]`; its diagonal is not used.
 */
export interface Enclosure {
  readonly name: string;
  readonly nodes: Int32Array;
  readonly exchangeAreaM2: Float64Array;
}

/** Advection: `to` gains rate · series · (T_from − T_to); `from` does not feel it. Flows balance at every node. */
export interface DirectedLinks {
  readonly from: Int32Array;
  readonly to: Int32Array;
  readonly rateWPerK: Float64Array;
  /** Series index that scales the rate, or −1. */
  readonly series: Int32Array;
}

/** Heat put into nodes: `node` gains factor · series [W]. */
export interface Sources {
  readonly node: Int32Array;
  readonly factor: Float64Array;
  readonly series: Int32Array;
}

/**
 * A controlled source, one-sided: power q from 0 to `maxW` that holds the sensor at the set-point.
 * Heater: q > 0 only where the sensor would fall below the set-point; chiller: q > 0 is taken out
 * where it would rise above. Without a proportional band this is the complementarity condition
 * 0 ≤ q ≤ max ⟂ sensor − set-point; with a band, q falls linearly from max to 0 over `bandK`
 * centred on the set-point.
 */
export interface Plant {
  readonly name: string;
  readonly kind: 'heater' | 'chiller';
  /** The sensor reads Σ weight · T; weights add up to 1. */
  readonly sensorNodes: Int32Array;
  readonly sensorWeights: Float64Array;
  /** Where the power goes (or comes from); shares add up to 1. */
  readonly deliveryNodes: Int32Array;
  readonly deliveryShares: Float64Array;
  /** Series of the set-point [°C]; −Infinity (heater) or Infinity (chiller) switches it off. */
  readonly setPointSeries: number;
  /** Series of the greatest power [W]; Infinity where unlimited. */
  readonly maxSeries: number;
  /** 0 for ideal control. */
  readonly bandK: number;
}

/** One flow that a meter adds up, in W into whatever the sign makes it. */
export interface MeterTerm {
  readonly sign: number;
  readonly of:
    | { readonly kind: 'link'; readonly group: number; readonly index: number }
    | { readonly kind: 'directed'; readonly index: number }
    | { readonly kind: 'source'; readonly index: number }
    | { readonly kind: 'plant'; readonly index: number }
    /** Net radiation that a node of an enclosure gains. */
    | { readonly kind: 'enclosure'; readonly enclosure: number; readonly position: number }
    /** C·dT/dt of a node. */
    | { readonly kind: 'storage'; readonly node: number };
}

/** A named sum of flows, recorded as a mean over each record interval [W]. */
export interface Meter {
  readonly name: string;
  readonly terms: readonly MeterTerm[];
}

export interface Network {
  readonly nodeNames: readonly string[];
  /** J/K; 0 for a massless node. Not read for boundary nodes. */
  readonly capacityJPerK: Float64Array;
  /** Series that prescribes the node's temperature (a boundary node), or −1. */
  readonly boundarySeries: Int32Array;
  readonly links: readonly LinkGroup[];
  readonly enclosures: readonly Enclosure[];
  readonly directed: DirectedLinks;
  readonly sources: Sources;
  readonly plants: readonly Plant[];
}

/** Where the march begins. */
export type Start =
  | { readonly kind: 'temperatures'; readonly tempC: Float64Array }
  /** Steady state of the mean drivers, then the last `spanSteps` steps over and over until every node
   * comes back to within `toleranceK`, at most `maxPasses` times: what leads up to the first step in a
   * year that follows itself. */
  | {
      readonly kind: 'periodic';
      readonly spanSteps: number;
      readonly toleranceK: number;
      readonly maxPasses: number;
    };

export interface Problem {
  readonly network: Network;
  readonly stepS: number;
  readonly stepCount: number;
  readonly series: readonly Series[];
  readonly start: Start;
  /** Steps in one record interval (4 for hourly records of quarter-hour steps). */
  readonly stepsPerRecord: number;
  /** Nodes whose temperature is recorded. */
  readonly recordNodes: Int32Array;
  readonly meters: readonly Meter[];
}

/** How to compute; knows nothing of what. */
export interface Method {
  /** Largest change of any node in the last iteration of a step [K]. */
  readonly toleranceK: number;
  readonly maxIterations: number;
  /** The WebAssembly kernel (dist/kernel.wasm), where there is one: same results, several times as fast. */
  readonly kernel?: Uint8Array;
}

export type Outcome =
  | { readonly kind: 'finished' }
  /** Stopped by the caller before step `atStep`. */
  | { readonly kind: 'stopped'; readonly atStep: number }
  | { readonly kind: 'diverged'; readonly atStep: number; readonly node: string };

export interface Run {
  readonly problem: Problem;
  readonly method: Method;
  readonly outcome: Outcome;
  /** Whole record intervals held in the arrays below. */
  readonly records: number;
  /** Mean of recorded node i in record r: `meanC[r * recordNodes.length + i]`. */
  readonly meanC: Float64Array;
  /** At the record's end, same layout. */
  readonly endC: Float64Array;
  /** Mean of meter m in record r: `meterW[r * meters.length + m]`. */
  readonly meterW: Float64Array;
  /** All nodes at the end. */
  readonly finalC: Float64Array;
  readonly quality: Quality;
}

export interface Quality {
  /** Largest imbalance of the whole network in any step over that step's throughput. */
  readonly relativeBalanceResidual: number;
  readonly unconvergedSteps: number;
  readonly iterations: number;
  readonly steps: number;
  /** Passes of the start-up, and what was left of the drift. */
  readonly warmUpPasses: number;
  readonly warmUpSteps: number;
  readonly warmUpDriftK: number;
}
