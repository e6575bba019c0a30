import type { Fault } from '../errors';
import { nearestName } from '../quantity';
import { given, listed } from './field-note';
import { isGroup, isList, itemAt, settled, under, unwrapped, type AnySchema } from './schema-walk';

/** Keys that name parts of every object of the language; no field of a design has such a name. */
const forbidden = ['__proto__', 'constructor', 'prototype'];

const join = (path: string, key: string | number) => (path === '' ? String(key) : `${path}.${key}`);

const shownKey = (key: string) =>
  (key.length > 40 ? `${key.slice(0, 37)}...` : key).replace(/\p{Cc}+/gu, ' ');

/** A key that is not known, with the one that was most likely meant: rather one that is not there yet. */
function unknownKey(path: string, key: string, free: readonly string[], all: readonly string[]): Fault {
  const near = nearestName(free, key) ?? nearestName(all, key);
  const hint = near ? `did you mean "${near}"?` : `known here: ${listed(all)}`;
  const message = `${join(path, shownKey(key))}: this key is not known; ${hint}`;
  return { path: join(path, key), kind: 'unknown key', message };
}

function wrongShape(path: string, value: unknown, wanted: string): Fault {
  return { path, kind: 'wrong type', message: `${path}: got ${given(value)}; ${wanted} is needed` };
}

/** Keys of a group that it may not have. */
function keyFaults(
  entries: Record<string, AnySchema>,
  value: Record<string, unknown>,
  path: string,
): Fault[] {
  const all = Object.keys(entries);
  const free = all.filter((key) => !Object.hasOwn(value, key));
  const strange = Object.keys(value).filter((key) => !Object.hasOwn(entries, key));
  return strange.map((key) => unknownKey(path, key, free, all));
}

function groupFaults(entries: Record<string, AnySchema>, value: unknown, path: string): Fault[] {
  if (!isGroup(value))
    return [wrongShape(path, value, `a group in { } with ${listed(Object.keys(entries))}`)];
  const inner = Object.entries(entries).flatMap(([key, entry]) =>
    shapeFaults(entry, under(value, key), join(path, key)),
  );
  return [...keyFaults(entries, value, path), ...inner];
}

function recordFaults(value: unknown, path: string): Fault[] {
  if (!isGroup(value)) return [wrongShape(path, value, 'a group in { } of field names and values')];
  return forbidden
    .filter((key) => Object.hasOwn(value, key))
    .map((key) => ({
      path: join(path, key),
      kind: 'unknown key',
      message: `${join(path, key)}: this is no field of a design`,
    }));
}

/**
 * Faults of the build of a design: groups, lists and keys, as the schema has them. What single fields hold is not
 * looked at, nor what is missing. The input must have passed `sizeFault`.
 */
export function shapeFaults(schema: AnySchema, value: unknown, path = ''): Fault[] {
  if (value === undefined) return [];
  const inner = settled(schema, value);
  if (!inner)
    return unwrapped(schema).type === 'variant' && !isGroup(value)
      ? [wrongShape(path, value, 'a group in { } with its kind')]
      : [];
  if (inner.entries) return groupFaults(inner.entries, value, path);
  if (inner.type === 'record') return recordFaults(value, path);
  if (!isList(inner) || !Array.isArray(value)) return [];
  return value.flatMap((item, place) => {
    const below = itemAt(inner, place);
    return below ? shapeFaults(below, item ?? null, join(path, place)) : [];
  });
}
