// Early starts against the exact warm-up of one capacity, and in a run of a plain room.
import { describe, expect, test } from 'vitest';
import { earlyStarts } from '../../../engine/findings/optimum-start.ts';
import { type Json, plainProject, plainRoom, plainYear, runYear } from '../assembly/plain-room.ts';

describe('a room that warms by a constant rate', () => {
  // Set-point 20 °C from 6 to 22 o'clock, else 15; the room falls to 17 °C and warms by 1.5 K/h from 6.
  const days = 30;
  const stepH = 0.25;
  const ramp = Float64Array.from({ length: days * 96 * 2 }, (_, i) => {
    const hour = (Math.floor(i / 2) * stepH) % 24;
    return hour >= 6 && hour < 22 ? 20 : 15;
  });
  const atC = (timeH: number) => {
    const hour = timeH % 24;
    if (hour < 6) return 17;
    return Math.min(20, 17 + 1.5 * (hour - 6));
  };

  test('starts by what is missing over the rate', () => {
    const { leadsH, ramp: early } = earlyStarts({ ramp, stepH, mostHours: 8, atC });
    // (20 − 0.2 − 17)/1.5 = 1.867 h: two hours in whole steps of a quarter-hour.
    expect(leadsH).toHaveLength(days);
    for (const lead of leadsH) expect(lead).toBeCloseTo(2, 9);
    expect(early[2 * ((6 - 2) / stepH)]).toBe(20);
    expect(early[2 * ((6 - 2) / stepH) - 1]).toBe(15);
  });

  test('never starts earlier than allowed', () => {
    for (const lead of earlyStarts({ ramp, stepH, mostHours: 1, atC }).leadsH)
      expect(lead).toBeCloseTo(1, 9);
  });

  test('does not start early where the room is warm already', () => {
    const { leadsH } = earlyStarts({ ramp, stepH, mostHours: 8, atC: () => 19.9 });
    expect(leadsH.every((lead) => lead === 0)).toBe(true);
  });

  test('follows a rate that changes, a quarter of the way each day', () => {
    const slower = (timeH: number) => {
      const hour = timeH % 24;
      const rate = timeH < 24 * 15 ? 2 : 1;
      return hour < 6 ? 17 : Math.min(20, 17 + rate * (hour - 6));
    };
    const { leadsH } = earlyStarts({ ramp, stepH, mostHours: 8, atC: slower });
    expect(leadsH[14]).toBeLessThan(1.6); // 2.8 K at 2 K/h, nearly learned
    expect(leadsH[29]).toBeGreaterThan(2.5); // 2.8 K at 1 K/h, nearly learned
  });
});

describe('in a run', () => {
  const hours = (from: number) =>
    Array.from({ length: 24 }, (_, h) => (h >= from && h < 22 ? 20 : 14));
  const project = (heating: Json, from = 6) => ({
    ...heavy([
      {
        ...plainRoom(),
        infiltration: { airChangesPerH: 1.5 },
        heating: { setPointC: { schedule: 's' }, maxW: 3300, ...heating },
      },
    ]),
    profiles: [{ kind: 'hours', id: 'p', values: hours(from) }],
    schedules: [{ id: 's', profile: 'p' }],
  });
  /** The walls store heat as well. */
  function heavy(rooms: Json[]): Json {
    const document = plainProject(rooms);
    document.constructions[0].layers.push({ material: 'concrete', thicknessM: 0.1 });
    return document;
  }
  const weather = plainYear({ dryBulbC: (h) => 4 - 8 * Math.cos((2 * Math.PI * h) / 8760) });
  const at = (run: ReturnType<typeof runYear>) => {
    const [{ airC }] = run.rooms;
    const mornings = Array.from({ length: 365 }, (_, d) => airC[24 * d + 6]);
    return { coldestC: Math.min(...mornings), kWh: run.findings.rooms[0].heatingKWh };
  };

  test('the room is warm in time, for less heat than by starting as early every day', () => {
    const late = at(runYear(project({}), weather));
    const run = runYear(project({ optimumStart: { mostHours: 6 } }), weather);
    const early = at(run);
    const always = at(runYear(project({}, 0), weather));
    expect(late.coldestC).toBeLessThan(18.5);
    expect(early.coldestC).toBeGreaterThan(19.5);
    expect(early.kWh).toBeGreaterThan(late.kWh);
    expect(early.kWh).toBeLessThan(always.kWh);
    expect(run.findings.assumptions.join()).toMatch(/starts ahead of \d+ of 365 rises/);
    expect(run.findings.quality.relativeBalanceResidual).toBeLessThan(1e-9);
  });
});
