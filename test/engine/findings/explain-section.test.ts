import { expect, test } from 'vitest';
import { constructionSection, parseProject } from '../../../engine/index.ts';
import { sampleText } from '../../app/sample.ts';

// Expected values from the closed form of ISO 6946 and ISO 13788: films 0.13 and 0.04 m²K/W for a wall,
// temperature linear in resistance, vapour pressure linear in s_d.

const climate = { insideC: 20, outsideC: -5, insideHumidity: 0.5, outsideHumidity: 0.8 };

function section(layers: readonly object[], materials: readonly object[] = []) {
  const brick = {
    id: 'brick',
    name: 'Brick',
    conductivityWPerMK: 0.5,
    densityKgPerM3: 1700,
    specificHeatJPerKgK: 900,
    vapourResistanceFactor: 10,
  };
  const text = sampleText({
    materials: [brick, ...materials],
    constructions: [{ id: 'brick-wall', name: 'Wall', layers }],
  });
  const parsed = parseProject(text, 'a');
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.faults));
  const [wall] = parsed.value.constructions;
  return constructionSection(parsed.value, wall, 'horizontal', 'outdoors', climate);
}

test('temperatures fall by resistance: films, layers and planes share 25 K', () => {
  const { layers, outerFaceC, innerFaceC } = section([
    { name: 'board', resistanceM2KPerW: 0.83, vapourSdM: 1 },
    { material: 'brick', thicknessM: 0.25 },
  ]);
  const flux = 25 / (0.04 + 0.83 + 0.5 + 0.13); // 16.667 W/m²
  expect(outerFaceC).toBeCloseTo(-5 + flux * 0.04, 9);
  expect(layers[0].innerC).toBeCloseTo(-5 + flux * 0.87, 9);
  expect(layers[1].outerC).toBe(layers[0].innerC);
  expect(innerFaceC).toBeCloseTo(20 - flux * 0.13, 9);
});

test('the dew point runs from outside to inside air, level across a layer that lets vapour through', () => {
  const { layers, insideDewPointC, outsideDewPointC } = section([
    { name: 'open', resistanceM2KPerW: 1, vapourSdM: 0 },
    { material: 'brick', thicknessM: 0.2 },
  ]);
  // 20 °C and 50 %: dew point 9.3 °C (psychrometric table); −5 °C and 80 %: below −5 °C.
  expect(insideDewPointC).toBeCloseTo(9.3, 1);
  expect(outsideDewPointC).toBeLessThan(-5);
  const [open, brick] = layers.map((layer) => layer.dewPointC ?? []);
  expect(open[0]).toBeCloseTo(outsideDewPointC, 3);
  expect(open.at(-1)).toBeCloseTo(outsideDewPointC, 3);
  expect(brick.at(-1)).toBeCloseTo(insideDewPointC, 9);
});

test('a material without vapour data is named, and no dew point is drawn', () => {
  const wool = {
    id: 'wool',
    name: 'Wool',
    conductivityWPerMK: 0.04,
    densityKgPerM3: 40,
    specificHeatJPerKgK: 1000,
  };
  const { layers, vapourUnknown } = section([{ material: 'wool', thicknessM: 0.1 }], [wool]);
  expect(vapourUnknown).toEqual(['Wool']);
  expect(layers[0].dewPointC).toBeNull();
});
