import type { Fault } from '../../src/errors';

/** What is wrong with the sentence of a fault; empty for one that a person can act on. */
export function sentenceFaults({ path, message }: Fault): string[] {
  const wrong: string[] = [];
  if (message.length < 10 || message.length > 300) wrong.push(`${message.length} characters long`);
  if (/\p{Cc}/u.test(message)) wrong.push('more than one line');
  if (/undefined|\[object|\bNaN it|\n\s+at /.test(message)) wrong.push('speaks of the program');
  const start = path.length > 60 ? path.slice(0, 20) : path;
  if (path !== '' && !message.startsWith(start)) wrong.push(`does not begin with ${path}`);
  return wrong.map((what) => `${what}: ${message}`);
}
