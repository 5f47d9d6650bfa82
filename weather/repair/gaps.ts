// Values that were not measured: short gaps are bridged and counted, long ones are the user's to mend.

/** The longest gap that is bridged: three values in a row. */
export const longestBridgedGap = 3;

export interface Gap {
  /** First hour without a value; the gap may run over the end of the year. */
  readonly from: number;
  readonly count: number;
}

/** Runs of NaN, around the end of the year. A column without any value is one gap of full length. */
export function gapsIn(values: Float64Array): readonly Gap[] {
  const n = values.length;
  const start = values.findIndex((value) => !Number.isNaN(value));
  if (start < 0) return [{ from: 0, count: n }];
  const gaps: Gap[] = [];
  for (let k = 1; k <= n; k++) {
    const h = (start + k) % n;
    if (!Number.isNaN(values[h])) continue;
    let count = 1;
    while (Number.isNaN(values[(h + count) % n])) count++;
    gaps.push({ from: h, count });
    k += count;
  }
  return gaps;
}

/** Straight line between the values on both sides of the gap, in place. */
export function bridgeLinear(values: Float64Array, gap: Gap): void {
  const n = values.length;
  const before = values[(gap.from - 1 + n) % n];
  const after = values[(gap.from + gap.count) % n];
  for (let k = 0; k < gap.count; k++)
    values[(gap.from + k) % n] = before + ((after - before) * (k + 1)) / (gap.count + 1);
}

/** The value before the gap again: for directions and ceilings, which have no middle. */
export function bridgeHold(values: Float64Array, gap: Gap): void {
  const n = values.length;
  const before = values[(gap.from - 1 + n) % n];
  for (let k = 0; k < gap.count; k++) values[(gap.from + k) % n] = before;
}

/**
 * Straight line of the ratio to a course of the clear day, so that a bridged sunrise stays a sunrise.
 * @param course what the value would be in proportion to, 0 at night; same length
 */
export function bridgeAlong(values: Float64Array, course: Float64Array, gap: Gap): void {
  const n = values.length;
  const before = (gap.from - 1 + n) % n;
  const after = (gap.from + gap.count) % n;
  const ratio = (h: number) => (course[h] > 0 ? values[h] / course[h] : Number.NaN);
  const one = ratio(before);
  const two = ratio(after);
  // At the edge of the night only one side has a ratio; between two nights the value is 0.
  const first = Number.isNaN(one) ? (Number.isNaN(two) ? 0 : two) : one;
  const second = Number.isNaN(two) ? first : two;
  for (let k = 0; k < gap.count; k++) {
    const h = (gap.from + k) % n;
    values[h] = course[h] * (first + ((second - first) * (k + 1)) / (gap.count + 1));
  }
}
