// The frame of a window with the edge of its glass: a path of its own from outdoors to the room.
import type { Building, Frame, Surface } from '../building/index.ts';
import { addOuterExchange } from './fabric.ts';
import type { FlowRef, NetworkBuilder, Provenance } from './network-builder.ts';
import type { Outdoors } from './outdoors.ts';
import type { Face } from './room-parts.ts';
import type { FaceSun } from './shading.ts';
import type { WindowSize } from './window-size.ts';

/** Films of ISO 6946 that the frame's U-value holds [m²K/W]. */
const filmsM2KPerW = 0.13 + 0.04;

export interface FrameParts {
  readonly outerNode: number;
  readonly innerNode: number;
  readonly through: FlowRef;
}

/**
 * Conductance from face to face of frame and edge, so that under standard films both together pass
 * A_f·U_f + l·ψ:  1/K = 1/(A_f·U_f + l·ψ) − (R_si + R_se)/A_f. Where edge and frame together would pass
 * more than the films allow, the edge's part comes on top of the frame's own conductance.
 *
 * Source: ISO 10077-1:2017, 6.4 (frame and edge beside the glass).
 */
export function frameConductanceWPerK(frame: Frame, size: WindowSize): number {
  const { frameAreaM2, edgeLengthM } = size;
  const frameWPerK = frameAreaM2 * frame.uValueWPerM2K;
  const edgeWPerK = edgeLengthM * frame.edgePsiWPerMK;
  const rest = 1 / (frameWPerK + edgeWPerK) - filmsM2KPerW / frameAreaM2;
  if (rest > 0) return 1 / rest;
  return 1 / (1 / frameWPerK - filmsM2KPerW / frameAreaM2) + edgeWPerK;
}

export function addFrame(
  frame: Frame,
  size: WindowSize,
  about: Pick<Provenance, 'name' | 'room' | 'surface'>,
  builder: NetworkBuilder,
): FrameParts {
  const told = (what: string): Provenance => ({
    ...about,
    name: `${about.name}/${what}`,
    what,
    method: 'frame and glass edge, ISO 10077-1:2017',
    inputs: {
      areaM2: size.frameAreaM2,
      uValueWPerM2K: frame.uValueWPerM2K,
      edgeLengthM: size.edgeLengthM,
      edgePsiWPerMK: frame.edgePsiWPerMK,
    },
  });
  const outerNode = builder.node(told('outer face of the frame'), 0);
  const innerNode = builder.node(told('inner face of the frame'), 0);
  const through = builder.constantLink(
    outerNode,
    innerNode,
    frameConductanceWPerK(frame, size),
    told('heat through frame and glass edge'),
  );
  return { outerNode, innerNode, through };
}

interface FrameOutside {
  readonly building: Building;
  readonly surface: Surface;
  readonly frame: Frame;
  readonly areaM2: number;
  readonly heightM: number;
  /** The face that looks out: the frame's, or that of a shutter before it. */
  readonly node: number;
  readonly sun: FaceSun;
  readonly outside: Outdoors;
  readonly builder: NetworkBuilder;
  readonly about: Pick<Provenance, 'name' | 'room' | 'surface'>;
}

/** Film, sky and sun at the frame's outer face. */
export function addFrameOutside(task: FrameOutside): void {
  const { frame, node, areaM2, sun, builder, about } = task;
  const { tiltDeg, azimuthDeg } = task.surface;
  addOuterExchange(
    task.building,
    {
      node,
      areaM2,
      tiltDeg,
      azimuthDeg,
      heightM: task.heightM,
      emissivity: frame.emissivity,
      roughness: 1,
      about: { ...about, name: `${about.name}/frame` },
    },
    task.outside,
    builder,
  );
  if (frame.solarAbsorptance === 0) return;
  const name = `sun absorbed by the frame, ${about.name}`;
  const total = sun.beamWPerM2.map((beam, k) => beam + sun.diffuseWPerM2[k]);
  builder.source(node, frame.solarAbsorptance * areaM2, builder.series(name, 'step', total), name);
}

/** The frame as a face of the room. It has no place on a box: it counts as part of the wall around. */
export function frameFace(
  surface: Surface,
  frame: Frame,
  node: number,
  areaM2: number,
  name: string,
): Face {
  return {
    node,
    surface: surface.id,
    name: `${name}/frame`,
    areaM2,
    tiltDeg: surface.tiltDeg,
    azimuthDeg: surface.azimuthDeg,
    emissivity: frame.emissivity,
    balance: 'glazing',
    boundary: surface.boundary.kind,
    light: { absorbed: frame.solarAbsorptance, transmitted: 0 },
  };
}
