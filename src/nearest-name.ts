/**
 * Gives the known name that is fewest edits away from a misspelt one, or `null` when none is near.
 *
 * An edit adds, drops, changes or swaps one character; case does not count. A name counts as near within a third of
 * its length (at least two edits).
 *
 * @param given what the caller wrote
 * @param known the names that would have been right; of equally near ones the first is given
 */
export function nearestName(given: string, known: Iterable<string>): string | null {
  const wanted = given.toLowerCase();
  let best: string | null = null;
  let least = Infinity;
  for (const name of known) {
    const allowed = Math.max(2, Math.floor(name.length / 3));
    if (Math.abs(wanted.length - name.length) > allowed) continue; // as many edits at least: a long text costs nothing
    const edits = editDistance(wanted, name.toLowerCase());
    if (edits < least && edits <= allowed) {
      best = name;
      least = edits;
    }
  }
  return best;
}

/** Edits between two words, neighbouring swaps included (the restricted Damerau-Levenshtein distance). */
function editDistance(a: string, b: string): number {
  let beforeLast: number[] = [];
  let last = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const row = [i];
    for (let j = 1; j <= b.length; j++) {
      const change = (last[j - 1] ?? 0) + (a[i - 1] === b[j - 1] ? 0 : 1);
      let edits = Math.min(change, (last[j] ?? 0) + 1, (row[j - 1] ?? 0) + 1);
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1]) {
        edits = Math.min(edits, (beforeLast[j - 2] ?? 0) + 1);
      }
      row.push(edits);
    }
    beforeLast = last;
    last = row;
  }
  return last[b.length] ?? 0;
}
