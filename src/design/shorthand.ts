import { under } from './schema-walk';

/** Parts that may be written as one text, the words that already have a meaning there, and the key the text stands for. */
const shorthands = [
  { group: 'rod', part: 'heatFraction', words: ['from laser', 'quantum defect'], key: 'lasing' },
  { group: 'rod', part: 'absorption', words: ['from crystal'], key: 'coefficient' },
  { group: 'mount', part: 'interface', words: [], key: 'kind' },
] as const;

/**
 * Writes a part given as one text in full: "heatFraction": "27 %" is { "lasing": "27 %" }, "absorption": "4.5 cm^-1" is
 * { "coefficient": "4.5 cm^-1" }, "interface": "indium foil" is { "kind": "indium foil" }. What is no shorthand stays.
 * @param input a design as read; it is not changed
 */
export function expandShorthand(input: object): object {
  let expanded = input as Record<string, unknown>;
  for (const { group, part, words, key } of shorthands) {
    const holder = under(expanded, group);
    const text = under(holder, part);
    if (typeof text !== 'string' || (words as readonly string[]).includes(text)) continue;
    expanded = { ...expanded, [group]: { ...(holder as object), [part]: { [key]: text } } };
  }
  return expanded;
}
