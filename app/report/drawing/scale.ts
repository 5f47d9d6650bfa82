// Scales: a value to a place on the sheet, and the round values that are written beside it.

export type Scale = (value: number) => number;

export const linear =
  (low: number, high: number, from: number, to: number): Scale =>
  (value) =>
    from + ((value - low) / (high - low)) * (to - from);

/** Round values that cover `low` to `high`, about `wanted` steps of them. */
export function roundTicks(low: number, high: number, wanted = 4): number[] {
  const span = high - low;
  if (!(span > 0)) return [low, low + 1];
  const raw = span / wanted;
  const power = 10 ** Math.floor(Math.log10(raw));
  const step = [1, 2, 5, 10].map((m) => m * power).find((s) => s >= raw * 0.999) ?? 10 * power;
  const first = Math.floor(low / step + 1e-9);
  const last = Math.ceil(high / step - 1e-9);
  return Array.from({ length: last - first + 1 }, (_, i) =>
    Number(((first + i) * step).toPrecision(12)),
  );
}

/** Decimals that tell neighbouring ticks apart. */
export function tickDecimals(ticks: readonly number[]): number {
  const step = (ticks[1] ?? 1) - (ticks[0] ?? 0);
  return step >= 1 ? 0 : Math.ceil(-Math.log10(step) - 1e-9);
}
