import type { ResolvedCooler } from '../design/resolved';
import { marginsOf } from '../limits/margins';
import type { Margin } from '../limits/types';
import type { PreparedDesign } from '../operating/prepare';
import { solvePoint, type SolvedPoint } from '../operating/point';
import { ceilingOf, type CeilingResult } from './ceiling';

/** Lasing and blocked point at one pump power, with the margins of every limit. */
export interface Level {
  lasing: SolvedPoint;
  blocked: SolvedPoint;
  margins: Margin[];
}

/**
 * One way of cooling, asked at many pump powers: every answer is kept, and each search starts at the base temperature
 * of the nearest power already known.
 */
export class OptionBench {
  private readonly levels = new Map<number, Level>();
  private readonly lasingPoints = new Map<number, SolvedPoint>();

  constructor(
    readonly prepared: PreparedDesign,
    readonly cooler: ResolvedCooler,
  ) {}

  private startFor(pumpPower: number): number | undefined {
    let best: SolvedPoint | undefined;
    for (const [power, point] of this.lasingPoints)
      if (!best || Math.abs(power - pumpPower) < Math.abs(best.point.pumpPower - pumpPower)) best = point;
    return best?.point.state === 'steady' ? best.point.rod.baseTemperature : undefined;
  }

  lasing(pumpPower: number): SolvedPoint {
    const known = this.lasingPoints.get(pumpPower);
    if (known) return known;
    const solved = solvePoint(
      this.prepared,
      { pumpPower, cooler: this.cooler, beam: 'lasing' },
      this.startFor(pumpPower),
    );
    this.lasingPoints.set(pumpPower, solved);
    return solved;
  }

  at(pumpPower: number): Level {
    const known = this.levels.get(pumpPower);
    if (known) return known;
    const lasing = this.lasing(pumpPower);
    const blocked = solvePoint(
      this.prepared,
      { pumpPower, cooler: this.cooler, beam: 'blocked' },
      lasing.point.state === 'steady' ? lasing.point.rod.baseTemperature : undefined,
    );
    const level = { lasing, blocked, margins: marginsOf(lasing, blocked, this.prepared.resolved.limits) };
    this.levels.set(pumpPower, level);
    return level;
  }

  /**
   * @param edges powers near which the cavity gains or loses stability, W
   * @param levels of the first look, in sixtieths of the searched range
   */
  ceiling(edges: readonly number[] = [], levels?: readonly number[]): CeilingResult {
    return ceilingOf((power) => this.at(power).margins, this.prepared.resolved.pump.searchTo, edges, levels);
  }
}
