const GOLDEN = 0.5 * (3 - Math.sqrt(5));

/** A place and the value there. */
export interface Point {
  x: number;
  value: number;
}

/**
 * The lowest point of a function with one valley between a and b: parabolic steps with golden sections as
 * fallback. A valley that runs down to b is seen at once.
 *
 * @param f continuous on [a, b]; +Infinity from some place on where there is no answer any more
 * @param tolerance width of x at which to stop
 * @source Brent 1973, Algorithms for Minimization without Derivatives, chapter 5 (from memory)
 */
export function lowestPoint(f: (x: number) => number, a: number, b: number, tolerance: number): Point {
  const end = { x: b, value: f(b) };
  if (end.value < f(b - tolerance)) return end;
  let low = a;
  let high = b;
  let best = point(f, a + GOLDEN * (b - a));
  while (best.value === Infinity && high - low > tolerance) {
    high = best.x;
    best = point(f, low + GOLDEN * (high - low));
  }
  let second = best;
  let third = best;
  let step = 0;
  let stepBefore = 0;
  while (high - low > 2 * tolerance && Math.max(best.x - low, high - best.x) > 2 * tolerance) {
    const trial = parabolicStep(best, second, third);
    const x = best.x + trial;
    if (Math.abs(trial) < 0.5 * Math.abs(stepBefore) && x > low && x < high) {
      stepBefore = step;
      step = trial;
    } else {
      stepBefore = best.x < 0.5 * (low + high) ? high - best.x : low - best.x;
      step = GOLDEN * stepBefore;
    }
    // Steps below the tolerance would compare rounding noise; outwards steps stay inside the bracket.
    if (Math.abs(step) < tolerance) step = best.x - low > high - best.x ? -tolerance : tolerance;
    const next = point(f, best.x + step);
    if (next.value <= best.value) {
      if (next.x < best.x) high = best.x;
      else low = best.x;
      third = second;
      second = best;
      best = next;
    } else {
      if (next.x < best.x) low = next.x;
      else high = next.x;
      if (next.value <= second.value || second === best) {
        third = second;
        second = next;
      } else if (next.value <= third.value || third === best || third === second) {
        third = next;
      }
    }
  }
  return best;
}

function point(f: (x: number) => number, x: number): Point {
  return { x, value: f(x) };
}

/** Step from the first point to the vertex of the parabola through three; NaN when there is none. */
function parabolicStep(first: Point, second: Point, third: Point): number {
  const r = (first.x - second.x) * (first.value - third.value);
  const q = (first.x - third.x) * (first.value - second.value);
  const p = (first.x - third.x) * q - (first.x - second.x) * r;
  return -p / (2 * (q - r));
}
