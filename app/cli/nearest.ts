/** Edits (insert, drop, change, swap of neighbours) from one word to another. */
function distance(a: string, b: string): number {
  const rows = Array.from({ length: a.length + 1 }, (_, i) =>
    Array.from({ length: b.length + 1 }, (_, j) => (i === 0 ? j : j === 0 ? i : 0)),
  );
  for (let i = 1; i <= a.length; i++) {
    for (let j = 1; j <= b.length; j++) {
      const change = a[i - 1] === b[j - 1] ? 0 : 1;
      let least = Math.min(rows[i - 1][j] + 1, rows[i][j - 1] + 1, rows[i - 1][j - 1] + change);
      const swapped = i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1];
      if (swapped) least = Math.min(least, rows[i - 2][j - 2] + 1);
      rows[i][j] = least;
    }
  }
  return rows[a.length][b.length];
}

/** The known word that was probably meant, or null. */
export function nearest(word: string, known: readonly string[]): string | null {
  const ranked = known
    .map((name) => ({ name, edits: distance(word.toLowerCase(), name) }))
    .sort((a, b) => a.edits - b.edits);
  const best = ranked[0];
  return best && best.edits <= Math.max(1, Math.floor(best.name.length / 3)) ? best.name : null;
}
