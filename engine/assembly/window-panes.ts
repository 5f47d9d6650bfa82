// The panes of a window as nodes, two faces each, with their gaps; a blind may hang in one of them.
import type { CoveringOf, Opening, PaneGlazing } from '../building/index.ts';
import { gapLaw } from './gap-law.ts';
import type { FlowRef, NetworkBuilder, Provenance } from './network-builder.ts';
import { greyConductanceWPerM2K } from './radiant-law.ts';

/** The glass of a window in the network. */
export interface Glass {
  /** Outer and inner face node of each pane, outermost first. */
  readonly paneNodes: readonly (readonly [number, number])[];
  /** The blind between panes, or −1. */
  readonly blindNode: number;
  readonly outerEmissivity: number;
  readonly innerEmissivity: number;
  /** Conduction through the outermost pane, positive inwards: all heat through the glass. */
  readonly through: FlowRef;
}

/** A blind in gap `gap`, drawn in shares. */
export interface GapBlind {
  readonly covering: CoveringOf<'blind'>;
  readonly gap: number;
  readonly drawn: Float64Array;
}

interface PanePlace {
  readonly areaM2: number;
  readonly tiltDeg: number;
  readonly pressurePa: number;
  readonly about: Pick<Provenance, 'name' | 'room' | 'surface'>;
}

export function addPanes(
  glazing: PaneGlazing,
  opening: Opening,
  place: PanePlace,
  blind: GapBlind | null,
  builder: NetworkBuilder,
): Glass {
  const { areaM2, tiltDeg, pressurePa } = place;
  const about = (what: string, method: string, inputs: Provenance['inputs']): Provenance => ({
    ...place.about,
    what,
    method,
    inputs,
  });
  const through: FlowRef[] = [];
  const paneNodes = glazing.panes.map((pane, p): readonly [number, number] => {
    const half = (pane.thicknessM * pane.densityKgPerM3 * pane.specificHeatJPerKgK * areaM2) / 2;
    const face = (side: string) =>
      builder.node(
        {
          ...about(`${side} face of pane ${p + 1}`, 'half of the pane’s heat capacity', { areaM2 }),
          name: `${place.about.name}/pane ${p + 1} ${side}`,
        },
        half,
      );
    const nodes = [face('outer'), face('inner')] as const;
    const conductance = (pane.conductivityWPerMK / pane.thicknessM) * areaM2;
    through.push(
      builder.constantLink(
        nodes[0],
        nodes[1],
        conductance,
        about(`conduction through pane ${p + 1}`, 'steady conduction', {
          areaM2,
          thicknessM: pane.thicknessM,
          conductivityWPerMK: pane.conductivityWPerMK,
        }),
      ),
    );
    return nodes;
  });
  const heightM = opening.rectangle?.heightM ?? 1;
  let blindNode = -1;
  glazing.gaps.forEach((gap, g) => {
    const ends = [paneNodes[g][1], paneNodes[g + 1][0]] as const;
    const emissivities = [glazing.panes[g].backEmissivity, glazing.panes[g + 1].frontEmissivity];
    const where = { tiltDeg, heightM, pressurePa };
    if (blind?.gap === g) {
      blindNode = addGapBlind(gap, ends, emissivities, where, blind, areaM2, about, builder);
      return;
    }
    const law = gapLaw(gap, where);
    builder.functionLink(
      ends[0],
      ends[1],
      (a, b) => areaM2 * law.conductanceWPerM2K(a, b),
      about(`gas gap ${g + 1}, ${gap.gas}`, law.method, { areaM2, thicknessM: gap.thicknessM }),
      law.tableOf(areaM2),
    );
    const emittance = 1 / (1 / emissivities[0] + 1 / emissivities[1] - 1);
    builder.radiantLink(
      ends[0],
      ends[1],
      areaM2 * emittance,
      about(`radiation across gap ${g + 1}`, 'two parallel grey faces', {
        areaM2,
        effectiveEmissivity: emittance,
      }),
    );
  });
  return {
    paneNodes,
    blindNode,
    outerEmissivity: glazing.panes[0].frontEmissivity,
    innerEmissivity: glazing.panes[glazing.panes.length - 1].backEmissivity,
    through: through[0],
  };
}

/** Holds the blind at its outer pane's temperature while it is not drawn; no heat goes this way then. */
const idleWPerM2K = 10;

/**
 * A gap with a blind: not drawn, the gap as it is; drawn over a share s, s of the glass has two gaps of
 * half the thickness, pane to blind and blind to pane (the blind is sealed in and touches no air else).
 */
function addGapBlind(
  gap: PaneGlazing['gaps'][number],
  ends: readonly [number, number],
  emissivities: readonly number[],
  where: { readonly tiltDeg: number; readonly heightM: number; readonly pressurePa: number },
  blind: GapBlind,
  areaM2: number,
  about: (what: string, method: string, inputs: Provenance['inputs']) => Provenance,
  builder: NetworkBuilder,
): number {
  const { covering, drawn } = blind;
  const inputs = { areaM2, thicknessM: gap.thicknessM };
  const told = about(covering.name, 'blind between panes', inputs);
  const node = builder.node({ ...told, name: `${told.name}/blind` }, 0);
  const whole = gapLaw(gap, where);
  const half = gapLaw({ ...gap, thicknessM: gap.thicknessM / 2 }, where);
  const pair = (one: number, other: number) => 1 / (1 / one + 1 / other - 1);
  const bare = pair(emissivities[0], emissivities[1]);
  builder.functionLink(
    ends[0],
    ends[1],
    (a, b, step) =>
      drawn[step] === 1
        ? 0
        : areaM2 *
          (1 - drawn[step]) *
          (whole.conductanceWPerM2K(a, b) + bare * greyConductanceWPerM2K(a, b)),
    about('gap without its blind', `${whole.method}; two parallel grey faces`, inputs),
  );
  const sides = [
    [ends[0], node, pair(emissivities[0], covering.frontEmissivity)],
    [node, ends[1], pair(covering.backEmissivity, emissivities[1])],
  ] as const;
  sides.forEach(([outer, inner, exchange], side) => {
    const idle = side === 0 ? idleWPerM2K : 0;
    builder.functionLink(
      outer,
      inner,
      (a, b, step) => {
        const share = drawn[step];
        if (share === 0) return areaM2 * idle;
        const still = half.conductanceWPerM2K(a, b);
        return areaM2 * share * (still + exchange * greyConductanceWPerM2K(a, b));
      },
      about(`half of the gap beside ${covering.name}`, half.method, inputs),
    );
  });
  return node;
}
