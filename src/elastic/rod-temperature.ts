import type { RodConduction, RodField } from '../heat';
import type { AssembledElastic } from './assemble';
import { temperatureMap, type MappedTemperature, type TemperatureMap } from './temperature-map';

/** Map from the cells of a rod's conduction grid, made once for all its fields. */
export function rodTemperatureMap(assembled: AssembledElastic, conduction: RodConduction): TemperatureMap {
  const { grid, frontFace, backFace } = conduction;
  return temperatureMap(assembled, grid.radialCentres, grid.axialCentres, grid.nRadial, {
    front: frontFace,
    back: backFace,
  });
}

/** A field of that grid, ready for `solveElastic`. */
export function rodTemperature(map: TemperatureMap, field: RodField): MappedTemperature {
  return { map, values: field.temperatures, air: field.boundary };
}
