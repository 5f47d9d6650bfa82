// Materials and constructions of the benchmark family; layers from side A to side B.

interface Material {
  /** W/(m·K), kg/m³, J/(kg·K). */
  readonly conductivity: number;
  readonly density: number;
  readonly heat: number;
}

const material = (conductivity: number, density: number, heat: number): Material => ({
  conductivity,
  density,
  heat,
});

export const materials = {
  render: material(0.9, 1800, 1000),
  eps: material(0.035, 25, 1450),
  brick: material(0.7, 1700, 900),
  plaster: material(0.7, 1400, 1000),
  cladding: material(0.13, 500, 1600),
  osb: material(0.13, 650, 1700),
  wool: material(0.038, 40, 1000),
  gypsum: material(0.25, 900, 1000),
  screed: material(1.4, 2000, 1000),
  concrete: material(2.0, 2300, 1000),
  soil: material(1.5, 2000, 1000),
  roofing: material(0.23, 1100, 1000),
} as const;

/** Thickness [m], slices, material. */
export type Layers = readonly (readonly [number, number, keyof typeof materials])[];

export const constructions = {
  heavyWall: [
    [0.01, 1, 'render'],
    [0.12, 3, 'eps'],
    [0.2, 4, 'brick'],
    [0.015, 1, 'plaster'],
  ],
  timberWall: [
    [0.02, 1, 'cladding'],
    [0.018, 1, 'osb'],
    [0.2, 4, 'wool'],
    [0.0125, 1, 'gypsum'],
  ],
  groundFloor: [
    [0.5, 3, 'soil'],
    [0.2, 3, 'concrete'],
    [0.1, 3, 'eps'],
    [0.06, 2, 'screed'],
  ],
  roof: [
    [0.01, 1, 'roofing'],
    [0.2, 4, 'eps'],
    [0.2, 4, 'concrete'],
    [0.01, 1, 'plaster'],
  ],
  brickPartition: [
    [0.015, 1, 'plaster'],
    [0.115, 3, 'brick'],
    [0.015, 1, 'plaster'],
  ],
  lightPartition: [
    [0.0125, 1, 'gypsum'],
    [0.075, 3, 'wool'],
    [0.0125, 1, 'gypsum'],
  ],
  slab: [
    [0.01, 1, 'plaster'],
    [0.2, 4, 'concrete'],
    [0.03, 1, 'eps'],
    [0.06, 2, 'screed'],
  ],
} as const satisfies Record<string, Layers>;
