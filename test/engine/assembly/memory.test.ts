// What is kept from one assembly to the next must not show: every edit gives the same problem with a
// memory as without one (law: the same inputs, the same bytes).
import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { ostermereYear } from '../../../demo/ostermere-weather.ts';
import { assemble, emptyMemory, parseProjectDocument } from '../../../engine/index.ts';

type Json = ReturnType<typeof JSON.parse>;
const demoText = readFileSync('demo/quillon-house.inglenook.json', 'utf8');

function demoAfter(change: (document: Json) => void) {
  const document: Json = JSON.parse(demoText);
  document.rooms.length = 1; // the living room alone: its partitions become adiabatic
  for (const surface of document.rooms[0].surfaces)
    if (surface.boundary.kind === 'room') {
      surface.boundary = { kind: 'adiabatic' };
      delete surface.reversed;
    }
  document.airPaths = [];
  document.airExchanges = [];
  document.airFlows = undefined;
  document.doorways = undefined;
  change(document);
  const parsed = parseProjectDocument(JSON.parse(JSON.stringify(document)), 'demo');
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.faults));
  return parsed.value;
}

const edits: Record<string, (document: Json) => void> = {
  'nothing changed': () => {},
  'a set-point': (d) => {
    d.profiles[0].values[7] = 21;
  },
  'the ground outside': (d) => {
    d.site.groundReflectance = 0.5;
  },
  'the skyline': (d) => {
    d.site.horizon = [
      { azimuthDeg: 90, altitudeDeg: 30 },
      { azimuthDeg: 270, altitudeDeg: 5 },
    ];
  },
  'the glass': (d) => {
    d.glazings[0].panes[0].solarTransmittance = 0.6;
  },
  'the floor’s colour': (d) => {
    for (const one of d.constructions) one.insideSolarAbsorptance = 0.9;
  },
  'a window’s size': (d) => {
    const [opening] = d.rooms[0].surfaces.find((s: Json) => s.openings?.length > 0).openings;
    opening.rectangle.widthM *= 0.9;
    opening.areaM2 = opening.rectangle.widthM * opening.rectangle.heightM;
  },
  'the sky model': (d) => {
    d.physics = { ...d.physics, diffuseSky: 'isotropic' };
  },
  'the terrain': (d) => {
    d.site.terrain = 'city';
  },
};

test('every edit assembles to the same bytes with a memory as without', () => {
  const year = ostermereYear();
  const memory = emptyMemory();
  for (const [name, edit] of Object.entries(edits)) {
    const building = demoAfter(edit);
    const fresh = assemble(building, year, { stepMinutes: 60, refine: 1 }).problem;
    const kept = assemble(building, year, { stepMinutes: 60, refine: 1, memory }).problem;
    expect(kept.series.length, name).toBe(fresh.series.length);
    kept.series.forEach((one, i) => {
      expect(
        Buffer.from(one.values.buffer).equals(Buffer.from(fresh.series[i].values.buffer)),
        `${name}: ${one.name}`,
      ).toBe(true);
    });
    expect(kept.network.sources.factor, name).toEqual(fresh.network.sources.factor);
  }
});

test('another weather year or step is not served from memory', () => {
  const year = ostermereYear();
  const other = {
    ...year,
    dniWPerM2: { ...year.dniWPerM2, values: year.dniWPerM2.values.map((v) => v / 2) },
  };
  const building = demoAfter(() => {});
  const memory = emptyMemory();
  assemble(building, year, { stepMinutes: 60, refine: 1, memory });
  const kept = assemble(building, other, { stepMinutes: 60, refine: 1, memory }).problem;
  const fresh = assemble(building, other, { stepMinutes: 60, refine: 1 }).problem;
  expect(kept.series.map((one) => one.values)).toEqual(fresh.series.map((one) => one.values));
  const half = assemble(building, other, { stepMinutes: 30, refine: 1, memory }).problem;
  expect(half.stepCount).toBe(2 * fresh.stepCount);
});
