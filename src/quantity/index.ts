export { DIMENSIONS, dimensionRecord, unitsOf } from './dimensions';
export type { Dimension } from './dimensions';
export { convertTo, formatQuantity } from './format';
export { nearestName } from './nearest';
export { parseQuantity } from './parse';
export type { ParsedQuantity } from './parse';
