import type { Fault } from '../errors';

/** Longest design text that is read; far beyond any real design. */
export const longestDesign = 250_000;

/** What no design comes near; beyond it a file is refused before anything is made of it. */
const deepest = 12;
const mostValues = 20_000;
const mostInOne = 2_000;
const longestText = 20_000;
const longestKey = 100;

interface Place {
  value: unknown;
  path: string;
  depth: number;
}

const refused = (path: string, sentence: string): Fault => {
  const message = path === '' ? `The design ${sentence}.` : `${path}: ${sentence}`;
  return { path, kind: 'not a design', message };
};

function faultAt({ value, path, depth }: Place, keys: readonly string[]): Fault | null {
  if (typeof value === 'string' && value.length > longestText)
    return refused(path, `has ${value.length} characters; at most ${longestText} are read`);
  if (depth > deepest)
    return refused(path, `lies more than ${deepest} levels deep; no part of a design does`);
  const long = keys.find((key) => key.length > longestKey);
  if (long !== undefined)
    return refused(path, `has a key of ${long.length} characters; no key has more than ${longestKey}`);
  return null;
}

const sizeOf = (value: object): number => (Array.isArray(value) ? value.length : Object.keys(value).length);

/**
 * Refuses what is too large, too deep or goes round in circles to be a design, so that whatever looks at it afterwards
 * may recurse and list. Never recurses itself.
 * @returns null where the size is that of a design
 */
export function sizeFault(input: unknown): Fault | null {
  const waiting: Place[] = [{ value: input, path: '', depth: 0 }];
  let count = 0;
  for (let place = waiting.pop(); place; place = waiting.pop()) {
    const { value, path, depth } = place;
    count += 1;
    if (count > mostValues) return refused('', `holds more than ${mostValues} values`);
    const inner = typeof value === 'object' && value !== null ? value : {};
    const size = sizeOf(inner);
    if (size > mostInOne)
      return refused(path, `holds ${size} values; no part of a design has more than ${mostInOne}`);
    const keys = Object.keys(inner);
    const fault = faultAt(place, keys);
    if (fault) return fault;
    for (const key of keys) {
      const below = (inner as Record<string, unknown>)[key];
      waiting.push({ value: below, path: path === '' ? key : `${path}.${key}`, depth: depth + 1 });
    }
  }
  return null;
}
