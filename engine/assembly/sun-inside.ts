// Sunlight through the windows of a room: how much comes in each step, where it is absorbed in the
// end, and what panes and blinds keep.

import type { Building, Room } from '../building/index.ts';
import { beamRays, type Rays } from './beam-inside.ts';
import type { FaceViews } from './enclosure.ts';
import { diffuseShares, fixedShares, followed, viewShares } from './light-paths.ts';
import type { NetworkBuilder } from './network-builder.ts';
import type { Outdoors } from './outdoors.ts';
import type { Face, RoomMeters } from './room-parts.ts';
import type { WindowParts } from './window.ts';
import {
  addLayersSun,
  addLightFromInside,
  incidences,
  layersSun,
  transmitted,
} from './window-light.ts';

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

/** Light that a window let in, in each step [W]. */
export interface WindowLightIn {
  readonly window: WindowParts;
  readonly passedW: Float64Array;
}

/** Adds the sun of one room: sources on its faces, in its panes and its blinds. */
export function addRoomSun(task: SunTask): WindowLightIn[] {
  const { faces, windows, outside, builder, meters } = task;
  if (windows.length === 0) return [];
  const isStill = windows.every(({ states }) => states.every(({ weight }) => weight === null));
  const light = isStill
    ? outside.memory.roomLight.of(lightKey(task), () => roomLight(task))
    : roomLight(task);
  windows.forEach((window, w) => {
    addLayersSun(window, light.layersW[w], builder);
  });
  faces.forEach((face, f) => {
    const window = windows.find((one) => one.face === face);
    if (window) addLightFromInside(window, light.totalW[f], builder);
    if (window || face.light.absorbed === 0) return;
    const name = `${face.name} light from inside`;
    const series = builder.series(name, 'step', light.totalW[f]);
    const ref = builder.source(face.node, face.light.absorbed, series, name);
    builder.count(meters.solar, 1, ref);
    builder.count(task.faceMeter(face), -1, ref);
  });
  return windows.map((window, w) => ({ window, passedW: light.passedW[w] }));
}

/** Light in a room, step by step [W]. */
export interface RoomLight {
  /** Let in by each window. */
  readonly passedW: readonly Float64Array[];
  /** Kept of the light from outside by each layer of each window. */
  readonly layersW: readonly (readonly Float64Array[])[];
  /** That meets each face in the end. */
  readonly totalW: readonly Float64Array[];
}

/** All that the light in a room depends on while nothing is drawn before its windows. */
function lightKey({ building, room, outside, faces }: SunTask): string {
  const { box, surfaces } = room;
  const light = faces.map((face) => face.light);
  const glass = building.glazings.filter((one) =>
    surfaces.some(({ openings }) => openings.some(({ glazing }) => glazing === one.id)),
  );
  return JSON.stringify([
    outside.sunKey,
    building.site,
    building.physics,
    box,
    surfaces,
    light,
    glass,
  ]);
}

function roomLight({ building, room, faces, windows, views, outside }: SunTask): RoomLight {
  const rays: Rays[] = [];
  const layersW: Float64Array[][] = [];
  const passedW = windows.map((window) => {
    const degrees = incidences(window);
    const { beamW, skyW, groundW, scatteredW } = transmitted(window, degrees);
    rays.push(...beamRays(building, room, faces, window, beamW, outside.sun));
    const first = diffuseShares(building, room, faces, window, views);
    if (first.sky === first.ground)
      rays.push({ shares: first.sky, lightW: skyW.map((sky, k) => sky + groundW[k]) });
    else rays.push({ shares: first.sky, lightW: skyW }, { shares: first.ground, lightW: groundW });
    if (scatteredW)
      rays.push({ shares: viewShares(views, faces.indexOf(window.face)), lightW: scatteredW });
    layersW.push(layersSun(window, degrees));
    return beamW.map((beam, k) => beam + skyW[k] + groundW[k] + (scatteredW?.[k] ?? 0));
  });
  const totalW =
    building.physics.solarInside === 'fixed-shares'
      ? fixedShares(faces, rays, outside.count)
      : followed(faces, windows, views, rays, outside.count);
  return { passedW, layersW, totalW };
}
