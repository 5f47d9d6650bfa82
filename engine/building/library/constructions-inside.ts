// Floors to outside and to the ground, floors between rooms, partitions. Floors run from below (outside,
// soil, or the room underneath) to above.
import { air, construction, mm } from './construction-row.ts';
import type { LibraryConstruction } from './types.ts';

const finish = [mm('screed-cement', 60), mm('tile-ceramic', 10)];

export const floorConstructions: readonly LibraryConstruction[] = [
  construction(
    'ground floor',
    'ground-slab-bare',
    'Concrete slab on the ground, no insulation',
    [2.5, 4],
    [mm('concrete-reinforced-1', 150), mm('screed-cement', 50)],
  ),
  construction(
    'ground floor',
    'ground-slab-80',
    'Concrete slab, 8 cm foam under screed',
    [0.35, 0.45],
    [mm('concrete-reinforced-1', 150), mm('eps-035', 80), ...finish],
  ),
  construction(
    'ground floor',
    'ground-slab-200',
    'Concrete slab on 20 cm foam',
    [0.14, 0.18],
    [mm('xps-034', 200), mm('concrete-reinforced-1', 250), ...finish],
  ),
  construction(
    'ground floor',
    'ground-slab-old-timber',
    'Boards on sleepers over a slab, 1930s',
    [1.2, 2],
    [mm('concrete-2200', 100), air(50), mm('timber-500', 24)],
  ),
  construction(
    'ground floor',
    'ground-suspended-timber',
    'Suspended timber floor, 15 cm wool',
    [0.24, 0.32],
    [mm('framed-wool-035', 150), mm('timber-500', 22)],
  ),
  construction(
    'floor',
    'floor-exposed-concrete-160',
    'Floor over open air, 16 cm wool board',
    [0.2, 0.25],
    [
      mm('plaster-cement-sand', 8),
      mm('mineral-wool-board', 160),
      mm('concrete-reinforced-1', 200),
      ...finish,
    ],
    { sun: 0.4, rough: 'medium rough' },
  ),
  construction(
    'floor',
    'floor-exposed-timber-200',
    'Timber floor over open air, 20 cm wool',
    [0.18, 0.25],
    [mm('osb', 15), mm('framed-wool-035', 200), mm('osb', 22), mm('linoleum', 4)],
  ),
];

export const insideConstructions: readonly LibraryConstruction[] = [
  construction(
    'intermediate floor',
    'between-concrete',
    'Concrete floor with floating screed',
    [0.65, 1],
    [
      mm('plaster-gypsum-1000', 10),
      mm('concrete-reinforced-1', 200),
      mm('impact-mineral-wool', 30),
      mm('screed-cement', 60),
    ],
  ),
  construction(
    'intermediate floor',
    'between-timber',
    'Timber joist floor',
    [0.9, 1.5],
    [mm('plasterboard-700', 13), air(200), mm('osb', 22), mm('carpet', 6)],
  ),
  construction(
    'partition',
    'partition-plasterboard',
    'Plasterboard on studs, empty',
    [1.5, 2.1],
    [mm('plasterboard-700', 13), air(75), mm('plasterboard-700', 13)],
  ),
  construction(
    'partition',
    'partition-plasterboard-wool',
    'Plasterboard on studs, 6 cm wool',
    [0.4, 0.6],
    [mm('plasterboard-700', 25), mm('mineral-wool-040', 60), mm('plasterboard-700', 25)],
  ),
  construction(
    'partition',
    'partition-block-100',
    'Concrete block 10 cm, plastered',
    [1.9, 2.6],
    [mm('plaster-gypsum-1300', 13), mm('block-medium', 100), mm('plaster-gypsum-1300', 13)],
  ),
  construction(
    'partition',
    'partition-brick-115',
    'Brick 11.5 cm, plastered',
    [1.9, 2.7],
    [mm('plaster-lime-sand', 10), mm('brick-hollow', 115), mm('plaster-lime-sand', 10)],
  ),
  construction(
    'partition',
    'partition-silicate-240',
    'Calcium silicate 24 cm, plastered',
    [1.6, 2.1],
    [
      mm('plaster-gypsum-1000', 10),
      mm('calcium-silicate-1800', 240),
      mm('plaster-gypsum-1000', 10),
    ],
  ),
  construction(
    'partition',
    'partition-concrete-200',
    'Concrete 20 cm',
    [2.4, 3.1],
    [mm('concrete-reinforced-1', 200)],
  ),
  construction(
    'partition',
    'partition-cross-laminated',
    'Cross-laminated timber 10 cm',
    [0.8, 1.1],
    [mm('cross-laminated-timber', 100)],
  ),
];
