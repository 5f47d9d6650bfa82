// Climate and sun: the front door of this folder. Reads weather tables, finds the sun, brings
// radiation onto planes; knows no building.
export * from './air/atmosphere.ts';
export * from './air/moist-air.ts';
export * from './calendar.ts';
export * from './check/finding.ts';
export * from './check/inspect.ts';
export * from './climate/design-conditions.ts';
export * from './climate/design-day.ts';
export * from './climate/design-table.ts';
export * from './climate/spells.ts';
export * from './climate/summary.ts';
export * from './fault.ts';
export * from './map/detect.ts';
export { type ColumnGuess, limitsOf } from './map/detect-columns.ts';
export * from './map/mapping.ts';
export * from './map/parse-mapping.ts';
export * from './map/read-mapped.ts';
export { type Unit, unitsOf } from './map/units.ts';
export * from './morph/extreme-run.ts';
export * from './morph/morph.ts';
export {
  plainWeatherForm,
  writePlainWeather,
} from './read/form-plain.ts';
export * from './read/number-table.ts';
export * from './read/read-weather.ts';
export * from './repair/diffuse-choice.ts';
export * from './repair/gaps.ts';
export * from './repair/radiation.ts';
export * from './repair/sun-time.ts';
export { derivedInfrared, stationPressurePa } from './series/derive.ts';
export { seriesOfYear } from './series/of-year.ts';
export * from './series/series.ts';
export { type HeldYear, heldYears, type YearChoice } from './series/span.ts';
export * from './series/to-year.ts';
export * from './sky/air-mass.ts';
export * from './sky/clear-sky.ts';
export * from './sky/diffuse-split.ts';
export * from './sky/hourly-sky.ts';
export * from './sky/perez.ts';
export * from './sky/simple-skies.ts';
export * from './sky/sky-temperature.ts';
export * from './steps/hourly-sun.ts';
export * from './steps/plane.ts';
export * from './steps/spread.ts';
export * from './steps/steps.ts';
export * from './steps/sun-track.ts';
export * from './store/pack.ts';
export * from './sun/ephemeris.ts';
export * from './sun/events.ts';
export * from './sun/handbook.ts';
export * from './sun/position.ts';
export * from './time/civil-clock.ts';
export * from './weather-year.ts';
