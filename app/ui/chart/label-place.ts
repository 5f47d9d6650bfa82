// Where a label that belongs to a band lies clearest of the lines that cross it.

/**
 * Index at which the label's right end stands: the end of the run of the band (NaN outside it) where
 * the nearest line keeps the largest distance from the label over the label's width. -1 without a
 * band. `spanH` is the label's width in hours.
 */
export function clearestEnd(
  band: Float64Array,
  lines: readonly Float64Array[],
  spanH: number,
): number {
  let best = -1;
  let bestDistance = -Infinity;
  for (let end = Math.min(Math.ceil(spanH), band.length) - 1; end < band.length; end++) {
    const isEnd =
      !Number.isNaN(band[end]) && (end + 1 >= band.length || Number.isNaN(band[end + 1]));
    const isEvery12 = !Number.isNaN(band[end]) && end % 12 === 0;
    if (end < 0 || !(isEnd || isEvery12)) continue;
    let distance = Infinity;
    for (let h = Math.max(0, end - Math.ceil(spanH) + 1); h <= end; h++) {
      for (const line of lines) distance = Math.min(distance, Math.abs(line[h] - band[end]));
    }
    if (distance > bestDistance) {
      best = end;
      bestDistance = distance;
    }
  }
  return best;
}
