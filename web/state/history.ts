/** One state a person can return to, with the name of the step that led to it. */
interface Step<T> {
  state: T;
  name: string;
  /** Steps with the same key in quick succession count as one: a drag, a word being typed. */
  key: string;
  at: number;
}

export interface History<T> {
  past: Step<T>[];
  present: Step<T>;
  future: Step<T>[];
}

const longest = 400;
const together = 1200;

export const beginHistory = <T>(state: T): History<T> => ({
  past: [],
  present: { state, name: 'Opened', key: '', at: 0 },
  future: [],
});

/** The history after a step; steps of one gesture are joined. @param now milliseconds */
export function record<T>(history: History<T>, state: T, name: string, key: string, now: number): History<T> {
  const { past, present } = history;
  const joined = key !== '' && present.key === key && now - present.at < together;
  return {
    past: joined ? past : [...past, present].slice(-longest),
    present: { state, name, key, at: now },
    future: [],
  };
}

export function undone<T>({ past, present, future }: History<T>): History<T> {
  const before = past.at(-1);
  if (!before) return { past, present, future };
  return { past: past.slice(0, -1), present: { ...before, key: '' }, future: [present, ...future] };
}

export function redone<T>({ past, present, future }: History<T>): History<T> {
  const [next, ...rest] = future;
  if (!next) return { past, present, future };
  return { past: [...past, present], present: { ...next, key: '' }, future: rest };
}
