declare module 'psychrolib' {
  const psychrolib: {
    SI: number;
    SetUnitSystem(system: number): void;
    /** degC, 0 to 1 -> degC */
    GetTDewPointFromRelHum(dryBulb: number, relativeHumidity: number): number;
  };
  export default psychrolib;
}
