/**
 * How many single-letter insertions, deletions, replacements or swaps of neighbours turn one word into the other.
 * @source Damerau, Commun. ACM 7, 171 (1964); the restricted form (no edit inside a swapped pair)
 */
export function editDistance(one: string, other: string): number {
  let before: number[] = [];
  let last = Array.from({ length: other.length + 1 }, (_, j) => j);
  for (let i = 1; i <= one.length; i++) {
    const row = [i];
    for (let j = 1; j <= other.length; j++) {
      const same = one[i - 1] === other[j - 1] ? 0 : 1;
      let cost = Math.min(last[j]! + 1, row[j - 1]! + 1, last[j - 1]! + same);
      const swapped = i > 1 && j > 1 && one[i - 1] === other[j - 2] && one[i - 2] === other[j - 1];
      if (swapped) cost = Math.min(cost, before[j - 2]! + 1);
      row.push(cost);
    }
    before = last;
    last = row;
  }
  return last[other.length]!;
}

/**
 * The known name a person most likely meant, for "did you mean".
 * Letter case counts for little: it only decides between names that are otherwise equally near.
 *
 * @param names the known names
 * @param text what was written
 * @returns the nearest name, or undefined when none is near enough to be worth suggesting (more than about half of
 *   the letters would have to change)
 */
export function nearestName(names: readonly string[], text: string): string | undefined {
  const wanted = text.trim().slice(0, 80);
  let best: string | undefined;
  let least = Infinity;
  for (const name of names) {
    const folded = editDistance(name.toLowerCase(), wanted.toLowerCase());
    const distance = folded + 0.01 * editDistance(name, wanted);
    const allowed = Math.max(1, Math.floor(Math.max(name.length, wanted.length) / 2));
    if (folded <= allowed && distance < least) {
      best = name;
      least = distance;
    }
  }
  return best;
}
