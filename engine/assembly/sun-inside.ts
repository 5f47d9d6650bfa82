// Sunlight through the windows of a room: how much comes in each step, where it is absorbed in the
// end, and what the panes keep.

import type { Building, Room } from '../building/index.ts';
import { beamAbsorptance, beamTransmittance, lightMatrix, spreadLight } from '../physics/index.ts';
import { beamRays, type Rays } from './beam-inside.ts';
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
  const rays: Rays[] = [];
  for (const window of windows) {
    const light = transmitted(window);
    rays.push(...beamRays(task.building, room, faces, window, light.beamW, task.outside.sun));
    const shares = viewShares(task.views, faces.indexOf(window.face));
    rays.push({ shares, lightW: light.diffuseW });
    addPaneSun(window, builder);
  }
  const totalW = followed(faces, task.views, rays, task.outside.count);
  faces.forEach((face, f) => {
    const name = `${face.name} light from inside`;
    if (face.opening === undefined) {
      if (face.light.absorbed === 0) return;
      const ref = builder.source(
        face.node,
        face.light.absorbed,
        builder.series(name, 'step', totalW[f]),
        name,
      );
      builder.count(meters.solar, 1, ref);
      builder.count(task.faceMeter(face), -1, ref);
      return;
    }
    const window = windows.find((one) => one.face === face);
    if (!window) throw new Error(`no window behind the face ${face.name} of ${room.id}`);
    const series = builder.series(name, 'step', totalW[f]);
    window.paneNodes.forEach((nodes, p) => {
      const share = window.optics.diffuseFromInside.absorptance[p];
      for (const node of nodes) builder.source(node, share / 2, series, name);
    });
  });
}

/**
 * Light that meets each face in the end, all reflections followed, from the rays that come in. What
 * faces absorb and glass lets out is this times their shares.
 */
function followed(
  faces: readonly Face[],
  views: FaceViews,
  rays: readonly Rays[],
  steps: number,
): Float64Array[] {
  const n = faces.length;
  const reflectance = faces.map(({ light }) => 1 - light.absorbed - light.transmitted);
  const matrix = lightMatrix(views.areaM2, views.exchangeM2, reflectance);
  const totalW = faces.map(() => new Float64Array(steps));
  const spread = new Float64Array(n);
  for (const { shares, lightW } of rays) {
    spreadLight(matrix, shares, spread);
    for (let i = 0; i < n; i++) addScaled(spread[i], lightW, totalW[i]);
  }
  return totalW;
}

function addScaled(factor: number, values: Float64Array, into: Float64Array): void {
  if (factor === 0) return;
  for (let k = 0; k < into.length; k++) into[k] += factor * values[k];
}

/** Diffuse light spreads as the window sees the faces. */
function viewShares(views: FaceViews, windowFace: number): Float64Array {
  const n = views.areaM2.length;
  return Float64Array.from(
    { length: n },
    (_, j) => views.exchangeM2[windowFace * n + j] / views.areaM2[windowFace],
  );
}

function transmitted(window: WindowParts): Transmitted {
  const { areaM2, optics, sun } = window;
  const beamW = sun.beamWPerM2.map((beam, k) =>
    beam > 0 ? areaM2 * beam * beamTransmittance(optics, sun.cosIncidence[k]) : 0,
  );
  const diffuseW = sun.diffuseWPerM2.map(
    (diffuse) => areaM2 * optics.diffuse.transmittance * diffuse,
  );
  return { beamW, diffuseW };
}

/** What the panes keep of the light from outside, half at each face. */
function addPaneSun(window: WindowParts, builder: NetworkBuilder): void {
  const { areaM2, optics, sun } = window;
  window.paneNodes.forEach((nodes, p) => {
    const name = `${window.face.name} sun in pane ${p + 1}`;
    const ofDiffuse = optics.diffuse.absorptance[p];
    const values = sun.diffuseWPerM2.map((diffuse, k) => {
      const beam = sun.beamWPerM2[k];
      const direct = beam > 0 ? beam * beamAbsorptance(optics, p, sun.cosIncidence[k]) : 0;
      return areaM2 * (direct + ofDiffuse * diffuse);
    });
    const series = builder.series(name, 'step', values);
    for (const node of nodes) builder.source(node, 0.5, series, name);
  });
}
