// Runs the march's steps in the WebAssembly kernel: moves everything into its memory once, then drivers
// in and records out, some hundred steps at a time. The kernel does what stepper.ts does, number for number
// but for rounding of roots; without it the march runs in JavaScript.

import type { Recorder } from '../recorder.ts';
import type { Stepper } from '../stepper.ts';
import { arraysOf, type Numbers } from './fields.ts';

/** What the kernel's module gives; see kernel.as. */
interface Exports {
  attach(
    places: number,
    lengths: number,
    firstFixed: number,
    firstChain: number,
    directed: number,
    tables: number,
    toleranceK: number,
    maxIterations: number,
  ): void;
  begin(
    x0: number,
    x1: number,
    x2: number,
    stepS: number,
    totalJPerK: number,
    totalWPerK: number,
    stepsPerRecord: number,
  ): void;
  clear(): void;
  openRecords(): void;
  run(
    first: number,
    count: number,
    held: number,
    heldStride: number,
    moving: number,
    movingStride: number,
    records: boolean,
    meanC: number,
    endC: number,
    meterW: number,
  ): number;
  stateNow(): number;
  readonly totalIterations: { readonly value: number };
  readonly unconverged: { readonly value: number };
  readonly worstBalance: { readonly value: number };
  readonly failedSlot: { readonly value: number };
  readonly recordCount: { readonly value: number };
}

/** The parts of WebAssembly in use: the engine is compiled without a browser's or Node's types. */
declare const WebAssembly: {
  readonly Memory: new (of: { initial: number }) => { readonly buffer: ArrayBuffer };
  readonly Module: new (bytes: Uint8Array) => object;
  readonly Instance: new (module: object, imports: object) => { readonly exports: Exports };
};

/** Most steps in one call. */
export const mostSteps = 200;

/** The module's own data lie below. */
const firstByte = 65_536;
const pageBytes = 65_536;

export interface KernelHost {
  readonly exports: Exports;
  readonly buffer: ArrayBuffer;
  /** Address of each array. */
  readonly place: ReadonlyMap<string, number>;
  readonly x1: number;
  readonly held: Float64Array;
  readonly moving: Float64Array;
  readonly meanC: Float64Array;
  readonly endC: Float64Array;
  readonly meterW: Float64Array;
}

const modules = new WeakMap<Uint8Array, object>();

function moduleOf(bytes: Uint8Array): object {
  const known = modules.get(bytes);
  if (known) return known;
  const made = new WebAssembly.Module(bytes);
  modules.set(bytes, made);
  return made;
}

/** A kernel with the state of `stepper` and room for `recorder`'s records. */
export function createHost(stepper: Stepper, recorder: Recorder, bytes: Uint8Array): KernelHost {
  const { problem, layout, stage, readings, method, balance } = stepper;
  const arrays = Object.entries(arraysOf(stepper, recorder));
  const { tables, functions } = stage.laws;
  const records = Math.ceil(mostSteps / problem.stepsPerRecord) + 1;
  let size = firstByte;
  const take = (byteLength: number) => {
    const at = size;
    size += Math.ceil(byteLength / 16) * 16;
    return at;
  };
  const place = new Map(arrays.map(([name, array]) => [name, take(array.byteLength)]));
  const states = [0, 1, 2].map(() => take(8 * layout.slotCount));
  const places = take(4 * arrays.length);
  const lengths = take(4 * arrays.length);
  const tableList = take(56 * tables.length);
  const tableValues = tables.map((table) => take(table.values.byteLength));
  const buffers = [
    readings.held.length * mostSteps,
    readings.moving.length * (2 * mostSteps + 2),
    records * recorder.watch.recordedAt.length,
    records * recorder.watch.recordedAt.length,
    records * problem.meters.length,
  ].map((length) => [take(8 * length), length] as const);
  const memory = new WebAssembly.Memory({ initial: Math.ceil(size / pageBytes) });
  const { buffer } = memory;
  const write = (at: number, array: Numbers) => {
    const bytesOf = new Uint8Array(array.buffer, array.byteOffset, array.byteLength);
    new Uint8Array(buffer, at, array.byteLength).set(bytesOf);
  };
  arrays.forEach(([name, array], i) => {
    const at = place.get(name) ?? 0;
    write(at, array);
    new Int32Array(buffer, places, arrays.length)[i] = at;
    new Int32Array(buffer, lengths, arrays.length)[i] = array.length;
  });
  tables.forEach((table, i) => {
    const { values, rows, columns, firstMeanC, rowStepK, firstDifferenceK, columnStepK } = table;
    const numbers = [
      tableValues[i],
      rows,
      columns,
      firstMeanC,
      rowStepK,
      firstDifferenceK,
      columnStepK,
    ];
    new Float64Array(buffer, tableList + 56 * i, 7).set(numbers);
    write(tableValues[i], values);
  });
  const call = (law: number, a: number, b: number, step: number) => functions[law](a, b, step);
  const { exports } = new WebAssembly.Instance(moduleOf(bytes), { env: { memory, call } });
  exports.attach(
    places,
    lengths,
    layout.firstFixed,
    layout.firstChain,
    stage.driven.directedOffset,
    tableList,
    method.toleranceK,
    method.maxIterations,
  );
  exports.begin(
    states[0],
    states[1],
    states[2],
    problem.stepS,
    balance.totalJPerK,
    balance.totalWPerK,
    problem.stepsPerRecord,
  );
  const [held, moving, meanC, endC, meterW] = buffers.map(
    ([at, length]) => new Float64Array(buffer, at, length),
  );
  return { exports, buffer, place, x1: states[1], held, moving, meanC, endC, meterW };
}

