import { under } from './schema-walk';

/** A text that means to be a quantity; any other is a word, right or wrong, and judged as one. */
const quantityLike = /^\s*[+-]?\.?\d/;
const anyText = /^/;

/** Parts that may be written as one text, what such a text looks like, and the key it stands for. */
const shorthands = [
  { group: 'rod', part: 'heatFraction', looks: quantityLike, key: 'lasing' },
  { group: 'rod', part: 'absorption', looks: quantityLike, key: 'coefficient' },
  { group: 'mount', part: 'interface', looks: anyText, key: 'kind' },
];

/**
 * Writes a part given as one text in full: "heatFraction": "27 %" is { "lasing": "27 %" }, "absorption": "4.5 cm^-1" is
 * { "coefficient": "4.5 cm^-1" }, "interface": "indium foil" is { "kind": "indium foil" }. What is no shorthand stays.
 * @param input a design as read; it is not changed
 */
export function expandShorthand(input: object): object {
  let expanded = input as Record<string, unknown>;
  for (const { group, part, looks, key } of shorthands) {
    const holder = under(expanded, group);
    const text = under(holder, part);
    if (typeof text !== 'string' || !looks.test(text)) continue;
    expanded = { ...expanded, [group]: { ...(holder as object), [part]: { [key]: text } } };
  }
  return expanded;
}
