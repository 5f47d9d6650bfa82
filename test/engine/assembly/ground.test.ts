// Ground in the hourly run against ISO 13370 itself: the run may lag behind the standard's monthly
// figures by the soil that it simulates, but its year must come to the same.

import { describe, expect, test } from 'vitest';
import { coldestMonthOf, yearlyCycle } from '../../../engine/assembly/ground-climate.ts';
import { groundPart } from '../../../engine/assembly/ground-part.ts';
import { assemble, march } from '../../../engine/index.ts';
import {
  characteristicDimensionM,
  equivalentSoilM,
  groundMonthFlowW,
  insidePeriodicWPerK,
  slabOutsidePeriodicWPerK,
  slabUValueWPerM2K,
  yearlyPenetrationM,
} from '../../../engine/physics/index.ts';
import type { WeatherYear } from '../../../weather/index.ts';
import { caseName, expectCase, inputNumber, referenceCases } from '../../reference/cases.ts';
import {
  building,
  type Json,
  messages,
  monthSums,
  plainProject,
  plainRoom,
  plainYear,
  runYear,
} from './plain-room.ts';

/** A year whose air follows one cosine, coldest in mid-January: its monthly means are nearly so too. */
const wave = plainYear({ dryBulbC: (h) => 10 - 9 * Math.cos((2 * Math.PI * (h - 372)) / 8760) });

function onGround(contact: Json): Json {
  const room = plainRoom();
  room.surfaces[5].construction = 'floor';
  room.surfaces[5].boundary = { kind: 'ground-contact', contact: contact.id };
  room.heating = { setPointC: 20 };
  room.cooling = { setPointC: 20 };
  const project = plainProject([room], { groundContacts: [contact] });
  // Insulated: the run's inside film (convection and radiation) then hardly differs from 0.17 m²·K/W.
  project.constructions.push({
    id: 'floor',
    name: 'Floor',
    layers: [
      { name: 'insulation', resistanceM2KPerW: 4 },
      { material: 'concrete', thicknessM: 0.15 },
    ],
  });
  return project;
}

/** Hourly temperature of the floor's inside face. */
function floorFace(document: Json, weather: WeatherYear): { faceC: Float64Array } {
  const { problem, rooms } = assemble(building(document), weather, { stepMinutes: 60, refine: 1 });
  const run = march(problem, { toleranceK: 1e-6, maxIterations: 50 });
  const node = rooms[0].faces.find((face) => face.surface === 'floor')?.node ?? -1;
  const at = problem.recordNodes.indexOf(node);
  const width = problem.recordNodes.length;
  return { faceC: Float64Array.from({ length: run.records }, (_, h) => run.meanC[h * width + at]) };
}

const slab = { id: 'slab', kind: 'slab', areaM2: 80, perimeterM: 36, insideC: 20 };

// The same figures from the standard's equations, with the construction's 4.075 m²·K/W.
const soil = { conductivityWPerMK: 2, heatCapacityJPerM3K: 2e6 };
const d = equivalentSoilM(0.3, soil.conductivityWPerMK, 0.17, 4.075, 0.04);
const uValue = slabUValueWPerM2K(characteristicDimensionM(80, 36), 2, d);
const delta = yearlyPenetrationM(2, 2e6);
const cycle = {
  steadyWPerK: 80 * uValue,
  insidePeriodicWPerK: insidePeriodicWPerK(80, 2, d, delta),
  outsidePeriodicWPerK: slabOutsidePeriodicWPerK(36, 2, d, delta),
  leadMonths: 0,
  lagMonths: 1,
};

