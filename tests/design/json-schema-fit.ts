/** The part of JSON Schema (draft 2020-12) that the design file's schema uses. */
export interface JsonSchema {
  $schema?: string;
  type?: string;
  const?: unknown;
  enum?: unknown[];
  title?: string;
  description?: string;
  examples?: unknown[];
  properties?: Record<string, JsonSchema>;
  required?: string[];
  additionalProperties?: boolean | JsonSchema;
  items?: JsonSchema | false;
  prefixItems?: JsonSchema[];
  minItems?: number;
  maxItems?: number;
  minimum?: number;
  exclusiveMinimum?: number;
  maximum?: number;
  exclusiveMaximum?: number;
  maxLength?: number;
  pattern?: string;
  anyOf?: JsonSchema[];
  oneOf?: JsonSchema[];
}

const isType: Record<string, (value: unknown) => boolean> = {
  string: (value) => typeof value === 'string',
  number: (value) => typeof value === 'number',
  integer: Number.isInteger,
  boolean: (value) => typeof value === 'boolean',
  array: Array.isArray,
  object: (value) => typeof value === 'object' && value !== null && !Array.isArray(value),
};

function wordFaults(at: JsonSchema, value: unknown): string[] {
  const faults: string[] = [];
  if (at.type !== undefined && !isType[at.type]!(value)) faults.push(`is no ${at.type}`);
  if (at.const !== undefined && value !== at.const) faults.push(`is not ${String(at.const)}`);
  if (at.enum && !at.enum.includes(value)) faults.push(`is none of ${at.enum.join()}`);
  if (typeof value === 'string') {
    if (value.length > (at.maxLength ?? Infinity)) faults.push('is too long');
    if (at.pattern && !new RegExp(at.pattern, 'u').test(value)) faults.push('does not match');
  }
  if (typeof value !== 'number') return faults;
  const {
    minimum = -Infinity,
    exclusiveMinimum = -Infinity,
    maximum = Infinity,
    exclusiveMaximum = Infinity,
  } = at;
  const inside = value >= minimum && value <= maximum && value > exclusiveMinimum && value < exclusiveMaximum;
  return inside ? faults : [...faults, 'is out of range'];
}

function groupFaults(at: JsonSchema, value: Record<string, unknown>): string[] {
  const { properties = {}, required = [], additionalProperties = true } = at;
  const given = Object.entries(value).filter(([, item]) => item !== undefined);
  const missing = required
    .filter((key) => !given.some(([other]) => other === key))
    .map((key) => `lacks ${key}`);
  const inner = given.flatMap(([key, item]) => {
    const below = Object.hasOwn(properties, key) ? properties[key]! : additionalProperties;
    if (below === false) return [`has ${key}`];
    return below === true ? [] : fitFaults(below, item).map((fault) => `${key}.${fault}`);
  });
  return [...missing, ...inner];
}

function listFaults(at: JsonSchema, value: unknown[]): string[] {
  const faults: string[] = [];
  if (value.length < (at.minItems ?? 0) || value.length > (at.maxItems ?? Infinity))
    faults.push('has the wrong length');
  const inner = value.flatMap((item, place) => {
    const below = place < (at.prefixItems?.length ?? 0) ? at.prefixItems![place]! : at.items;
    if (below === false) return [`has ${place}`];
    return below ? fitFaults(below, item).map((fault) => `${place}.${fault}`) : [];
  });
  return [...faults, ...inner];
}

/** Where a value does not fit a schema; empty when it does. */
export function fitFaults(at: JsonSchema, value: unknown): string[] {
  const shapes = at.anyOf ?? at.oneOf;
  const none =
    shapes && !shapes.some((shape) => fitFaults(shape, value).length === 0) ? ['has none of the shapes'] : [];
  const words = wordFaults(at, value);
  if (words.length > 0) return words;
  if (Array.isArray(value)) return [...none, ...listFaults(at, value)];
  if (isType.object!(value)) return [...none, ...groupFaults(at, value as Record<string, unknown>)];
  return none;
}
