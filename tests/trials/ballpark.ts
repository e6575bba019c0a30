import { expect } from 'vitest';

/** Within 15 % of a number of another, simpler model; the reason for what remains stands beside each use. */
export function ballpark(value: number, expected: number): void {
  expect(Math.abs(value / expected - 1), `${value} against ${expected}`).toBeLessThan(0.15);
}
