// Round steps for a scale: three to five lines, as the eye can read them back.

/** Round values from `low` to `high`, both covered, about `wanted` of them. */
export function roundTicks(low: number, high: number, wanted = 4): number[] {
  const span = high - low;
  if (!(span > 0)) return [low];
  const raw = span / wanted;
  const power = 10 ** Math.floor(Math.log10(raw));
  const step = [1, 2, 2.5, 5, 10].map((m) => m * power).find((s) => s >= raw * 0.999) ?? raw;
  const first = Math.floor(low / step + 1e-9);
  const last = Math.ceil(high / step - 1e-9);
  return Array.from({ length: last - first + 1 }, (_, i) =>
    Number(((first + i) * step).toFixed(9)),
  );
}

/** Decimals that tell neighbouring ticks apart. */
export function tickDecimals(ticks: readonly number[]): number {
  const step = Math.abs((ticks[1] ?? 1) - (ticks[0] ?? 0));
  return step >= 1 || step === 0 ? (Number.isInteger(step) ? 0 : 1) : Math.ceil(-Math.log10(step));
}
