// Windows: panes and gaps, frame and edge, coverings on either side or between the panes; and how the
// whole deals with the sun in each of its states.
import {
  type Building,
  coveringOf,
  glazingOf,
  type Opening,
  type Room,
  type Surface,
} from '../building/index.ts';
import type { LayeredAngles, ShadedWindow } from '../physics/index.ts';
import { addCovering, type CoveringParts } from './covering.ts';
import { type Drawn, drawnShare } from './covering-control.ts';
import { addOuterExchange, faceHeightM } from './fabric.ts';
import type { FlowRef, NetworkBuilder } from './network-builder.ts';
import type { Outdoors } from './outdoors.ts';
import { addRadiantFace, blendedEmissivity } from './radiant-law.ts';
import type { Face } from './room-parts.ts';
import { type FaceSun, shadedOpening } from './shading.ts';
import { addSimpleWindow } from './simple-window.ts';
import type { StepClock } from './step-clock.ts';
import { addFrame, addFrameOutside, frameFace } from './window-frame.ts';
import { bareLight, coveredLight, coveringLayer } from './window-optics.ts';
import { addPanes } from './window-panes.ts';
import { windowSize } from './window-size.ts';

/** One way in which a window deals with light, and how much of the glass is in it. */
export interface WindowState {
  /** Share of the glass in each step; null: always all of it. */
  readonly weight: Float64Array | null;
  readonly light: LayeredAngles;
  /** Nodes that take what each layer absorbs, in equal parts. */
  readonly layerNodes: readonly (readonly number[])[];
}

/** A window in the network, and how it deals with the sun. */
export interface WindowParts {
  /** Room, surface and opening, by their ids. */
  readonly name: string;
  /** The glass, or the covering before it, as the room sees it. */
  readonly face: Face;
  readonly frameFace: Face | null;
  readonly opening: Opening;
  readonly glassAreaM2: number;
  readonly sun: FaceSun;
  /** The glass with what stands before it, or null. */
  readonly shaded: ShadedWindow | null;
  readonly states: readonly WindowState[];
  /** Heat through glass, frame and edge, positive into the room. */
  readonly meter: number;
  readonly blind: Drawn | null;
  readonly nightInsulation: Drawn | null;
}

/** Middle of an opening above the ground outside [m]. */
function openingHeightM(room: Room, surface: Surface, opening: Opening): number {
  const middleM = faceHeightM(room, surface);
  const wallM = room.box?.heightM;
  if (!opening.rectangle || wallM === undefined || surface.tiltDeg < 45) return middleM;
  return middleM - wallM / 2 + opening.rectangle.bottomM + opening.rectangle.heightM / 2;
}

export interface WindowTask {
  readonly building: Building;
  readonly room: Room;
  readonly airNode: number;
  readonly outside: Outdoors;
  readonly clock: StepClock;
  readonly builder: NetworkBuilder;
  readonly air: { readonly pressurePa: number };
  /** Shares that rooms' temperatures ask for, from an earlier pass, by window. */
  readonly drawnByRoom?: ReadonlyMap<string, Float64Array> | undefined;
  /** Heat that reaches the room's air beside the face. */
  readonly toRoom: (flow: FlowRef) => void;
}