const viewOf = (host: KernelHost, name: string, length: number) =>
  new Float64Array(host.buffer, host.place.get(name) ?? 0, length);

/** Hands the stepper's state over, as `placeState` left it. */
export function pushState(host: KernelHost, stepper: Stepper): void {
  const { modes, balance, x1, x2 } = stepper;
  new Float64Array(host.buffer, host.x1, x1.length).set(x1);
  new Float64Array(host.buffer, host.exports.stateNow(), x2.length).set(x2);
  viewOf(host, 'z', modes.z.length).set(modes.z);
  viewOf(host, 'history', modes.history.length).set(modes.history);
  viewOf(host, 'heatJ', modes.heatJ.length).set(modes.heatJ);
  viewOf(host, 'chainJ', balance.chainJ.length).set(balance.chainJ);
}

/** Takes the state back. */
export function pullState(host: KernelHost, stepper: Stepper): void {
  const { modes, x2 } = stepper;
  x2.set(new Float64Array(host.buffer, host.exports.stateNow(), x2.length));
  modes.z.set(viewOf(host, 'z', modes.z.length));
}

/**
 * Takes up to `mostSteps` steps from step `first` and adds their records to `recorder`, if any.
 * @returns steps taken; fewer than `count` where one failed at `stepper.failedSlot`
 */
export function runInKernel(
  host: KernelHost,
  stepper: Stepper,
  first: number,
  count: number,
  recorder: Recorder | null,
): number {
  const { series, held, moving } = stepper.readings;
  held.forEach((i, k) => {
    host.held.set(series[i].values.subarray(first, first + count), k * mostSteps);
  });
  const stride = 2 * mostSteps + 2;
  moving.forEach((i, k) => {
    const { values, hold } = series[i];
    const part =
      hold === 'linear'
        ? values.subarray(first, first + count + 1)
        : values.subarray(2 * first, 2 * (first + count));
    host.moving.set(part, k * stride);
  });
  const { exports } = host;
  const done = exports.run(
    first,
    count,
    host.held.byteOffset,
    mostSteps,
    host.moving.byteOffset,
    stride,
    recorder !== null,
    host.meanC.byteOffset,
    host.endC.byteOffset,
    host.meterW.byteOffset,
  );
  stepper.iterations = exports.totalIterations.value;
  stepper.unconvergedSteps = exports.unconverged.value;
  stepper.worstBalance = exports.worstBalance.value;
  stepper.failedSlot = exports.failedSlot.value;
  if (recorder) {
    const nodes = recorder.watch.recordedAt.length;
    const meters = recorder.problem.meters.length;
    const records = exports.recordCount.value;
    recorder.meanC.set(host.meanC.subarray(0, records * nodes), recorder.records * nodes);
    recorder.endC.set(host.endC.subarray(0, records * nodes), recorder.records * nodes);
    recorder.meterW.set(host.meterW.subarray(0, records * meters), recorder.records * meters);
    recorder.records += records;
  }
  return done;
}
