// Concrete, stone, masonry, gypsum and plaster, soil.
import { type MaterialRow, materialsOf, memory, practice, table3 } from './material-row.ts';

const din = 'DIN 4108-4 design value, from memory';

const concrete: readonly MaterialRow[] = [
  ['concrete-1800', 'Concrete, 1800 kg/m³', 1.15, 1800, 1000, 100, table3],
  ['concrete-2000', 'Concrete, 2000 kg/m³', 1.35, 2000, 1000, 100, table3],
  ['concrete-2200', 'Concrete, 2200 kg/m³', 1.65, 2200, 1000, 120, table3],
  ['concrete-2400', 'Concrete, dense', 2.0, 2400, 1000, 130, table3],
  ['concrete-reinforced-1', 'Concrete with 1 % steel', 2.3, 2300, 1000, 130, table3],
  ['concrete-reinforced-2', 'Concrete with 2 % steel', 2.5, 2400, 1000, 130, table3],
  ['concrete-lightweight', 'Lightweight aggregate concrete', 0.55, 1400, 1000, 60, practice],
  ['screed-cement', 'Cement screed', 1.4, 2000, 1000, 35, din],
  ['screed-anhydrite', 'Calcium sulphate screed', 1.2, 2100, 1000, 25, din],
];

const stone: readonly MaterialRow[] = [
  ['stone-granite', 'Granite', 2.8, 2600, 1000, 10000, table3],
  ['stone-basalt', 'Basalt', 3.5, 2850, 1000, 10000, table3],
  ['stone-marble', 'Marble', 3.5, 2800, 1000, 10000, table3],
  ['stone-slate', 'Slate', 2.2, 2400, 1000, 1000, table3],
  ['stone-sandstone', 'Sandstone', 2.3, 2600, 1000, 40, table3],
  ['stone-limestone-soft', 'Limestone, soft', 1.1, 1800, 1000, 40, table3],
  ['stone-limestone-hard', 'Limestone, hard', 1.7, 2200, 1000, 200, table3],
  ['stone-artificial', 'Artificial stone', 1.3, 1750, 1000, 50, table3],
];

const masonry: readonly MaterialRow[] = [
  ['brick-outer', 'Clay brickwork, outer leaf', 0.77, 1750, 1000, 16, practice],
  ['brick-inner', 'Clay brickwork, inner leaf', 0.56, 1750, 1000, 16, practice],
  ['brick-solid', 'Clay brickwork, solid, 1800 kg/m³', 0.81, 1800, 1000, 10, din],
  ['brick-hollow', 'Hollow clay brickwork, 1200 kg/m³', 0.5, 1200, 1000, 10, din],
  ['brick-insulating', 'Insulating clay brickwork, 700 kg/m³', 0.12, 700, 1000, 10, practice],
  ['brick-clinker', 'Clinker brickwork', 0.96, 2000, 1000, 100, din],
  ['calcium-silicate-1400', 'Calcium silicate brickwork, 1400 kg/m³', 0.7, 1400, 1000, 10, din],
  ['calcium-silicate-1800', 'Calcium silicate brickwork, 1800 kg/m³', 0.99, 1800, 1000, 25, din],
  ['block-dense', 'Concrete block, dense', 1.13, 2000, 1000, 15, practice],
  ['block-medium', 'Concrete block, medium', 0.51, 1400, 1000, 10, practice],
  ['block-light', 'Concrete block, lightweight', 0.19, 600, 1000, 10, practice],
  ['aerated-concrete-350', 'Aerated concrete, 350 kg/m³', 0.09, 350, 1000, 10, practice],
  ['aerated-concrete-500', 'Aerated concrete, 500 kg/m³', 0.13, 500, 1000, 10, practice],
  ['rammed-earth', 'Rammed earth', 1.1, 2000, 1000, 10, memory],
  ['adobe', 'Clay bricks, unfired', 0.66, 1500, 1000, 10, memory],
];

const plaster: readonly MaterialRow[] = [
  ['plasterboard-700', 'Gypsum plasterboard, 700 kg/m³', 0.21, 700, 1000, 10, table3],
  ['plasterboard-900', 'Gypsum plasterboard, 900 kg/m³', 0.25, 900, 1000, 10, table3],
  ['gypsum-fibreboard', 'Gypsum fibreboard', 0.32, 1150, 1100, 13, memory],
  ['plaster-gypsum-light', 'Gypsum insulating plaster', 0.18, 600, 1000, 10, table3],
  ['plaster-gypsum-1000', 'Gypsum plaster, 1000 kg/m³', 0.4, 1000, 1000, 10, table3],
  ['plaster-gypsum-1300', 'Gypsum plaster, 1300 kg/m³', 0.57, 1300, 1000, 10, table3],
  ['plaster-gypsum-sand', 'Gypsum and sand plaster', 0.8, 1600, 1000, 10, table3],
  ['plaster-lime-sand', 'Lime and sand plaster', 0.8, 1600, 1000, 10, table3],
  ['plaster-cement-sand', 'Cement and sand render', 1.0, 1800, 1000, 10, table3],
  ['plaster-clay', 'Clay plaster', 0.66, 1500, 1000, 10, memory],
];

const ground: readonly MaterialRow[] = [
  ['soil-clay', 'Clay or silt', 1.5, 1500, 2000, 50, table3],
  ['soil-sand', 'Sand and gravel', 2.0, 1950, 1000, 50, table3],
  ['soil-rock', 'Homogeneous rock', 3.5, 2700, 800, 10000, memory],
  ['gravel-dry', 'Gravel bed, dry', 0.7, 1800, 1000, 3, memory],
];

export const mineralMaterials = materialsOf([
  ...concrete,
  ...stone,
  ...masonry,
  ...plaster,
  ...ground,
]);
