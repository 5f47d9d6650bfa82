// Sunlight through the windows of a room: how much comes in each step, where it is absorbed in the
// end, and what the panes keep.

import { inverse, Matrix } from 'ml-matrix';
import type { Building, Room } from '../building/index.ts';
import { beamAbsorptance, beamTransmittance } from '../physics/index.ts';
import type { FaceViews } from './enclosure.ts';
import type { NetworkBuilder } from './network-builder.ts';
import type { Outdoors } from './outdoors.ts';
import type { Face, RoomMeters } from './room-parts.ts';
import type { WindowParts } from './window.ts';

interface SunTask {
  readonly building: Building;
  readonly room: Room;
  readonly faces: readonly Face[];
  readonly windows: readonly WindowParts[];
  readonly views: FaceViews;
  readonly outside: Outdoors;
  readonly builder: NetworkBuilder;
  readonly meters: RoomMeters;
  readonly faceMeter: (face: Face) => number;
}

/** Light that one window lets in, step by step [W]. */
interface Transmitted {
  readonly beamW: Float64Array;
  readonly diffuseW: Float64Array;
}

/** Adds the sun of one room: sources on its faces and in its panes. */
export function addRoomSun(task: SunTask): void {
  const { room, faces, windows, builder, meters } = task;
  if (windows.length === 0) return;
  const incidence = lightInside(faces, task.views);
  const onFacesW = faces.map(() => new Float64Array(task.outside.count));
  for (const window of windows) {
    const light = transmitted(window, task);
    const windowFace = faces.indexOf(window.face);
    const beamTo = incidence(beamTargets(faces));
    const diffuseTo = incidence(viewTargets(task.views, windowFace));
    faces.forEach((_, f) => {
      const into = onFacesW[f];
      for (let k = 0; k < into.length; k++)
        into[k] += beamTo[f] * light.beamW[k] + diffuseTo[f] * light.diffuseW[k];
    });
    addPaneSun(window, task);
  }
  faces.forEach((face, f) => {
    const name = `${face.name} light from inside`;
    if (face.opening === undefined) {
      if (face.light.absorbed === 0) return;
      const series = builder.series(name, 'step', onFacesW[f]);
      const ref = builder.source(face.node, face.light.absorbed, series, name);
      builder.count(meters.solar, 1, ref);
      builder.count(task.faceMeter(face), -1, ref);
      return;
    }
    const window = windows.find((one) => one.face === face);
    if (!window) throw new Error(`no window behind the face ${face.name} of ${room.id}`);
    const series = builder.series(name, 'step', onFacesW[f]);
    window.paneNodes.forEach((nodes, p) => {
      const share = window.optics.diffuseFromInside.absorptance[p];
      for (const node of nodes) builder.source(node, share / 2, series, name);
    });
  });
}

/**
 * Light that meets each face in the end, all reflections followed, per watt that first goes to the
 * faces in the shares given. What faces absorb and glass lets out is this times their shares.
 */
function lightInside(
  faces: readonly Face[],
  views: FaceViews,
): (first: Float64Array) => Float64Array {
  const n = faces.length;
  const reflectance = Float64Array.from(
    faces,
    ({ light }) => 1 - light.absorbed - light.transmitted,
  );
  // H_i = E_i + Σj ρ_j·F_ji·H_j, so H = (I − R)⁻¹·E with R_ij = ρ_j·F_ji.
  const system = Matrix.eye(n, n);
  for (let i = 0; i < n; i++)
    for (let j = 0; j < n; j++)
      system.set(
        i,
        j,
        system.get(i, j) - (reflectance[j] * views.exchangeM2[j * n + i]) / views.areaM2[j],
      );
  const matrix = inverse(system);
  return (first) => Float64Array.from(matrix.mmul(Matrix.columnVector(first)).to1DArray());
}

/** The beam falls on the floor, or on all opaque faces where there is none. */
function beamTargets(faces: readonly Face[]): Float64Array {
  const isFloor = (face: Face) => face.tiltDeg > 135 && face.opening === undefined;
  const anyFloor = faces.some(isFloor);
  const weight = faces.map((face) =>
    (anyFloor ? isFloor(face) : face.opening === undefined) ? face.areaM2 : 0,
  );
  const total = weight.reduce((sum, w) => sum + w, 0);
  return Float64Array.from(weight, (w) => w / total);
}

/** Diffuse light spreads as the window sees the faces. */
function viewTargets(views: FaceViews, windowFace: number): Float64Array {
  const n = views.areaM2.length;
  return Float64Array.from(
    { length: n },
    (_, j) => views.exchangeM2[windowFace * n + j] / views.areaM2[windowFace],
  );
}

function transmitted(window: WindowParts, task: SunTask): Transmitted {
  const { areaM2, optics } = window;
  const sun = task.outside.sunOn(window.tiltDeg, window.azimuthDeg);
  const beamW = sun.beamWPerM2.map((beam, k) =>
    beam > 0 ? areaM2 * beam * beamTransmittance(optics, sun.cosIncidence[k]) : 0,
  );
  const diffuseW = sun.isotropicWPerM2.map(
    (dome, k) =>
      areaM2 * optics.diffuse.transmittance * (dome + sun.horizonWPerM2[k] + sun.groundWPerM2[k]),
  );
  return { beamW, diffuseW };
}

/** What the panes keep of the light from outside, half at each face. */
function addPaneSun(window: WindowParts, task: SunTask): void {
  const { areaM2, optics } = window;
  const sun = task.outside.sunOn(window.tiltDeg, window.azimuthDeg);
  window.paneNodes.forEach((nodes, p) => {
    const name = `${window.face.name} sun in pane ${p + 1}`;
    const diffuse = optics.diffuse.absorptance[p];
    const values = sun.isotropicWPerM2.map((dome, k) => {
      const beam = sun.beamWPerM2[k];
      const direct = beam > 0 ? beam * beamAbsorptance(optics, p, sun.cosIncidence[k]) : 0;
      return areaM2 * (direct + diffuse * (dome + sun.horizonWPerM2[k] + sun.groundWPerM2[k]));
    });
    const series = task.builder.series(name, 'step', values);
    for (const node of nodes) task.builder.source(node, 0.5, series, name);
  });
}
