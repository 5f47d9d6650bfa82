// What each window is worth as a whole: U by ISO 10077-1, g with its frame, and with its blind drawn.
import { coveredLight, windowSize } from '../assembly/index.ts';
import {
  type Building,
  type Covering,
  coveringOf,
  type Glazing,
  glazingOf,
  type Opening,
} from '../building/index.ts';
import {
  airLayerConvectionWPerM2K,
  type BlindPosition,
  blackRadiativeWPerM2K,
  glazingOutsideWPerM2K,
  layerChainHeat,
  layeredSolarFactor,
  parallelEmittance,
  plainGlassEmissivity,
  shutteredUValueWPerM2K,
  shutterResistanceM2KPerW,
  simpleGlazing,
  windowUValueWPerM2K,
} from '../physics/index.ts';
import {
  explainedOnce,
  explainGlazing,
  type GlazingExplained,
  standardTransmittance,
} from './explain-glazing.ts';

export interface WindowExplained {
  readonly room: string;
  readonly surface: string;
  readonly opening: string;
  readonly areaM2: number;
  readonly glassAreaM2: number;
  readonly frameAreaM2: number;
  readonly edgeLengthM: number;
  readonly glazing: string;
  readonly glassUValueWPerM2K: number;
  /** ISO 10077-1, upright. */
  readonly uValueWPerM2K: number;
  /** Sun on the whole window that reaches the room, normal incidence: glass, and α·U_f/h_e of the frame. */
  readonly gValue: number;
  /** g of the glass with the blind drawn; null without blind. */
  readonly blindGValue: number | null;
  /** With night insulation closed; null without. */
  readonly insulatedUValueWPerM2K: number | null;
}

export function explainWindows(building: Building): WindowExplained[] {
  const explain = explainedOnce();
  return building.rooms.flatMap((room) =>
    room.surfaces.flatMap((surface) =>
      surface.openings.map((opening) =>
        explainWindow(building, room.id, surface.id, opening, explain),
      ),
    ),
  );
}

export function explainWindow(
  building: Building,
  room: string,
  surface: string,
  opening: Opening,
  explain: (glazing: Glazing) => GlazingExplained = explainGlazing,
): WindowExplained {
  const glazing = glazingOf(building, opening.glazing);
  const size = windowSize(opening);
  const { uValueWPerM2K: glassUValueWPerM2K } = explain(glazing);
  const { frame, areaM2, blind, nightInsulation } = opening;
  const uValueWPerM2K = frame
    ? windowUValueWPerM2K(
        { ...size, windowAreaM2: areaM2 },
        glassUValueWPerM2K,
        frame.uValueWPerM2K,
        frame.edgePsiWPerMK,
      )
    : glassUValueWPerM2K;
  const ofFrame = frame
    ? (frame.solarAbsorptance * frame.uValueWPerM2K) / glazingOutsideWPerM2K
    : 0;
  const shutter = nightInsulation && coveringOf(building, nightInsulation.covering);
  return {
    room,
    surface,
    opening: opening.id,
    areaM2,
    glassAreaM2: size.glassAreaM2,
    frameAreaM2: size.frameAreaM2,
    edgeLengthM: size.edgeLengthM,
    glazing: glazing.id,
    glassUValueWPerM2K,
    uValueWPerM2K,
    gValue: (size.glassAreaM2 * explain(glazing).gValue + size.frameAreaM2 * ofFrame) / areaM2,
    blindGValue: blind ? shadedGValue(glazing, coveringOf(building, blind.covering), blind) : null,
    insulatedUValueWPerM2K:
      shutter?.kind === 'shutter'
        ? shutteredUValueWPerM2K(
            uValueWPerM2K,
            shutterResistanceM2KPerW(shutter.resistanceM2KPerW, shutter.permeability),
          )
        : null,
  };
}

/** Convective parts of the films of EN 673: 25 less radiation outside, 3.6 inside [W/(m²·K)]. */
const insideConvectionWPerM2K = 3.6;
const blackWPerM2K = blackRadiativeWPerM2K(10);

/**
 * Solar factor with the blind drawn, normal incidence: layers as nodes, panes by EN 673, the gap beside
 * the blind by radiation and still air (ISO 6946) as far as it is closed, and by 3.6 W/(m²·K) from each
 * face to the air around as far as it is open.
 */
