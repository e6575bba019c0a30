import { nearestName as nearestOf } from '../quantity';

interface Named {
  id: string;
  name: string;
  aliases: readonly string[];
}

/** One spelling of a name: letter case, spaces, hyphens, colons and the like do not count. */
function key(text: string): string {
  return text
    .normalize('NFKC')
    .toLowerCase()
    .replace(/[^\p{L}\p{N}%]/gu, '');
}

/** The record with this name, id or alias; undefined when there is none. */
export function findNamed<T extends Named>(list: readonly T[], text: string): T | undefined {
  const wanted = key(text);
  if (wanted === '') return undefined;
  return (
    list.find((record) => key(record.name) === wanted) ??
    list.find((record) => key(record.id) === wanted || record.aliases.some((alias) => key(alias) === wanted))
  );
}

/**
 * The name in the list that was most likely meant, for "did you mean".
 * An alias that is nearer than any name gives the name it stands for.
 */
export function nearestName(list: readonly Named[], text: string): string | undefined {
  const spellings = list.flatMap((record) => [record.name, ...record.aliases]);
  const near = nearestOf(spellings, text);
  return near === undefined ? undefined : findNamed(list, near)?.name;
}
