// Glass, metals, plastics, roof and floor coverings, sheets.
import { type MaterialRow, materialsOf, practice, table3 } from './material-row.ts';
import { vapourTight } from './types.ts';

const metals: readonly MaterialRow[] = [
  ['steel', 'Steel', 50, 7800, 450, vapourTight, table3],
  ['stainless-steel', 'Stainless steel, austenitic', 17, 7900, 500, vapourTight, table3],
  ['aluminium', 'Aluminium alloy', 160, 2800, 880, vapourTight, table3],
  ['copper', 'Copper', 380, 8900, 380, vapourTight, table3],
  ['zinc', 'Zinc', 110, 7200, 380, vapourTight, table3],
  ['lead', 'Lead', 35, 11300, 130, vapourTight, table3],
  ['glass', 'Soda-lime glass', 1.0, 2500, 750, vapourTight, table3],
];

const plastics: readonly MaterialRow[] = [
  ['pvc', 'Polyvinyl chloride', 0.17, 1390, 900, 50000, table3],
  ['acrylic-sheet', 'Polymethyl methacrylate sheet', 0.18, 1180, 1500, 50000, table3],
  ['polycarbonate', 'Polycarbonate', 0.2, 1200, 1200, 5000, table3],
  ['polyethylene-sheet', 'Polyethylene sheet', 0.33, 920, 2200, 100000, table3],
  ['rubber', 'Rubber covering', 0.17, 1200, 1400, 10000, table3],
  ['epdm', 'Ethylene propylene rubber', 0.25, 1150, 1000, 6000, table3],
];

const coverings: readonly MaterialRow[] = [
  ['bitumen-felt', 'Bitumen felt', 0.23, 1100, 1000, 50000, table3],
  ['asphalt', 'Asphalt', 0.7, 2100, 1000, 50000, table3],
  ['roof-tile-clay', 'Clay roof tiles', 1.0, 2000, 800, 30, table3],
  ['roof-tile-concrete', 'Concrete roof tiles', 1.5, 2100, 1000, 60, table3],
  ['tile-ceramic', 'Ceramic tiles', 1.3, 2300, 840, vapourTight, table3],
  ['linoleum', 'Linoleum', 0.17, 1200, 1400, 1000, table3],
  ['floor-plastic', 'Plastic floor covering', 0.25, 1700, 1400, 10000, table3],
  ['carpet', 'Carpet', 0.06, 200, 1300, 5, table3],
  ['cork-tile', 'Cork tiles', 0.065, 450, 1500, 40, table3],
  ['fibre-cement', 'Fibre-cement sheet', 0.58, 1800, 1000, 50, practice],
  ['green-roof-substrate', 'Planted roof substrate, moist', 0.6, 1200, 1500, 5, practice],
];

export const sheetMaterials = materialsOf([...metals, ...plastics, ...coverings]);