export function shadedGValue(
  glazing: Glazing,
  covering: Covering,
  place: {
    readonly position: BlindPosition;
    readonly gap: number;
    readonly distanceM: number;
    readonly openShare: number;
  },
): number {
  if (covering.kind !== 'blind') return 0;
  const { position, gap, distanceM, openShare } = place;
  const light = coveredLight(glazing, covering, position, gap);
  const panes = paneChain(glazing);
  const n = light.layerCount;
  const between = [...panes.betweenWPerM2K];
  const outdoors = new Float64Array(n);
  const room = new Float64Array(n);
  const still = airLayerConvectionWPerM2K('horizontal', distanceM);
  const beside = (glass: number, blind: number) =>
    blackWPerM2K * parallelEmittance(glass, blind) + (1 - openShare) * still;
  const outsideFilm = glazingOutsideWPerM2K;
  const insideFilm = (emissivity: number) =>
    insideConvectionWPerM2K + (4.1 * emissivity) / plainGlassEmissivity;
  const open = openShare * insideConvectionWPerM2K;
  /** From the place in the glass where it absorbs. */
  const fromGlass = (g: number) => (g === 0 ? 0 : 1 / (1 / g + panes.halfM2KPerW));
  if (position === 'outside') {
    between.unshift(fromGlass(beside(panes.outerEmissivity, covering.backEmissivity)));
    outdoors[0] = outsideFilm + open;
    outdoors[1] = fromGlass(open);
    room[n - 1] = fromGlass(insideFilm(panes.innerEmissivity));
  } else if (position === 'inside') {
    between.push(fromGlass(beside(panes.innerEmissivity, covering.frontEmissivity)));
    outdoors[0] = fromGlass(outsideFilm);
    room[n - 1] = insideFilm(covering.backEmissivity) + open;
    room[n - 2] = fromGlass(open);
  } else {
    outdoors[0] = outsideFilm;
    room[n - 1] = insideFilm(panes.innerEmissivity);
    // Two gaps of half the width: conduction across each, radiation to either side of the blind.
    between.splice(gap, 1, ...panes.halves(gap, covering.frontEmissivity, covering.backEmissivity));
  }
  const { inwardShare } = layerChainHeat({
    betweenWPerM2K: between,
    outdoorsWPerM2K: Array.from(outdoors),
    roomWPerM2K: Array.from(room),
  });
  const absorbed = light.absorptance.subarray(0, n);
  return layeredSolarFactor(
    light.transmittance[0] + (light.scattered?.[0] ?? 0),
    absorbed,
    inwardShare,
  );
}

interface PaneChain {
  /** Of a glazing known by U and g: from its middle, where it absorbs, to either face. Panes have none. */
  readonly halfM2KPerW: number;
  readonly betweenWPerM2K: readonly number[];
  readonly outerEmissivity: number;
  readonly innerEmissivity: number;
  readonly halves: (gap: number, front: number, back: number) => [number, number];
}

function paneChain(glazing: Glazing): PaneChain {
  if (glazing.kind === 'simple') {
    const { resistanceM2KPerW } = simpleGlazing(glazing.uValueWPerM2K, glazing.gValue);
    return {
      halfM2KPerW: resistanceM2KPerW / 2,
      betweenWPerM2K: [],
      outerEmissivity: plainGlassEmissivity,
      innerEmissivity: plainGlassEmissivity,
      halves: () => [0, 0],
    };
  }
  const { panes, gaps } = glazing;
  const { convectiveWPerM2K, radiativeWPerM2K } = standardTransmittance(glazing);
  return {
    halfM2KPerW: 0,
    betweenWPerM2K: convectiveWPerM2K.map((h, g) => h + radiativeWPerM2K[g]),
    outerEmissivity: panes[0].frontEmissivity,
    innerEmissivity: panes[panes.length - 1].backEmissivity,
    halves: (gap, front, back) => {
      const still = 0.025 / (gaps[gap].thicknessM / 2);
      return [
        still + blackWPerM2K * parallelEmittance(panes[gap].backEmissivity, front),
        still + blackWPerM2K * parallelEmittance(back, panes[gap + 1].frontEmissivity),
      ];
    },
  };
}
