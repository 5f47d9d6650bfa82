// One opaque surface in the network: its chain of nodes, and what lies beyond its outer face.
import { constructionOf, type Surface } from '../building/index.ts';
import {
  addChain,
  addOuterExchange,
  addOuterSun,
  type Chain,
  faceHeightM,
  netAreaM2,
  type OuterFace,
  roughnessOf,
} from './fabric.ts';
import { addGround, type GroundTask } from './ground.ts';
import type { Provenance } from './network-builder.ts';
import type { Outdoors } from './outdoors.ts';
import type { Face } from './room-parts.ts';
import { scheduledValues } from './schedule-values.ts';
import { shadedSurface } from './shading.ts';
import type { StepClock } from './step-clock.ts';

interface SurfaceTask extends GroundTask {
  /** Partitions already built, by "room/surface" of the face that is still to come. */
  readonly chains: Map<string, Chain>;
  readonly outside: Outdoors;
}

/** One opaque surface: its chain, and what happens at its outer face. */
export function addSurface(task: SurfaceTask, surface: Surface): Face {
  const { building, room, fineness, chains, builder } = task;
  const construction = constructionOf(building, surface.construction);
  const { boundary } = surface;
  const key = `${room.id}/${surface.id}`;
  const built = chains.get(key);
  const chain = built ?? addChain(building, room, surface, fineness, builder);
  if (!built) {
    if (boundary.kind === 'room')
      chains.set(`${boundary.room}/${boundary.surface}`, {
        outerNode: chain.innerNode,
        innerNode: chain.outerNode,
        layers: chain.layers,
      });
    else addOuterSide(task, surface, chain.outerNode);
  }
  const otherWay = surface.reversed;
  return {
    node: chain.innerNode,
    layers: chain.layers,
    surface: surface.id,
    name: key,
    areaM2: netAreaM2(surface),
    tiltDeg: surface.tiltDeg,
    azimuthDeg: surface.azimuthDeg,
    emissivity: otherWay ? construction.outsideEmissivity : construction.insideEmissivity,
    balance: balanceOf(boundary.kind),
    boundary: boundary.kind,
    light: {
      absorbed: otherWay
        ? construction.outsideSolarAbsorptance
        : construction.insideSolarAbsorptance,
      transmitted: 0,
    },
  };
}

function balanceOf(boundary: Surface['boundary']['kind']): Face['balance'] {
  if (boundary === 'room') return 'rooms';
  return boundary === 'ground' || boundary === 'ground-contact' ? 'ground' : 'opaque';
}

const unheatedFilmM2KPerW = 0.13; // ISO 6946, horizontal heat flow

function addOuterSide(task: SurfaceTask, surface: Surface, outerNode: number): void {
  const { building, room, outside, clock, builder } = task;
  const { boundary } = surface;
  const construction = constructionOf(building, surface.construction);
  const name = `${room.id}/${surface.id}`;
  const about = (what: string, method: string, inputs: Provenance['inputs']): Provenance => ({
    name: `${name} ${what}`,
    room: room.id,
    surface: surface.id,
    what,
    method,
    inputs,
  });
  const areaM2 = netAreaM2(surface);
  if (boundary.kind === 'outdoors') {
    const face: OuterFace = {
      node: outerNode,
      areaM2,
      tiltDeg: surface.tiltDeg,
      azimuthDeg: surface.azimuthDeg,
      heightM: faceHeightM(room, surface),
      emissivity: construction.outsideEmissivity,
      roughness: roughnessOf(construction),
      about: { name, room: room.id, surface: surface.id },
    };
    addOuterExchange(building, face, outside, builder);
    addOuterSun(construction, face, shadedSurface(room, surface), outside, builder);
  }
  if (boundary.kind === 'ground-contact') addGround(task, surface, boundary.contact, outerNode);
  if (boundary.kind === 'ground') {
    const series = builder.series(
      `${name} ground`,
      'step',
      groundValues(boundary.temperatureC, clock),
    );
    const node = builder.node(
      about('ground', 'temperature under the construction, as given', {}),
      0,
      series,
    );
    // The boundary touches the construction: a conductance so large that it only joins the two.
    builder.constantLink(
      outerNode,
      node,
      areaM2 * 1e4,
      about('contact with the ground', 'no film', { areaM2 }),
    );
  }
  if (boundary.kind === 'fixed') {
    const values = scheduledValues(building, boundary.temperatureC, clock);
    const node = builder.node(
      about('space beyond', 'temperature as given', {}),
      0,
      builder.series(`${name} beyond`, 'step', values),
    );
    builder.constantLink(
      outerNode,
      node,
      areaM2 / unheatedFilmM2KPerW,
      about('film to the space beyond', 'ISO 6946 film, 0.13 m²K/W', { areaM2 }),
    );
  }
}

/** Monthly means become a step series; the year has the months of its length. */
function groundValues(temperatureC: number | readonly number[], clock: StepClock): Float64Array {
  const values = new Float64Array(clock.count);
  for (let k = 0; k < clock.count; k++)
    values[k] =
      typeof temperatureC === 'number'
        ? temperatureC
        : temperatureC[Number(clock.monthDay[clock.day[k]].slice(0, 2)) - 1];
  return values;
}
