// Windows: each pane with its two faces as nodes, gaps by convection and radiation, sun by angle.
import {
  type Building,
  glazingOf,
  type Opening,
  type Pane,
  type PaneGlazing,
  type Room,
  type Surface,
} from '../building/index.ts';
import {
  type GlazingAngles,
  glassPane,
  glazingAngles,
  type PaneOptics,
  type ShadedWindow,
} from '../physics/index.ts';
import { addOuterExchange, faceHeightM } from './fabric.ts';
import { gapLaw } from './gap-law.ts';
import type { NetworkBuilder, Provenance } from './network-builder.ts';
import type { Outdoors } from './outdoors.ts';
import type { Face } from './room-parts.ts';
import { type FaceSun, shadedOpening } from './shading.ts';
import { addSimpleWindow } from './simple-window.ts';

/** A window in the network, and how it deals with the sun. */
export interface WindowParts {
  readonly face: Face;
  readonly opening: Opening;
  readonly areaM2: number;
  readonly sun: FaceSun;
  /** The glass with what stands before it, or null. */
  readonly shaded: ShadedWindow | null;
  /** Outer and inner face node of each pane, outermost first; the same node twice where a pane is one node. */
  readonly paneNodes: readonly (readonly [number, number])[];
  readonly optics: GlazingAngles;
}

/** Optics of a pane as given: by its coating's values, or as clear glass of its transmittance. */
export function paneOptics(pane: Pane): PaneOptics {
  const { solarTransmittance, frontSolarReflectance, backSolarReflectance, refractiveIndex } = pane;
  if (frontSolarReflectance === undefined && backSolarReflectance === undefined)
    return glassPane(solarTransmittance, refractiveIndex);
  return {
    kind: 'coated',
    transmittance: solarTransmittance,
    frontReflectance: frontSolarReflectance ?? backSolarReflectance ?? 0,
    backReflectance: backSolarReflectance ?? frontSolarReflectance ?? 0,
  };
}

/** Middle of an opening above the ground outside [m]. */
function openingHeightM(room: Room, surface: Surface, opening: Opening): number {
  const middleM = faceHeightM(room, surface);
  const wallM = room.box?.heightM;
  if (!opening.rectangle || wallM === undefined || surface.tiltDeg < 45) return middleM;
  return middleM - wallM / 2 + opening.rectangle.bottomM + opening.rectangle.heightM / 2;
}

/** Adds a window with its outer and inner sides; the room adds what happens inside. */
export function addWindow(
  building: Building,
  room: Room,
  surface: Surface,
  opening: Opening,
  outside: Outdoors,
  builder: NetworkBuilder,
  site: { readonly pressurePa: number },
): WindowParts {
  const glazing = glazingOf(building, opening.glazing);
  const name = `${room.id}/${surface.id}/${opening.id}`;
  const place = { name, room: room.id, surface: surface.id };
  const { tiltDeg, azimuthDeg } = surface;
  const { areaM2 } = opening;
  const glass =
    glazing.kind === 'panes'
      ? addPanes(glazing, opening, tiltDeg, place, builder, site)
      : addSimpleWindow(glazing, opening, place, builder);
  addOuterExchange(
    building,
    {
      node: glass.paneNodes[0][0],
      areaM2,
      tiltDeg,
      azimuthDeg,
      heightM: openingHeightM(room, surface, opening),
      emissivity: glass.outerEmissivity,
      roughness: 1,
      about: place,
    },
    outside,
    builder,
  );
  const shaded = shadedOpening(room, surface, opening);
  const fromInside = glass.optics.diffuseFromInside;
  const face: Face = {
    node: glass.paneNodes[glass.paneNodes.length - 1][1],
    surface: surface.id,
    opening: opening.id,
    name,
    areaM2,
    tiltDeg,
    azimuthDeg,
    emissivity: glass.innerEmissivity,
    balance: 'glazing',
    boundary: surface.boundary.kind,
    light: {
      absorbed: fromInside.absorptance.reduce((sum, a) => sum + a, 0),
      transmitted: fromInside.transmittance,
    },
    ...(opening.rectangle ? { rectangle: opening.rectangle } : {}),
  };
  return {
    face,
    opening,
    areaM2,
    sun: outside.sunOn(surface, shaded),
    shaded,
    paneNodes: glass.paneNodes,
    optics: glass.optics,
  };
}

/** What either kind of glazing gives back. */
export interface Glass {
  readonly paneNodes: readonly (readonly [number, number])[];
  readonly optics: GlazingAngles;
  readonly outerEmissivity: number;
  readonly innerEmissivity: number;
}

function addPanes(
  glazing: PaneGlazing,
  opening: Opening,
  tiltDeg: number,
  place: Pick<Provenance, 'name' | 'room' | 'surface'>,
  builder: NetworkBuilder,
  site: { readonly pressurePa: number },
): Glass {
  const { areaM2 } = opening;
  const about = (what: string, method: string, inputs: Provenance['inputs']): Provenance => ({
    ...place,
    what,
    method,
    inputs,
  });
  const paneNodes = glazing.panes.map((pane, p): readonly [number, number] => {
    const half = (pane.thicknessM * pane.densityKgPerM3 * pane.specificHeatJPerKgK * areaM2) / 2;
    const face = (side: string) =>
      builder.node(
        {
          ...about(`${side} face of pane ${p + 1}`, 'half of the pane’s heat capacity', { areaM2 }),
          name: `${place.name}/pane ${p + 1} ${side}`,
        },
        half,
      );
    const nodes = [face('outer'), face('inner')] as const;
    const conductance = (pane.conductivityWPerMK / pane.thicknessM) * areaM2;
    builder.constantLink(
      nodes[0],
      nodes[1],
      conductance,
      about(`conduction through pane ${p + 1}`, 'steady conduction', {
        areaM2,
        thicknessM: pane.thicknessM,
        conductivityWPerMK: pane.conductivityWPerMK,
      }),
    );
    return nodes;
  });
  const heightM = opening.rectangle?.heightM ?? 1;
  glazing.gaps.forEach((gap, g) => {
    const [outer, inner] = [paneNodes[g][1], paneNodes[g + 1][0]];
    const law = gapLaw(gap, { tiltDeg, heightM, pressurePa: site.pressurePa });
    builder.functionLink(
      outer,
      inner,
      (a, b) => areaM2 * law.conductanceWPerM2K(a, b),
      about(`gas gap ${g + 1}, ${gap.gas}`, law.method, { areaM2, thicknessM: gap.thicknessM }),
    );
    const emittance =
      1 / (1 / glazing.panes[g].backEmissivity + 1 / glazing.panes[g + 1].frontEmissivity - 1);
    builder.radiantLink(
      outer,
      inner,
      areaM2 * emittance,
      about(`radiation across gap ${g + 1}`, 'two parallel grey faces', {
        areaM2,
        effectiveEmissivity: emittance,
      }),
    );
  });
  return {
    paneNodes,
    optics: glazingAngles(glazing.panes.map(paneOptics)),
    outerEmissivity: glazing.panes[0].frontEmissivity,
    innerEmissivity: glazing.panes[glazing.panes.length - 1].backEmissivity,
  };
}
