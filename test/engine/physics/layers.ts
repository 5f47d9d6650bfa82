// Layers of the reference cases (inside to outside) as ours (outside to inside).
import type { Layer } from '../../../engine/physics/conduction-mesh.ts';
import type { ReferenceCase } from '../../reference/cases.ts';

interface GivenLayer {
  readonly d: number;
  readonly lambda: number;
  readonly rho: number;
  readonly c: number;
  readonly R?: number;
}

export function caseLayers(one: ReferenceCase): Layer[] {
  const given = one.inputs.layers as unknown as readonly GivenLayer[];
  const layers = given.map((g): Layer => {
    if (g.R !== undefined) return { kind: 'resistance', resistanceM2KPerW: g.R };
    return solid(g.d, g.lambda, g.rho, g.c);
  });
  return layers.reverse();
}

export function solid(d: number, lambda: number, rho: number, c: number): Layer {
  return {
    kind: 'solid',
    thicknessM: d,
    conductivityWPerMK: lambda,
    densityKgPerM3: rho,
    specificHeatJPerKgK: c,
  };
}
