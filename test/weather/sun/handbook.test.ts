import { expect, test } from 'vitest';
import {
  cooperDeclinationDeg,
  cosIncidence,
  equationOfTimeMin,
  extraterrestrialHorizontalJPerM2,
  julianDay,
  simpleExtraterrestrialWPerM2,
  solarTimeH,
  spencerDeclinationDeg,
  spencerExtraterrestrialWPerM2,
  sunEphemeris,
  sunFromHourAngle,
  sunsetHourAngleDeg,
} from '../../../weather/index.ts';
import {
  caseName,
  expectCase,
  inputNumber,
  inputNumbers,
  type ReferenceCase,
  referenceCase,
  referenceCases,
} from '../../reference/cases.ts';

const file = '05a-solar-position.json';
const degPerRad = 180 / Math.PI;

/** Declination, sun and incidence by the handbook's own formulas. Azimuths of the cases start south. */
function handbookSun(one: ReferenceCase) {
  const declination = cooperDeclinationDeg(inputNumber(one, 'day'));
  const latitude = inputNumber(one, 'latitude');
  const sun = sunFromHourAngle(latitude, declination, inputNumber(one, 'hour_angle'));
  const incidence = (slope: number, azimuthFromSouth: number) =>
    Math.acos(cosIncidence(sun.zenithDeg, sun.azimuthDeg, slope, azimuthFromSouth + 180)) *
    degPerRad;
  return { declination, ...sun, fromSouth: sun.azimuthDeg - 180, incidence };
}

for (const one of referenceCases(file, /^(db-incidence|incidence-)/)) {
  test(caseName(one), () => {
    const sun = handbookSun(one);
    const all = {
      declination: sun.declination,
      zenith: sun.zenithDeg,
      solar_azimuth_from_south: sun.fromSouth,
      incidence: sun.incidence(inputNumber(one, 'slope'), inputNumber(one, 'azimuth_from_south')),
    };
    const asked = Object.entries(all).filter(([key]) => key in one.expected);
    expectCase(one, Object.fromEntries(asked));
  });
}

for (const one of referenceCases(file, /^db-zenith-/)) {
  test(caseName(one), () => {
    const sun = handbookSun(one);
    expectCase(one, { zenith: sun.zenithDeg, solar_azimuth_from_south: sun.fromSouth });
  });
}

test(caseName(referenceCase(file, 'db-Rb')), () => {
  const one = referenceCase(file, 'db-Rb');
  const sun = handbookSun(one);
  const incidence = sun.incidence(
    inputNumber(one, 'slope'),
    inputNumber(one, 'azimuth_from_south'),
  );
  const ratio = Math.cos(incidence / degPerRad) / Math.cos(sun.zenithDeg / degPerRad);
  expectCase(one, { R_b: ratio });
});

test(caseName(referenceCase(file, 'db-solar-time')), () => {
  const one = referenceCase(file, 'db-solar-time');
  const day = inputNumber(one, 'day');
  const east = -inputNumber(one, 'longitude_west');
  const meridian = -inputNumber(one, 'standard_meridian_west');
  expectCase(one, {
    equation_of_time: equationOfTimeMin(day),
    solar_time: solarTimeH(inputNumber(one, 'clock'), day, east, meridian),
  });
});

/** Energy of a whole day on the horizontal outside the atmosphere, MJ/m². */
function dailyMJPerM2(day: number, latitudeDeg: number, constant: number): number {
  const declination = cooperDeclinationDeg(day);
  const sunset = sunsetHourAngleDeg(latitudeDeg, declination);
  return (
    extraterrestrialHorizontalJPerM2(day, latitudeDeg, declination, -sunset, sunset, constant) / 1e6
  );
}

test(caseName(referenceCase(file, 'db-H0')), () => {
  const one = referenceCase(file, 'db-H0');
  const [day, latitude] = [inputNumber(one, 'day'), inputNumber(one, 'latitude')];
  expectCase(one, { H0: dailyMJPerM2(day, latitude, inputNumber(one, 'solar_constant')) });
});

test(caseName(referenceCase(file, 'db-I0')), () => {
  const one = referenceCase(file, 'db-I0');
  const day = inputNumber(one, 'day');
  const energy = extraterrestrialHorizontalJPerM2(
    day,
    inputNumber(one, 'latitude'),
    cooperDeclinationDeg(day),
    inputNumber(one, 'hour_angle_1'),
    inputNumber(one, 'hour_angle_2'),
    inputNumber(one, 'solar_constant'),
  );
  expectCase(one, { I0: energy / 1e6 });
});

test(caseName(referenceCase(file, 'H0-table')), () => {
  const one = referenceCase(file, 'H0-table');
  const constant = inputNumber(one, 'solar_constant');
  const days = inputNumbers(one, 'days');
  const rows = inputNumbers(one, 'latitudes').map((latitude) =>
    days.map((day) => dailyMJPerM2(day, latitude, constant)),
  );
  expectCase(one, { H0_table: rows });
});

test(caseName(referenceCase(file, 'equation-of-time')), () => {
  const one = referenceCase(file, 'equation-of-time');
  const days = inputNumbers(one, 'day');
  expectCase(one, {
    equation_of_time: days.map(equationOfTimeMin),
    declination: days.map(cooperDeclinationDeg), // the one-term formula, as its values show
  });
});

test(caseName(referenceCase(file, 'extraterrestrial-normal-simple')), () => {
  const one = referenceCase(file, 'extraterrestrial-normal-simple');
  const constant = inputNumber(one, 'solar_constant');
  const days = inputNumbers(one, 'day');
  expectCase(one, { G_on: days.map((day) => simpleExtraterrestrialWPerM2(day, constant)) });
});

test(caseName(referenceCase(file, 'extraterrestrial-normal-spencer')), () => {
  const one = referenceCase(file, 'extraterrestrial-normal-spencer');
  const constant = inputNumber(one, 'solar_constant');
  const days = inputNumbers(one, 'day');
  expectCase(one, { G_on: days.map((day) => spencerExtraterrestrialWPerM2(day, constant)) });
});

for (const one of referenceCases(file, /^day-length-/)) {
  test(caseName(one), () => {
    const latitude = inputNumber(one, 'latitude');
    const declination = inputNumber(one, 'declination');
    const sunset = sunsetHourAngleDeg(latitude, declination);
    const noon = sunFromHourAngle(latitude, declination, 0);
    expectCase(one, {
      sunset_hour_angle: sunset,
      day_length: (2 * sunset) / 15,
      noon_altitude: 90 - noon.zenithDeg,
    });
  });
}

test('every case on the sun is used here or in position.test.ts; shading belongs to the fabric', () => {
  const used =
    /^(nrel-spa-example|position-|rise-set-|seasons-|db-|incidence-|H0-table|equation-of-time|extraterrestrial-|day-length-|shade-)/;
  expect(referenceCases(file).filter((one) => !used.test(one.id))).toEqual([]);
});

test("Spencer's declination is that of his years to the error he states", () => {
  // Spencer (1971): 0.0006 rad, 0.035 degrees. A series by the day of the year is right for the mean of
  // the leap-year cycle at 0 h; by 2025 the calendar has drifted from it by up to 0.34.
  for (let day = 1; day <= 365; day++) {
    const cycle = [1969, 1970, 1971, 1972].map(
      (year) => sunEphemeris(julianDay(Date.UTC(year, 0, day))).declinationDeg,
    );
    const mean = cycle.reduce((sum, one) => sum + one, 0) / 4;
    expect(Math.abs(spencerDeclinationDeg(day) - mean)).toBeLessThan(0.035);
  }
});
