// Roofs and ceilings under roofs, from outside to inside. Ventilated tiles and their air are left out,
// as ISO 6946 has it for well ventilated layers; the outer face is then the underlay.
import { air, construction, mm } from './construction-row.ts';
import type { LibraryConstruction } from './types.ts';

const tiles = { sun: 0.7, rough: 'rough' } as const;
const felt = { sun: 0.85, rough: 'rough' } as const;
const gravel = { sun: 0.6, rough: 'very rough' } as const;

export const roofConstructions: readonly LibraryConstruction[] = [
  construction(
    'roof',
    'roof-pitched-bare',
    'Pitched roof, boards only',
    [2.2, 3.6],
    [mm('bitumen-felt', 3), mm('timber-500', 24)],
    tiles,
  ),
  construction(
    'roof',
    'roof-pitched-120',
    'Pitched roof, 12 cm between rafters',
    [0.32, 0.42],
    [mm('fibreboard-400', 6), mm('framed-wool-040', 120), air(25), mm('plasterboard-700', 13)],
    tiles,
  ),
  construction(
    'roof',
    'roof-pitched-220',
    'Pitched roof, 22 cm between rafters',
    [0.16, 0.21],
    [
      mm('wood-fibre-board', 35),
      mm('framed-wool-035', 220),
      mm('osb', 15),
      air(25),
      mm('plasterboard-700', 13),
    ],
    tiles,
  ),
  construction(
    'roof',
    'roof-pitched-on-rafters',
    'Pitched roof, 16 cm board on the rafters',
    [0.13, 0.17],
    [mm('pur-023', 160), mm('timber-500', 20)],
    tiles,
  ),
  construction(
    'roof',
    'roof-loft-100',
    'Ceiling under a cold loft, 10 cm wool',
    [0.32, 0.42],
    [mm('mineral-wool-040', 100), mm('plasterboard-700', 13)],
    tiles,
  ),
  construction(
    'roof',
    'roof-loft-300',
    'Ceiling under a cold loft, 30 cm wool',
    [0.11, 0.15],
    [mm('mineral-wool-040', 300), mm('plasterboard-700', 13)],
    tiles,
  ),
  construction(
    'roof',
    'roof-flat-concrete-old',
    'Flat concrete roof, 4 cm foam, 1970s',
    [0.6, 0.9],
    [
      mm('bitumen-felt', 10),
      mm('eps-040', 40),
      mm('concrete-reinforced-1', 160),
      mm('plaster-gypsum-1000', 10),
    ],
    felt,
  ),
  construction(
    'roof',
    'roof-flat-concrete-200',
    'Flat concrete roof, 20 cm foam',
    [0.14, 0.19],
    [
      mm('bitumen-felt', 10),
      mm('eps-035', 200),
      mm('concrete-reinforced-1', 200),
      mm('plaster-gypsum-1000', 10),
    ],
    felt,
  ),
  construction(
    'roof',
    'roof-flat-inverted',
    'Inverted flat roof, 20 cm foam under gravel',
    [0.14, 0.19],
    [
      mm('gravel-dry', 50),
      mm('xps-034', 200),
      mm('bitumen-felt', 10),
      mm('concrete-reinforced-1', 200),
    ],
    gravel,
  ),
  construction(
    'roof',
    'roof-flat-timber',
    'Flat timber roof, 24 cm wool',
    [0.17, 0.22],
    [mm('bitumen-felt', 8), mm('osb', 22), mm('framed-wool-035', 240), mm('plasterboard-700', 13)],
    felt,
  ),
  construction(
    'roof',
    'roof-planted',
    'Planted roof, 20 cm foam',
    [0.13, 0.19],
    [
      mm('green-roof-substrate', 100),
      mm('bitumen-felt', 10),
      mm('eps-035', 200),
      mm('concrete-reinforced-1', 200),
    ],
    { sun: 0.75, rough: 'very rough' },
  ),
  construction(
    'roof',
    'roof-steel-deck-120',
    'Steel deck, 12 cm wool board',
    [0.27, 0.34],
    [mm('epdm', 1.5), mm('mineral-wool-board', 120), mm('steel', 0.9)],
    { sun: 0.85, rough: 'smooth' },
  ),
];
