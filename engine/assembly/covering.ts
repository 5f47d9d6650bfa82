// Blinds and shutters on either side of the glass: a face of their own that stands before the glass
// when drawn, and lies on it when not.
//
// The face that looks out (or into the room) is a node of its own. Not drawn, it is joined to the
// glass; drawn over a share s, the resistance s·R stands between: radiation and still air behind a
// blind, ΔR of ISO 10077-1 behind a shutter. Where the air behind a blind is open, glass and blind
// exchange with the air around as free plates, by natural convection (wind is taken to stay outside).
// One covered share s stands for the whole glass: a half-drawn covering adds half of the resistance.
import type { Covering } from '../building/index.ts';
import { shutterResistanceM2KPerW, thirdPowerFilm } from '../physics/index.ts';
import { gapLaw } from './gap-law.ts';
import type { FlowRef, NetworkBuilder, Provenance } from './network-builder.ts';
import { greyConductanceWPerM2K } from './radiant-law.ts';

export interface CoveringPlace {
  readonly side: 'outside' | 'inside';
  readonly areaM2: number;
  readonly tiltDeg: number;
  readonly heightM: number;
  readonly pressurePa: number;
  /** Of the glass that it covers. */
  readonly glassEmissivity: number;
  readonly glassNode: number;
  /** Air on the covering's side: outdoors, or the room's. */
  readonly airNode: number;
  /** From the glass, and how far the air behind is open; of blinds. */
  readonly distanceM: number;
  readonly openShare: number;
  readonly about: Pick<Provenance, 'name' | 'room' | 'surface'>;
}

/** The covering in the network. */
export interface CoveringParts {
  /** The face that looks away from the glass. */
  readonly node: number;
  /** Emissivity of that face when drawn. */
  readonly emissivity: number;
  /** Heat from glass and covering to the air beside, where it is open. */
  readonly toAir: readonly FlowRef[];
}

/** So good a contact that glass and face are one, 0.0001 m²K/W. */
const joinedWPerM2K = 1e4;

/** Adds a covering; `drawn` is its share in each step. */
export function addCovering(
  covering: Covering,
  place: CoveringPlace,
  drawn: Float64Array,
  builder: NetworkBuilder,
): CoveringParts {
  const { side, areaM2, glassNode, airNode, about } = place;
  const told = (what: string, method: string, inputs: Provenance['inputs'] = {}): Provenance => ({
    ...about,
    name: `${about.name}/${what}`,
    what,
    method,
    inputs: { areaM2, ...inputs },
  });
  const node = builder.node(
    told(`${covering.name}, ${side} face`, 'face of the covering, or of the glass where not drawn'),
    0,
  );
  if (covering.kind === 'shutter') {
    const added = shutterResistanceM2KPerW(covering.resistanceM2KPerW, covering.permeability);
    builder.functionLink(
      glassNode,
      node,
      (_a, _b, step) => areaM2 / (drawn[step] * added + 1 / joinedWPerM2K),
      told(`${covering.name} and the air behind`, 'added resistance, ISO 10077-1:2017', {
        addedM2KPerW: added,
      }),
    );
    return { node, emissivity: covering.emissivity, toAir: [] };
  }
  const { frontEmissivity, backEmissivity } = covering;
  const towardsGlass = side === 'outside' ? backEmissivity : frontEmissivity;
  const exchange = 1 / (1 / towardsGlass + 1 / place.glassEmissivity - 1);
  const still = gapLaw({ gas: 'air', thicknessM: place.distanceM }, place);
  const closed = 1 - place.openShare;
  // Glass and outer side keep their order for the gap's law: it asks which face is the warmer.
  const outward = side === 'outside';
  builder.functionLink(
    glassNode,
    node,
    (glassC, faceC, step) => {
      const s = drawn[step];
      if (s === 0) return areaM2 * joinedWPerM2K;
      const radiation = exchange * greyConductanceWPerM2K(glassC, faceC);
      const air =
        closed === 0
          ? 0
          : closed *
            (outward
              ? still.conductanceWPerM2K(faceC, glassC)
              : still.conductanceWPerM2K(glassC, faceC));
      return areaM2 / (s / (radiation + air) + 1 / joinedWPerM2K);
    },
    told(`radiation and still air behind ${covering.name}`, `two grey faces; ${still.method}`, {
      distanceM: place.distanceM,
      openShare: place.openShare,
    }),
  );
  if (place.openShare === 0)
    return { node, emissivity: outward ? frontEmissivity : backEmissivity, toAir: [] };
  // The glass turns the covering's side to the open air, the covering its back.
  const glassTilt = outward ? place.tiltDeg : 180 - place.tiltDeg;
  const toAir = (
    [
      [glassNode, glassTilt, 'glass to the air behind'],
      [node, 180 - glassTilt, 'back to the air behind'],
    ] as const
  ).map(([from, faceTiltDeg, what]) => {
    const film = thirdPowerFilm(faceTiltDeg);
    const wide = areaM2 * place.openShare;
    return builder.functionLink(
      from,
      airNode,
      (faceC, airC, step) => {
        const s = drawn[step];
        if (s === 0) return 0;
        const over = faceC - airC;
        const coefficient = over > 0 ? film.warmerFace : film.coolerFace;
        return s * wide * coefficient * Math.cbrt(Math.sqrt(over * over + 1e-6));
      },
      told(`${covering.name}, ${what}`, 'natural convection at a free plate (Walton 1983)', {
        openShare: place.openShare,
      }),
    );
  });
  return { node, emissivity: outward ? frontEmissivity : backEmissivity, toAir };
}
