import { describe, expect, it } from 'vitest';
import {
  assembleElastic,
  bulgePower,
  curvatureWeights,
  faceShapes,
  sampleTemperature,
  solveDisplacement,
  solveElastic,
} from '../../src/elastic';
import { freeRod, oxide, pumped, studyMesh } from './rods';

const assembled = assembleElastic(freeRod, studyMesh);

describe('lens of the bulging faces', () => {
  it('a rod hot at its front face bulges out there and converges', () => {
    const { displacement } = solveElastic(assembled, pumped);
    const { front, back } = faceShapes(displacement);
    expect(front.relativeDisplacement[0]).toBe(0);
    expect(front.relativeDisplacement.at(-1)).toBeGreaterThan(0);
    expect(back.relativeDisplacement.at(-1)).toBeLessThan(0);
    const power = bulgePower(displacement, 1.82, 3.5e-4);
    expect(power.front).toBeGreaterThan(0);
    expect(power.back).toBeGreaterThan(0);
    expect(power.front).toBeGreaterThan(power.back);
  });

  it('a rod that is evenly hotter towards its back becomes a meniscus of -(n-1) alpha dT/dz and its opposite', () => {
    // The free bending of a heated plate, 1/R = alpha dT/dz (Timoshenko & Goodier, Theory of Elasticity).
    const slope = 4000;
    const { displacement } = solveElastic(assembled, (_, z) => 300 + slope * z);
    const { front, back } = bulgePower(displacement, 1.82, 3.5e-4);
    expect(front / (-0.82 * oxide.expansion * slope)).toBeCloseTo(1, 8);
    expect(back / (0.82 * oxide.expansion * slope)).toBeCloseTo(1, 8);
  });

  it('the fit returns the curvature of a parabola whatever the mode radius, and nothing for a flat face', () => {
    for (const modeRadius of [5e-5, 4e-4, 5e-3]) {
      const weights = curvatureWeights(studyMesh, modeRadius);
      const fitted = (shape: (r: number) => number) =>
        weights.reduce((sum, weight, i) => sum + weight * shape(studyMesh.radialNodes[i]), 0);
      // Quadratic elements hold a parabola exactly; what is left is the quadrature of the weight.
      expect(fitted((r) => 7 * r * r)).toBeCloseTo(7, 6);
      expect(fitted(() => 1) * modeRadius ** 2).toBeCloseTo(0, 6);
    }
  });

  it('a wider mode sees a weaker lens in a bulge that flattens outwards', () => {
    const { displacement } = solveElastic(assembled, pumped);
    const narrow = bulgePower(displacement, 1.82, 2e-4).front;
    const wide = bulgePower(displacement, 1.82, 6e-4).front;
    expect(wide).toBeLessThan(narrow);
    expect(bulgePower(displacement, 1.82, curvatureWeights(studyMesh, 6e-4)).front).toBe(wide);
  });

  it('the displacement asked for alone is that of the whole solution', () => {
    const mapped = sampleTemperature(assembled, pumped);
    expect(solveDisplacement(assembled, mapped)).toEqual(solveElastic(assembled, mapped).displacement);
  });
});
