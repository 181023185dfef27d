/** What the engine uses of the psychrolib package, which ships no types. Temperatures in °C, pressures in Pa. */
declare module "psychrolib" {
  const psychrolib: {
    readonly SI: number;
    SetUnitSystem(system: number): void;
    GetHumRatioFromRelHum(dryBulb: number, relativeHumidity: number, pressure: number): number;
    GetHumRatioFromTWetBulb(dryBulb: number, wetBulb: number, pressure: number): number;
    GetHumRatioFromTDewPoint(dewPoint: number, pressure: number): number;
    GetSatVapPres(temperature: number): number;
    GetSatHumRatio(dryBulb: number, pressure: number): number;
    GetDryAirVolume(dryBulb: number, pressure: number): number;
    GetMoistAirVolume(dryBulb: number, humidityRatio: number, pressure: number): number;
  };
  export default psychrolib;
}