describe('a slab by ISO 13370', () => {
  const { findings, rooms } = runYear(onGround(slab), wave);
  const lossW = rooms[0].flowsW.ground;

  // The run's inside film is natural convection and radiation (0.4 to 0.5 m²·K/W at so small a flow),
  // the standard's 0.17. So that the ground alone is compared, the inside temperature is taken back from
  // the floor's face over 0.17 m²·K/W.
  const { faceC } = floorFace(onGround(slab), wave);
  const insideC = faceC.map((face, h) => face - (lossW[h] / 80) * 0.17);
  const monthHours = monthSums(new Float64Array(8760).fill(1));
  const insideMonthC = monthSums(insideC).map((sum, m) => sum / monthHours[m]);

  test('loses over the year what the standard says', () => {
    const meanC = insideC.reduce((sum, value) => sum + value, 0) / 8760;
    const yearKWh = -findings.rooms[0].balanceKWh.ground;
    const standardKWh = (cycle.steadyWPerK * (meanC - 10) * 8760) / 1000;
    expect(Math.abs(yearKWh / standardKWh - 1)).toBeLessThan(0.005);
  });

  test('follows the monthly flows, a little later for the soil under it', () => {
    const months = monthSums(lossW).map((sum, m) => -sum / monthHours[m]);
    // The room stays within 0.5 K over the year: its own swing adds H_pi·0.5 K, under 2 W, left out.
    const standard = months.map((_, m) =>
      groundMonthFlowW(
        cycle,
        { meanC: insideMonthC[m], amplitudeK: 0 },
        { meanC: 10, amplitudeK: 8.9 },
        m + 1,
        1,
      ),
    );
    const swing = (Math.max(...standard) - Math.min(...standard)) / 2;
    // 1 MJ/(m²·K) of soil between 1.1 and 4.5 m²·K/W delays by C·R·R'/(R + R') = 10 days, the slab above
    // by 2 more: 0.2 of a yearly swing. The room's own swing adds 0.03, the monthly steps some more.
    months.forEach((flow, m) => {
      expect(Math.abs(flow - standard[m])).toBeLessThan(0.25 * swing);
    });
  });

  test('names its inside temperature where none was given', () => {
    const { insideC: _, ...bare } = slab;
    const { findings: open } = runYear(onGround(bare), wave);
    expect(open.assumptions.join(' ')).toContain('at its heating set-point or the outdoor mean');
    expect(open.rooms[0].balanceKWh.ground).toBeCloseTo(findings.rooms[0].balanceKWh.ground, 6);
  });

  test('split over two rooms it loses the same', () => {
    // Both rooms carry half of area, perimeter and loss.
    const one = groundPart(
      { ...slab, kind: 'slab', soil, wallThicknessM: 0.3 },
      { areaM2: 80, upright: false, resistanceM2KPerW: 4.075, floorResistanceM2KPerW: 4.075 },
      3,
    );
    const half = groundPart(
      { ...slab, kind: 'slab', soil, wallThicknessM: 0.3 },
      { areaM2: 40, upright: false, resistanceM2KPerW: 4.075, floorResistanceM2KPerW: 4.075 },
      3,
    );
    expect(2 * half.cycle.steadyWPerK).toBeCloseTo(one.cycle.steadyWPerK, 9);
    expect(2 * half.cycle.outsidePeriodicWPerK).toBeCloseTo(one.cycle.outsidePeriodicWPerK, 9);
    expect(one.cycle).toEqual(cycle);
  });
});

