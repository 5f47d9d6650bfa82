// One plain room and weather from plain curves, for tests of what is wired round a room: no sun unless
// asked, nothing but what the test itself puts in.
import {
  type Building,
  parseProjectDocument,
  type Simulation,
  simulate,
} from '../../../engine/index.ts';
import {
  dewPointC,
  faultText,
  type Site,
  saturationPressurePa,
  type WeatherColumn,
  type WeatherYear,
} from '../../../weather/index.ts';

export const seaside: Site = {
  name: 'Seaside',
  latitudeDeg: 50,
  longitudeDeg: 0,
  elevationM: 0,
  utcOffsetH: 0,
};

type Curve = number | ((hour: number) => number);

/** A year without sun under an overcast sky at air temperature. */
export function plainYear(
  air: { dryBulbC: Curve; relativeHumidity?: Curve; windMPerS?: Curve; windFromDeg?: Curve },
  site: Site = seaside,
): WeatherYear {
  const hours = 8760;
  const at = (curve: Curve, h: number) => (typeof curve === 'number' ? curve : curve(h));
  const column = (curve: Curve): WeatherColumn => ({
    values: Float64Array.from({ length: hours }, (_, h) => at(curve, h)),
    stands: { kind: 'mean' },
    origin: 'read',
  });
  const humidity = air.relativeHumidity ?? 0.7;
  const dry = (h: number) => at(air.dryBulbC, h);
  return {
    site,
    form: 'plain table',
    year: 2019,
    hours,
    sourceYear: new Int16Array(hours).fill(2019),
    dryBulbC: column(dry),
    dewPointC: column((h) => dewPointC(at(humidity, h) * saturationPressurePa(dry(h)))),
    relativeHumidity: column(humidity),
    pressurePa: column(101_325),
    windMPerS: column(air.windMPerS ?? 3),
    windFromDeg: column(air.windFromDeg ?? 180),
    ghiWPerM2: column(0),
    dniWPerM2: column(0),
    dhiWPerM2: column(0),
    horizontalInfraredWPerM2: column((h) => 5.670374419e-8 * (dry(h) + 273.15) ** 4),
    notes: [],
  };
}

export type Json = ReturnType<typeof JSON.parse>;

/**
 * A room of 10 m × 8 m × 2.5 m, heavily insulated so that little but the subject of a test moves heat:
 * walls to the south (front), west, north, east, a roof and a floor.
 */
export function plainRoom(id = 'room'): Json {
  const wall = (name: string, azimuthDeg: number, areaM2: number) => ({
    id: name,
    construction: 'shell',
    areaM2,
    tiltDeg: 90,
    azimuthDeg,
    boundary: { kind: 'outdoors' },
  });
  return {
    id,
    name: id,
    floorAreaM2: 80,
    volumeM3: 200,
    box: { lengthM: 10, depthM: 8, heightM: 2.5, frontAzimuthDeg: 180 },
    surfaces: [
      wall('south', 180, 25),
      wall('west', 270, 20),
      wall('north', 0, 25),
      wall('east', 90, 20),
      { ...wall('roof', 0, 80), tiltDeg: 0 },
      {
        ...wall('floor', 0, 80),
        tiltDeg: 180,
        construction: 'slab',
        boundary: { kind: 'adiabatic' },
      },
    ],
  };
}

export function plainProject(rooms: readonly Json[], more: Json = {}): Json {
  return {
    format: 'inglenook-project',
    version: 1,
    name: 'plain',
    materials: [
      {
        id: 'concrete',
        name: 'Concrete',
        conductivityWPerMK: 2,
        densityKgPerM3: 2300,
        specificHeatJPerKgK: 1000,
        vapourResistanceFactor: 80,
      },
    ],
    constructions: [
      {
        id: 'shell',
        name: 'Shell',
        layers: [{ name: 'insulation', resistanceM2KPerW: 20 }],
        outsideSolarAbsorptance: 0,
      },
      { id: 'slab', name: 'Slab', layers: [{ material: 'concrete', thicknessM: 0.15 }] },
    ],
    rooms,
    ...more,
  };
}

/** The project as the engine takes it; its faults as text, where it has any, fail the test. */
export function building(document: Json): Building {
  const parsed = parseProjectDocument(document, 'plain.json');
  if (!parsed.ok) throw new Error(parsed.faults.map(faultText).join('\n'));
  return parsed.value;
}

/** Messages that a project draws; empty where it is sound. */
export function messages(document: Json): string[] {
  const parsed = parseProjectDocument(document, 'plain.json');
  return parsed.ok ? [] : parsed.faults.map(faultText);
}

export function runYear(document: Json, weather: WeatherYear, stepMinutes = 60): Simulation {
  const steps = simulate(building(document), weather, { stepMinutes });
  let next = steps.next();
  while (!next.done) next = steps.next();
  return next.value;
}

/** Sum of hourly values over each month of a common year. */
export function monthSums(values: Float64Array): number[] {
  const days = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
  let h = 0;
  return days.map((count) => {
    const end = h + 24 * count;
    let sum = 0;
    for (; h < end; h++) sum += values[h];
    return sum;
  });
}
