import { isBuiltin } from 'node:module';
import { targetOf } from './imports';

/** The rooms of `src/` in the order in which they may build on each other: a room sees those before it. */
export const rooms = [
  'errors',
  'numerics',
  'quantity',
  'materials',
  'pump',
  'cooling',
  'cavity',
  'heat',
  'elastic',
  'lens',
  'laser',
  'design',
  'operating',
  'limits',
  'study',
  'report',
];

interface Rule {
  /** Rooms and folders a file of this place may import from. */
  places: string[];
  packages: string[];
  /** Whether Node's own modules may be imported. */
  node: boolean;
}

const purePackages = ['ndarray', 'valibot', '@valibot/to-json-schema'];
const rules = new Map<string, Rule>([
  ...rooms.map((room, i): [string, Rule] => [
    room,
    { places: rooms.slice(0, i + 1), packages: purePackages, node: false },
  ]),
  ['workers', { places: [...rooms, 'workers'], packages: ['comlink', 'ndarray'], node: false }],
  ['workers/terminal', { places: [...rooms, 'workers', 'workers/terminal'], packages: [], node: true }],
  ['web', { places: [...rooms, 'workers', 'web'], packages: ['svelte', 'uplot'], node: false }],
]);

/**
 * The room or folder a path belongs to.
 * @param path from the project's top
 * @returns undefined when it lies in none that the house knows
 */
export function placeOf(path: string): string | undefined {
  const [top, second, third] = path.split('/');
  if (top === 'src') {
    const room = third === undefined ? second?.replace(/\.ts$/, '') : second;
    return rooms.includes(room ?? '') ? room : undefined;
  }
  if (top === 'workers' && second === 'terminal') return 'workers/terminal';
  return top !== undefined && rules.has(top) ? top : undefined;
}

/**
 * Judges one import by the order of the house.
 * @param path file that imports, from the project's top
 * @param specifier what it imports
 * @returns one sentence that names the file, the import and what is allowed; undefined when it is allowed
 */
export function faultOf(path: string, specifier: string): string | undefined {
  const place = placeOf(path);
  const rule = rules.get(place ?? '');
  if (!place || !rule) return `${path} lies in no room of the house; the rooms of src are ${list(rooms)}.`;
  const target = targetOf(path, specifier);
  if (target !== undefined) {
    if (rule.places.includes(placeOf(target) ?? '')) return undefined;
    return `${path} imports ${specifier}, but ${place} may import only from ${list(rule.places)}.`;
  }
  if (isBuiltin(specifier)) {
    return rule.node ? undefined : `${path} imports Node's ${specifier}, which only workers/terminal may.`;
  }
  if (rule.packages.some((name) => specifier === name || specifier.startsWith(`${name}/`))) return undefined;
  const allowed = rule.packages.length > 0 ? `only the packages ${list(rule.packages)}` : 'no package';
  return `${path} imports the package ${specifier}, but ${place} may import ${allowed}.`;
}

function list(names: string[]): string {
  return names.length < 2
    ? names.join('')
    : `${names.slice(0, -1).join(', ')} and ${names[names.length - 1]}`;
}
