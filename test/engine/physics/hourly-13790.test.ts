// The hourly reference method itself, so that later comparisons with it mean something.
import { test } from 'vitest';
import {
  caseName,
  expectCase,
  inputNumber,
  inputNumbers,
  referenceCases,
} from '../../reference/cases.ts';
import { controlledHour, type HourlyState } from './hourly-13790.ts';

for (const one of referenceCases('12-hourly-room-and-zones.json', /^hourly-/)) {
  test(caseName(one), () => {
    const n = (key: string) => inputNumber(one, key);
    const room = {
      massAreaM2: n('A_m'),
      capacityJPerK: n('C_m'),
      window: n('H_tr_w'),
      massToOutside: n('H_em'),
      massToSurface: n('H_ms'),
      surfaceToAir: n('H_is'),
      ventilation: n('H_ve'),
      totalAreaM2: n('A_tot'),
    };
    const series = (key: string) => inputNumbers(one, key);
    const [te, internal, solar, heat, cool] = [
      'theta_e',
      'phi_int',
      'phi_sol',
      'set_heat',
      'set_cool',
    ].map(series);
    const at = (list: number[] | undefined, h: number) => list?.[h % 24] ?? Number.NaN;
    const run: HourlyState[] = [];
    let massC = n('theta_m_start');
    for (let h = 0; h < n('n_hours'); h++) {
      const state = controlledHour(
        room,
        {
          outsideC: at(te, h),
          internalW: at(internal, h),
          solarW: at(solar, h),
          heatSetC: at(heat, h),
          coolSetC: at(cool, h),
          greatestHeatW: n('phi_heat_max'),
          greatestCoolW: n('phi_cool_max'),
        },
        massC,
      );
      massC = state.massC;
      run.push(state);
    }
    const shown = inputNumbers(one, 'hours').map((h) => run[h - 1] as HourlyState);
    const sum = (sign: number) => run.reduce((a, s) => a + Math.max(0, sign * s.powerW), 0) / 1000;
    expectCase(one, {
      phi_HC: shown.map((s) => s.powerW),
      theta_air: shown.map((s) => s.airC),
      theta_s: shown.map((s) => s.surfaceC),
      theta_m: shown.map((s) => s.massC),
      theta_op: shown.map((s) => s.operativeC),
      heat_kWh: sum(1),
      cool_kWh: sum(-1),
    });
  });
}
