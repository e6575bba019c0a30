export { type RodConduction, assembleRod } from './assemble';
export { type ConductivityLaw, potentialOf, temperatureOf, temperatureSlope } from './conductivity-law';
export { type RodField, barrelFlux } from './field';
export { type GridError, estimateGridError } from './grid-error';
export { type CellCount, type GridWish, type RodGrid, cellPresets, makeRodGrid } from './grid';
export type { BoundaryTemperatures, ContactModel, EndModel, RodHeatModel, SideModel } from './model';
export { meanWithin, temperatureAt } from './read-field';
export { solveRod } from './solve';
export { heatSource } from './source';
