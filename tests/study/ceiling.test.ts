import { describe, expect, it } from 'vitest';
import type { LimitName, Margin } from '../../src/limits/types';
import { ceilingOf, type MarginsAt } from '../../src/study/ceiling';
import { followCeiling } from '../../src/study/follow-ceiling';

/** Margins from plain functions of the power; a share below zero is broken. */
const marginsFrom =
  (shares: Partial<Record<LimitName, (power: number) => number>>): MarginsAt =>
  (power) =>
    Object.entries(shares).map(([limit, shareAt]): Margin => {
      const share = shareAt(power);
      return {
        limit: limit as LimitName,
        beam: 'lasing',
        value: 0,
        bound: 0,
        unit: '1',
        margin: share,
        share,
        holds: share >= 0,
      };
    });

// Crossings are found to 2e-5 of the searched range.
const precise = (value: number | null, expected: number, to: number) =>
  expect(Math.abs(value! - expected)).toBeLessThan(4e-5 * to);

describe('The ceiling', () => {
  it('is where the first of several limits is broken', () => {
    const at = marginsFrom({
      'rod peak temperature': (p) => 1 - p / 37.2,
      'fracture stress': (p) => 1 - (p / 21.7) ** 2,
      'aberration loss': (p) => 1 - (p / 30) ** 4,
    });
    const result = ceilingOf(at, 60);
    precise(result.pumpPower, 21.7, 60);
    expect(result.setBy).toBe('fracture stress');
    expect(result.reachesRange).toBe(false);
    expect(result.limits.map((item) => item.limit)).toEqual([
      'fracture stress',
      'aberration loss',
      'rod peak temperature',
    ]);
    precise(result.limits[2]!.pumpPower, 37.2, 60);
  });

  it('is at least the range where no limit is broken in it', () => {
    const result = ceilingOf(marginsFrom({ 'rod peak temperature': (p) => 1 - p / 100 }), 60);
    expect(result).toMatchObject({ pumpPower: 60, setBy: null, reachesRange: true });
    expect(result.windows).toEqual([{ from: 0, to: 60 }]);
  });

  it('does not exist where a limit is broken from the first watt to the last', () => {
    const result = ceilingOf(
      marginsFrom({ 'dew point': () => -0.3, 'fracture stress': (p) => 1 - p / 50 }),
      60,
    );
    expect(result).toMatchObject({ pumpPower: null, setBy: 'dew point', reachesRange: false, windows: [] });
    expect(result.limits[0]).toEqual({ limit: 'dew point', pumpPower: 0 });
  });

  it('is the end of the first window, and every later window is kept', () => {
    // Holds from 3 to 11 W and from 25 to 40 W.
    const at = marginsFrom({ 'cavity stability': (p) => ((p - 3) * (11 - p) * (25 - p) * (40 - p)) / 1e4 });
    const { windows, pumpPower } = ceilingOf(at, 60);
    precise(pumpPower, 11, 60);
    const edges = windows.flatMap(({ from, to }) => [from, to]);
    expect(edges).toHaveLength(4);
    [3, 11, 25, 40].forEach((edge, k) => precise(edges[k]!, edge, 60));
  });

  it('sees a limit that is broken only briefly, between two of the powers first looked at', () => {
    // The heat peaks while the diode drifts through the line: broken from 21.5 to 23.5 W.
    const dip = (p: number) => ((p - 22.5) / 8) ** 2 - (1 / 8) ** 2;
    const result = ceilingOf(
      marginsFrom({ 'rod peak temperature': dip, 'fracture stress': (p) => 1 - p / 50 }),
      60,
    );
    precise(result.pumpPower, 21.5, 60);
    precise(result.windows[1]!.from, 23.5, 60);
  });

  it('sees a window in which alone every limit holds, between two of the powers first looked at', () => {
    // A case window of 2.4 W of pump power.
    const tent = (p: number) => 1 - Math.abs(p - 27.4) / 1.2;
    const result = ceilingOf(marginsFrom({ 'diode case window': tent }), 60);
    precise(result.pumpPower, 28.6, 60);
    precise(result.windows[0]!.from, 26.2, 60);
  });

  it('sees a window far below the first power looked at when the range was chosen much too wide', () => {
    const tent = (p: number) => 1 - Math.abs(p - 11) / 5;
    const result = ceilingOf(marginsFrom({ 'diode case window': tent }), 10_000);
    precise(result.pumpPower, 16, 10_000);
  });

  it('counts the loss of the steady state as broken, though the other limits have no value there', () => {
    const heat = marginsFrom({ 'rod peak temperature': (p) => 1 - p / 50 });
    const none = marginsFrom({ 'steady state': () => -1 });
    const fine = marginsFrom({ 'steady state': () => 1 });
    const result = ceilingOf((p) => (p > 33.3 ? none(p) : [...fine(p), ...heat(p)]), 60);
    precise(result.pumpPower, 33.3, 60);
    expect(result.setBy).toBe('steady state');
  });
});

describe('A ceiling followed from that of a like design', () => {
  const at = (edge: number) => marginsFrom({ 'rod peak temperature': (p) => 1 - p / edge });
  it.each([1, 5, 9.5, 10, 10.7, 17, 55])('finds %s W from 10 W', (edge) => {
    // Followed to 1e-3 of the known ceiling.
    expect(Math.abs(followCeiling(at(edge), 10, 60)! - edge)).toBeLessThan(0.011);
  });
  it('stops at the end of the range, and at a hundredth of the known ceiling', () => {
    expect(followCeiling(at(200), 10, 60)).toBe(60);
    expect(followCeiling(at(0.01), 10, 60)).toBeNull();
  });
});
