// Thermal insulation. Conductivities are design values for ordinary products of the kind; a project
// should take those of the product that will be built in.
import { type MaterialRow, materialsOf, memory, practice, table4 } from './material-row.ts';
import { vapourTight } from './types.ts';

const rows: readonly MaterialRow[] = [
  ['mineral-wool-032', 'Mineral wool, 0.032', 0.032, 50, 1030, 1, table4],
  ['mineral-wool-035', 'Mineral wool, 0.035', 0.035, 30, 1030, 1, table4],
  ['mineral-wool-040', 'Mineral wool, 0.040', 0.04, 15, 1030, 1, table4],
  ['mineral-wool-board', 'Mineral wool board for render or flat roof', 0.038, 130, 1030, 1, table4],
  ['eps-031', 'Expanded polystyrene with graphite', 0.031, 18, 1450, 60, table4],
  ['eps-035', 'Expanded polystyrene, 0.035', 0.035, 20, 1450, 60, table4],
  ['eps-040', 'Expanded polystyrene, 0.040', 0.04, 15, 1450, 60, table4],
  ['xps-034', 'Extruded polystyrene', 0.034, 35, 1450, 150, table4],
  ['pur-023', 'Polyurethane board, foil faced', 0.023, 32, 1400, 60, table4],
  ['pur-028', 'Polyurethane board, 0.028', 0.028, 32, 1400, 60, table4],
  ['phenolic-021', 'Phenolic foam', 0.021, 40, 1400, 50, table4],
  ['cellular-glass', 'Cellular glass', 0.042, 120, 1000, vapourTight, table4],
  ['cellulose-blown', 'Cellulose, blown', 0.04, 50, 1600, 2, table4],
  ['wood-fibre-soft', 'Wood fibre mat', 0.039, 50, 2000, 5, practice],
  ['wood-fibre-board', 'Wood fibre board', 0.045, 160, 2000, 5, practice],
  ['wood-wool-board', 'Wood wool board', 0.09, 400, 1470, 5, table4],
  ['cork-board', 'Cork board, expanded', 0.045, 120, 1560, 10, table4],
  ['perlite-board', 'Expanded perlite board', 0.055, 150, 900, 5, table4],
  ['perlite-loose', 'Perlite, loose', 0.05, 90, 900, 2, table4],
  ['clay-aggregate-loose', 'Expanded clay, loose', 0.11, 350, 1000, 2, memory],
  [
    'calcium-silicate-board',
    'Calcium silicate board for inside lining',
    0.065,
    240,
    1000,
    5,
    memory,
  ],
  ['aerogel-mat', 'Aerogel mat', 0.016, 150, 1000, 5, memory],
  ['vacuum-panel', 'Vacuum panel, aged, edges counted', 0.008, 200, 800, vapourTight, memory],
  ['sheep-wool', 'Sheep wool', 0.04, 20, 1700, 1, memory],
  ['hemp-mat', 'Hemp mat', 0.042, 40, 1600, 1, memory],
  ['straw-bale', 'Straw bales', 0.055, 105, 2000, 2, memory],
  ['impact-mineral-wool', 'Mineral wool under screed', 0.035, 80, 1030, 1, table4],
];

export const insulationMaterials = materialsOf(rows);