describe('parts of contacts agree with the reference cases', () => {
  const file = '03-steady-u-values.json';
  for (const one of referenceCases(file, /^slab-edge-/))
    test(caseName(one), () => {
      const n = (key: string) => inputNumber(one, key);
      const part = groundPart(
        {
          id: 'x',
          kind: 'slab',
          soil,
          areaM2: n('area'),
          perimeterM: n('perimeter'),
          wallThicknessM: n('wall_thickness'),
          edgeInsulation: {
            kind: one.inputs.kind === 'vertical' ? 'vertical' : 'horizontal',
            reachM: n('D_edge'),
            resistanceM2KPerW: n('R_edge'),
            thicknessM: n('t_edge'),
          },
        },
        {
          areaM2: n('area'),
          upright: false,
          resistanceM2KPerW: n('R_f'),
          floorResistanceM2KPerW: n('R_f'),
        },
        4,
      );
      expectCase(
        one,
        { U_with_edge: part.uValueWPerM2K },
        {
          B: 'not handed out',
          d_t: 'not handed out',
          U: 'without the edge',
          psi_ge: 'not handed out',
        },
      );
    });
  for (const one of referenceCases(file, /^basement-/))
    test(caseName(one), () => {
      const n = (key: string) => inputNumber(one, key);
      const contact = {
        id: 'x',
        kind: 'heated-basement' as const,
        soil: { ...soil, conductivityWPerMK: n('lambda_ground') },
        areaM2: n('area'),
        perimeterM: n('perimeter'),
        wallThicknessM: n('wall_thickness'),
        depthM: n('z'),
      };
      const face = { resistanceM2KPerW: n('R_f'), floorResistanceM2KPerW: n('R_f') };
      const floor = groundPart(contact, { ...face, areaM2: n('area'), upright: false }, 4);
      const wallM2 = n('z') * n('perimeter');
      const wall = groundPart(
        contact,
        { ...face, areaM2: wallM2, upright: true, resistanceM2KPerW: n('R_w') },
        4,
      );
      expectCase(
        one,
        {
          U_bf: floor.uValueWPerM2K,
          U_bw: wall.uValueWPerM2K,
          H_g: floor.cycle.steadyWPerK + wall.cycle.steadyWPerK,
        },
        { B: 'not handed out', d_t: 'not handed out' },
      );
    });
  for (const one of referenceCases(file, /^suspended-/))
    test(caseName(one), () => {
      const n = (key: string) => inputNumber(one, key);
      const part = groundPart(
        {
          id: 'x',
          kind: 'suspended-floor',
          soil: { ...soil, conductivityWPerMK: n('lambda_ground') },
          areaM2: n('area'),
          perimeterM: n('perimeter'),
          wallThicknessM: n('wall_thickness'),
          floorHeightM: n('h_floor'),
          voidWallWPerM2K: n('U_wall_void'),
          ventAreaM2PerM: n('eps_vent'),
          shielding: 'average', // 0.05, as in the case
          baseResistanceM2KPerW: n('R_g'),
        },
        {
          areaM2: n('area'),
          upright: false,
          resistanceM2KPerW: n('R_f'),
          floorResistanceM2KPerW: n('R_f'),
        },
        n('wind'),
      );
      expectCase(
        one,
        { U: part.uValueWPerM2K, H_g: part.cycle.steadyWPerK },
        {
          B: 'not handed out',
          U_g: 'not handed out',
          U_x: 'not handed out',
          U_f: 'not handed out',
        },
      );
    });
});

test('the coldest month of a cosine is found where it was put, across the new year too', () => {
  const months = (at: number) =>
    Array.from({ length: 12 }, (_, m) => 9 - 8 * Math.cos((Math.PI / 6) * (m + 1 - at)));
  expect(coldestMonthOf(months(1))).toBeCloseTo(1, 12);
  expect(coldestMonthOf(months(7.25))).toBeCloseTo(7.25, 12);
  expect(coldestMonthOf(months(12))).toBeCloseTo(12, 12);
  expect(yearlyCycle(months(1)).meanC).toBeCloseTo(9, 12);
  expect(yearlyCycle(months(1)).amplitudeK).toBeCloseTo(8, 12);
});

test('a column of soil ends in the steady flow of its resistance', () => {
  const document = onGround({ id: 'column', kind: 'soil-column', depthM: 2, deepTemperatureC: 8 });
  const { rooms } = runYear(document, plainYear({ dryBulbC: 8 }));
  const last = 8759;
  const { faceC } = floorFace(document, plainYear({ dryBulbC: 8 }));
  const flowWPerM2 = -rooms[0].flowsW.ground[last] / 80;
  // Closed form: the series resistance below the floor's face; 2 m of soil have 1 m²·K/W.
  expect(flowWPerM2).toBeCloseTo((faceC[last] - 8) / (4.075 + 1), 3);
});

test('suspended floors and both basements run through the year', () => {
  for (const contact of [
    { ...slab, id: 'void', kind: 'suspended-floor' },
    { ...slab, id: 'cellar', kind: 'heated-basement', depthM: 2.4 },
    { ...slab, id: 'cellar', kind: 'unheated-basement', depthM: 2.2, volumeM3: 180 },
  ]) {
    const { findings } = runYear(onGround(contact), wave);
    const { ground } = findings.rooms[0].balanceKWh;
    expect(ground).toBeLessThan(-500);
    expect(findings.quality.relativeBalanceResidual).toBeLessThan(1e-9);
  }
});

test('contacts that are missing or too small are named', () => {
  const lost = onGround(slab);
  lost.rooms[0].surfaces[5].boundary.contact = 'slap';
  expect(messages(lost)).toEqual([
    'plain.json, rooms[0].surfaces[5].boundary.contact: found "slap", expected the id of a ground contact in this file. Did you mean "slab"?',
  ]);
  expect(messages(onGround({ ...slab, areaM2: 60 }))[0]).toContain('floors of 80 m² on it');
});