/** Adds a window with its outer and inner sides; the room adds what happens inside. */
export function addWindow(task: WindowTask, surface: Surface, opening: Opening): WindowParts {
  const { building, room, outside, builder, clock } = task;
  const glazing = glazingOf(building, opening.glazing);
  const name = `${room.id}/${surface.id}/${opening.id}`;
  const about = { name, room: room.id, surface: surface.id };
  const { tiltDeg, azimuthDeg } = surface;
  const size = windowSize(opening);
  const areaM2 = size.glassAreaM2;
  const heightM = openingHeightM(room, surface, opening);
  const shaded = shadedOpening(room, surface, opening);
  const sun = outside.sunOn(surface, shaded);

  const byRoom = (what: string) => task.drawnByRoom?.get(`${name} ${what}`);
  const drawn = (held: Opening['blind'] | Opening['nightInsulation'], what: string) =>
    held
      ? {
          held,
          covering: coveringOf(building, held.covering),
          drawn: drawnShare(building, held.control, sun, outside, clock, byRoom(what)),
        }
      : null;
  const blind = drawn(opening.blind, 'blind');
  const insulation = drawn(opening.nightInsulation, 'night insulation');

  const { pressurePa } = task.air;
  const place = { areaM2, tiltDeg, pressurePa, about };
  const between =
    blind?.held.position === 'between' && blind.covering.kind === 'blind'
      ? { covering: blind.covering, gap: opening.blind?.gap ?? 0, drawn: blind.drawn.share }
      : null;
  const glass =
    glazing.kind === 'panes'
      ? addPanes(glazing, opening, place, between, builder)
      : addSimpleWindow(glazing, areaM2, about, builder);
  const frame = opening.frame && addFrame(opening.frame, size, about, builder);

  const outermost = glass.paneNodes[0][0];
  const innermost = glass.paneNodes[glass.paneNodes.length - 1][1];
  /** The covering that hangs on a side, on the glass or on the frame behind it. */
  const coverOn = (
    side: 'outside' | 'inside',
    what: typeof blind,
    of: { node: number; areaM2: number; emissivity: number; name: string },
  ): CoveringParts | null => {
    if (!what || what.held.position !== side) return null;
    const parts = addCovering(
      what.covering,
      {
        side,
        areaM2: of.areaM2,
        tiltDeg,
        heightM: opening.rectangle?.heightM ?? 1,
        pressurePa,
        glassEmissivity: of.emissivity,
        glassNode: of.node,
        airNode: side === 'outside' ? outside.airNode : task.airNode,
        distanceM: opening.blind?.distanceM ?? 0,
        openShare: opening.blind?.openShare ?? 0,
        about: { ...about, name: of.name },
      },
      what.drawn.share,
      builder,
    );
    if (side === 'inside') parts.toAir.forEach(task.toRoom);
    return parts;
  };
  const ofGlass = (node: number, emissivity: number) => ({ node, areaM2, emissivity, name });
  const outward = [blind, insulation].find((one) => one?.held.position === 'outside') ?? null;
  const inward = [blind, insulation].find((one) => one?.held.position === 'inside') ?? null;
  const outer = coverOn('outside', outward, ofGlass(outermost, glass.outerEmissivity));
  const inner = coverOn('inside', inward, ofGlass(innermost, glass.innerEmissivity));

  addOuterExchange(
    building,
    {
      node: outer?.node ?? outermost,
      areaM2,
      tiltDeg,
      azimuthDeg,
      heightM,
      emissivity: blendedEmissivity(
        glass.outerEmissivity,
        outer?.emissivity ?? glass.outerEmissivity,
        outward?.drawn.share,
      ),
      roughness: 1,
      about,
    },
    outside,
    builder,
  );

  const nodesOf = (node: number) => [node];
  const states = windowStates();
  const meter = builder.meter(`window ${name}`);
  builder.count(meter, 1, glass.through);
  let frameSide: Face | null = null;
  if (frame && opening.frame) {
    builder.count(meter, 1, frame.through);
    const { emissivity } = opening.frame;
    const ofFrame = (node: number) => ({
      node,
      areaM2: size.frameAreaM2,
      emissivity,
      name: `${name}/frame`,
    });
    // Shutters close over the frame too; blinds hang before the glass.
    const before = coverOn('outside', insulation, ofFrame(frame.outerNode));
    const behind = coverOn('inside', insulation, ofFrame(frame.innerNode));
    addFrameOutside({
      building,
      surface,
      frame: opening.frame,
      areaM2: size.frameAreaM2,
      heightM,
      node: before?.node ?? frame.outerNode,
      sun,
      outside,
      builder,
      about,
    });
    const innerNode = behind?.node ?? frame.innerNode;
    frameSide = frameFace(surface, opening.frame, innerNode, size.frameAreaM2, name);
  }

  const fromInside = states[0].light.diffuseFromInside;
  const emissivity = blendedEmissivity(
    glass.innerEmissivity,
    inner?.emissivity ?? glass.innerEmissivity,
    inward?.drawn.share,
  );
  const faceNode = inner?.node ?? innermost;
  const face: Face = {
    node: faceNode,
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
    ...(typeof emissivity === 'number'
      ? {}
      : { radiantNode: addRadiantFace(faceNode, areaM2, emissivity, about, builder) }),
    ...(size.rectangle ? { rectangle: size.rectangle } : {}),
  };
  return {
    name,
    face,
    frameFace: frameSide,
    opening,
    glassAreaM2: areaM2,
    sun,
    shaded,
    states,
    meter,
    blind: blind?.drawn ?? null,
    nightInsulation: insulation?.drawn ?? null,
  };

  /** Bare, with the blind, behind the shutter: together all of the glass in every step. */
  function windowStates(): WindowState[] {
    const bare: WindowState = {
      weight: null,
      light: bareLight(glazing),
      layerNodes: glass.paneNodes,
    };
    if (!blind && !insulation) return [bare];
    const s = blind?.drawn.share;
    const n = insulation?.drawn.share;
    const count = clock.count;
    const weigh = (of: (s: number, n: number) => number) =>
      Float64Array.from({ length: count }, (_, k) => of(s ? s[k] : 0, n ? n[k] : 0));
    const covered = (what: NonNullable<typeof blind>, weight: Float64Array): WindowState => {
      const { position } = what.held;
      const gap = opening.blind?.gap ?? 0;
      const at = coveringLayer(glazing, position, gap);
      const layerNodes: (readonly number[])[] = [...glass.paneNodes];
      const node =
        position === 'between'
          ? glass.blindNode
          : ((position === 'outside' ? outer : inner)?.node ?? -1);
      layerNodes.splice(at, 0, nodesOf(node));
      return { weight, light: coveredLight(glazing, what.covering, position, gap), layerNodes };
    };
    const list: WindowState[] = [{ ...bare, weight: weigh((a, b) => (1 - a) * (1 - b)) }];
    if (blind)
      list.push(
        covered(
          blind,
          weigh((a, b) => a * (1 - b)),
        ),
      );
    if (insulation)
      list.push(
        covered(
          insulation,
          weigh((_, b) => b),
        ),
      );
    return list;
  }
}
