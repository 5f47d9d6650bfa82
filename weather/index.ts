// Climate and sun: the front door of this folder. Reads weather tables, finds the sun, brings
// radiation onto planes; knows no building.
export * from './fault.ts';
export * from './sun/ephemeris.ts';
export * from './sun/events.ts';
export * from './sun/handbook.ts';
export * from './sun/position.ts';
export * from './weather-year.ts';
