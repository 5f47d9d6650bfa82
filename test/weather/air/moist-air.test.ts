import { expect, test } from 'vitest';
import {
  berdahlMartinEmissivity,
  berdahlMartinHourlyEmissivity,
  clarkAllenEmissivity,
  dewPointC,
  dryAirDensityKgPerM3,
  enthalpyJPerKg,
  humidityRatio,
  humidityRatioFromWetBulb,
  magnusDewPointC,
  moistAirDensityKgPerM3,
  saturationPressurePa,
  skyInfraredWPerM2,
  skyTemperatureFromEmissivityC,
  skyTemperatureFromInfraredC,
  specificVolumeM3PerKg,
  standardPressurePa,
  standardTemperatureC,
  stullWetBulbC,
  swinbankSkyC,
  vapourPressurePa,
  waltonCloudFactor,
  wetBulbC,
} from '../../../weather/index.ts';
import {
  caseName,
  expectCase,
  inputNumber,
  inputNumbers,
  referenceCase,
  referenceCases,
} from '../../reference/cases.ts';

const file = '06-air-and-sky.json';

for (const one of referenceCases(file, /^moist-air-/)) {
  test(caseName(one), () => {
    const [t, p] = [inputNumber(one, 't'), inputNumber(one, 'p')];
    const pws = saturationPressurePa(t);
    // A case states the humidity as relative humidity, wet bulb or dew point.
    let pv: number;
    if ('rh' in one.inputs) pv = (inputNumber(one, 'rh') / 100) * pws;
    else if ('tdp' in one.inputs) pv = saturationPressurePa(inputNumber(one, 'tdp'));
    else pv = vapourPressurePa(humidityRatioFromWetBulb(t, inputNumber(one, 'twb'), p), p);
    const w = humidityRatio(pv, p);
    const all = {
      w,
      rh: (100 * pv) / pws,
      twb: wetBulbC(t, w, p),
      tdp: dewPointC(pv),
      pv,
      h: enthalpyJPerKg(t, w),
      v: specificVolumeM3PerKg(t, w, p),
      rho: moistAirDensityKgPerM3(t, w, p),
      pws,
    };
    const asked = Object.entries(all).filter(([key]) => key in one.expected);
    expectCase(one, Object.fromEntries(asked));
  });
}

test(caseName(referenceCase(file, 'ashrae-example-1')), () => {
  const one = referenceCase(file, 'ashrae-example-1');
  const [t, p] = [inputNumber(one, 't'), inputNumber(one, 'p')];
  const w = humidityRatioFromWetBulb(t, inputNumber(one, 'twb'), p);
  const pv = vapourPressurePa(w, p);
  expectCase(one, {
    w_g: w * 1000,
    h_kJ: enthalpyJPerKg(t, w) / 1000,
    tdp: dewPointC(pv),
    rh: (100 * pv) / saturationPressurePa(t),
    v: specificVolumeM3PerKg(t, w, p),
  });
});

test(caseName(referenceCase(file, 'ashrae-saturation-table')), () => {
  const one = referenceCase(file, 'ashrae-saturation-table');
  const rows = inputNumbers(one, 't').map((t) => {
    const pws = saturationPressurePa(t);
    const ws = humidityRatio(pws, 101325);
    return { ws, h: enthalpyJPerKg(t, ws) / 1000, pws: pws / 1000 };
  });
  expectCase(one, {
    ws_kg: rows.map((row) => row.ws),
    h_kJ: rows.map((row) => row.h),
    pws_kPa: rows.map((row) => row.pws),
  });
});

test(caseName(referenceCase(file, 'standard-atmosphere-table')), () => {
  const one = referenceCase(file, 'standard-atmosphere-table');
  const heights = inputNumbers(one, 'altitude');
  expectCase(one, {
    pressure_kPa: heights.map((height) => standardPressurePa(height) / 1000),
    temperature: heights.map(standardTemperatureC),
  });
});

for (const one of referenceCases(file, /^dry-density-altitude-/)) {
  test(caseName(one), () => {
    const pressure = standardPressurePa(inputNumber(one, 'altitude'));
    expectCase(one, { pressure, density: dryAirDensityKgPerM3(inputNumber(one, 't'), pressure) });
  });
}

for (const one of referenceCases(file, /^wet-bulb-stull-/)) {
  test(caseName(one), () => {
    expectCase(one, { twb: stullWetBulbC(inputNumber(one, 't'), inputNumber(one, 'rh') / 100) });
  });
}

for (const one of referenceCases(file, /^dew-point-magnus-/)) {
  test(caseName(one), () => {
    expectCase(one, { tdp: magnusDewPointC(inputNumber(one, 't'), inputNumber(one, 'rh') / 100) });
  });
}

for (const one of referenceCases(file, /^sky-clark-allen-/)) {
  test(caseName(one), () => {
    const t = inputNumber(one, 't');
    const clear = clarkAllenEmissivity(inputNumber(one, 'tdp'));
    const sky = clear * waltonCloudFactor(inputNumber(one, 'cloud') / 10);
    expectCase(one, {
      eps_clear: clear,
      eps_sky: sky,
      ir_down: skyInfraredWPerM2(sky, t),
      t_sky: skyTemperatureFromEmissivityC(sky, t),
    });
  });
}

for (const one of referenceCases(file, /^sky-berdahl-martin-\d/)) {
  test(caseName(one), () => {
    const t = inputNumber(one, 't');
    const clear = berdahlMartinEmissivity(inputNumber(one, 'tdp'));
    expectCase(one, {
      eps_clear: clear,
      ir_down: skyInfraredWPerM2(clear, t),
      t_sky: skyTemperatureFromEmissivityC(clear, t),
    });
  });
}

for (const one of referenceCases(file, /^sky-berdahl-martin-hourly-/)) {
  test(caseName(one), () => {
    const clear = berdahlMartinHourlyEmissivity(
      inputNumber(one, 'tdp'),
      inputNumber(one, 'hour'),
      inputNumber(one, 'pressure_hpa') * 100,
    );
    const t = inputNumber(one, 't');
    expectCase(one, { eps_clear: clear, t_sky: skyTemperatureFromEmissivityC(clear, t) });
  });
}

test(caseName(referenceCase(file, 'sky-swinbank')), () => {
  const one = referenceCase(file, 'sky-swinbank');
  expectCase(one, { t_sky: inputNumbers(one, 't').map(swinbankSkyC) });
});

test(caseName(referenceCase(file, 'sky-from-ir')), () => {
  const one = referenceCase(file, 'sky-from-ir');
  expectCase(one, { t_sky: inputNumbers(one, 'ir').map(skyTemperatureFromInfraredC) });
});

test('every case of the file is used here; wind, outside long-wave and sol-air belong to the films', () => {
  const used =
    /^(moist-air-|ashrae-|standard-atmosphere-table|dry-density-|wet-bulb-stull-|dew-point-magnus-|sky-|wind-profile-|longwave-outside-|sol-air-)/;
  expect(referenceCases(file).filter((one) => !used.test(one.id))).toEqual([]);
});
