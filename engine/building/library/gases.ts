import type { LibraryGas } from './types.ts';

/** Gases between panes; properties by `gasProperties` of the physics (EN 673:2011, Table 1). */
export const libraryGases: readonly LibraryGas[] = [
  { id: 'air', name: 'Air' },
  { id: 'argon', name: 'Argon' },
  { id: 'krypton', name: 'Krypton' },
  { id: 'xenon', name: 'Xenon' },
];
