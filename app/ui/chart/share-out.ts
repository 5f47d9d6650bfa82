// Largest remainder: rounds the parts of a whole so that the rounded parts add up to the rounded
// whole. Each part gets its floor; the units left over go to the largest remainders.

export function shareOut(parts: readonly number[], whole?: number): number[] {
  const total = Math.round(whole ?? parts.reduce((sum, part) => sum + part, 0));
  const floors = parts.map(Math.floor);
  const left = total - floors.reduce((sum, part) => sum + part, 0);
  const order = parts
    .map((part, i) => ({ i, rest: part - Math.floor(part) }))
    .sort((a, b) => b.rest - a.rest || a.i - b.i);
  const rounded = [...floors];
  for (let k = 0; k < left; k++) {
    const next = order[k % order.length];
    if (next) rounded[next.i] = (rounded[next.i] ?? 0) + 1;
  }
  return rounded;
}
