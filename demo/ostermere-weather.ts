// The invented weather of the invented town of Ostermere: a mild maritime year, the same bytes on
// every machine. Sun follows its true course over the site; cloud, wind and air masses are random
// walks from one start. Nothing here is measured.
import {
  relativeHumidityFromDewPoint,
  type Site,
  sunPosition,
  turbiditySky,
  type WeatherColumn,
  type WeatherYear,
} from '../weather/index.ts';

const site: Site = {
  name: 'Ostermere (invented)',
  latitudeDeg: 50.5,
  longitudeDeg: 0,
  elevationM: 60,
  utcOffsetH: 0,
};
const year = 2025;
const hours = 8760;

/** mulberry32: 32 bits of state, uniform in [0, 1). Public domain, from memory. */
function randomStream(start: number): () => number {
  let a = start >>> 0;
  return () => {
    a = (a + 0x6d2b79f5) >>> 0;
    let t = Math.imul(a ^ (a >>> 15), a | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

/** Standard normal from two uniforms (Box and Muller 1958). */
const normal = (random: () => number): number =>
  Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());

/** First-order autoregressive walk with unit variance, one value an hour. */
function walk(random: () => number, memoryH: number): Float64Array {
  const keep = Math.exp(-1 / memoryH);
  const kick = Math.sqrt(1 - keep * keep);
  const values = new Float64Array(hours);
  let x = normal(random);
  for (let h = 0; h < hours; h++) {
    x = keep * x + kick * normal(random);
    values[h] = x;
  }
  return values;
}

/** Share of the sky, from a walk: half the hours nearly clear or overcast, as maritime skies are. */
const coverOf = (x: number): number => Math.min(1, Math.max(0, 0.62 + 0.55 * x));

/** To so many decimals; never a negative nought. */
const round = (value: number, digits: number): number => Number(value.toFixed(digits)) + 0;

/** The year, ready for `writePlainWeather`. */
export function ostermereYear(): WeatherYear {
  const random = randomStream(1899);
  const cloud = walk(random, 20);
  const airMass = walk(random, 60);
  const gust = walk(random, 9);
  const turn = walk(random, 30);
  const weight = walk(random, 70);
  const column = () => new Float64Array(hours);
  const dryBulb = column();
  const dewPoint = column();
  const humidity = column();
  const pressure = column();
  const wind = column();
  const windFrom = column();
  const ghi = column();
  const dni = column();
  const dhi = column();
  const cover = column();
  for (let h = 0; h < hours; h++) {
    const day = h / 24;
    const season = Math.cos((2 * Math.PI * (day - 203)) / 365); // warmest in the last third of July
    const c = coverOf(cloud[h] - 0.15 * season);
    cover[h] = round(c, 2);
    const startMs = Date.UTC(year, 0, 1) + h * 3_600_000 - site.utcOffsetH * 3_600_000;
    const sun = hourSun(startMs, c);
    dni[h] = round(sun.dniWPerM2, 0);
    dhi[h] = round(sun.dhiWPerM2, 0);
    ghi[h] = round(sun.ghiWPerM2, 0);
    // Daily swing peaks at 15 h and shrinks under cloud; air masses come and go over days.
    const swingK = (1.2 + 4.3 * (1 - c)) * (0.75 + 0.35 * season);
    const swing = Math.cos((2 * Math.PI * ((h % 24) + 0.5 - 15)) / 24);
    const t = 10.3 + 6.6 * season + swingK * swing + 3.1 * airMass[h] + 0.8 * (c - 0.6) * -season;
    dryBulb[h] = round(t, 1);
    // Clear nights end near saturation; clear warm afternoons and continental air are dry.
    const clearness = (1 - c) * (1 + 0.45 * season);
    const dryK = 1.3 + 3.6 * clearness + 1.1 * Math.max(0, airMass[h]);
    const depression = Math.max(0.1, dryK + (1.1 + 3.2 * clearness) * swing);
    dewPoint[h] = round(t - depression, 1);
    humidity[h] = round(relativeHumidityFromDewPoint(dryBulb[h], dewPoint[h]), 3);
    pressure[h] = round(100_600 + 950 * weight[h], 0);
    wind[h] = round(Math.max(0, 4.2 - 0.7 * season + 1.9 * gust[h] + 0.6 * swing), 1);
    windFrom[h] = round((((230 + 70 * turn[h]) % 360) + 360) % 360, 0);
  }
  const mean = (values: Float64Array): WeatherColumn => ({
    values,
    stands: { kind: 'mean' },
    origin: 'read',
  });
  const reading = (values: Float64Array): WeatherColumn => ({
    values,
    stands: { kind: 'reading', at: 0.5 },
    origin: 'read',
  });
  return {
    site,
    form: 'plain',
    year,
    hours,
    sourceYear: new Int16Array(hours).fill(year),
    dryBulbC: reading(dryBulb),
    dewPointC: reading(dewPoint),
    relativeHumidity: reading(humidity),
    pressurePa: reading(pressure),
    windMPerS: reading(wind),
    windFromDeg: reading(windFrom),
    ghiWPerM2: mean(ghi),
    dniWPerM2: mean(dni),
    dhiWPerM2: mean(dhi),
    skyCover: mean(cover),
    notes: [],
  };
}

const partsOfHour = 6;

/** Means over an hour: a clear sky of the sun's course, dimmed by cloud. */
function hourSun(startMs: number, cloudCover: number) {
  let ghiWPerM2 = 0;
  let dniWPerM2 = 0;
  let dhiWPerM2 = 0;
  // Kasten and Czeplak 1980 for the global under cloud; the beam goes with the clear share.
  const dim = 1 - 0.75 * cloudCover ** 3.4;
  const open = (1 - cloudCover) ** 1.3;
  for (let i = 0; i < partsOfHour; i++) {
    const atMs = startMs + ((i + 0.5) / partsOfHour) * 3_600_000;
    const { zenithDeg } = sunPosition(atMs, site);
    const up = Math.cos((zenithDeg * Math.PI) / 180);
    if (up <= 0.01) continue;
    const clear = turbiditySky(zenithDeg, 1361, airMassOf(up), 3.2, site.elevationM);
    const global = clear.ghiWPerM2 * dim;
    const beam = Math.min(clear.dniWPerM2 * open, (0.96 * global) / up);
    ghiWPerM2 += global / partsOfHour;
    dniWPerM2 += beam / partsOfHour;
    dhiWPerM2 += (global - beam * up) / partsOfHour;
  }
  return { ghiWPerM2, dniWPerM2, dhiWPerM2 };
}

/** Plane-parallel air mass, held below 30 near the horizon. */
const airMassOf = (cosZenith: number): number => Math.min(30, 1 / cosZenith);
