// Opaque surfaces as chains of nodes: layers cut into cells, films and radiation at the outer face.
import {
  type Building,
  type Construction,
  constructionOf,
  materialOf,
  type Room,
  type Surface,
} from '../building/index.ts';
import {
  type ConductionMesh,
  type Layer,
  meshConstruction,
  outsideViews,
  roughnessFactor,
  type ShadedWindow,
  thirdPowerFilm,
} from '../physics/index.ts';
import type { NetworkBuilder, Provenance } from './network-builder.ts';
import type { Outdoors } from './outdoors.ts';
import { addGreyLink, type Emissivity } from './radiant-law.ts';

/** How fine the chains are cut. */
export interface Fineness {
  readonly stepS: number;
  /** Multiplies the cells; 2 for the accuracy check. */
  readonly refine: number;
}

/**
 * Two neighbouring nodes between which a layer's middle lies, and the share of each: heat put in by
 * these shares flows to both sides as if it came in at the middle itself.
 */
export interface LayerMiddle {
  readonly nodes: readonly [number, number];
  readonly shares: readonly [number, number];
}

/** The chain of one surface, outer to inner face. */
export interface Chain {
  readonly outerNode: number;
  readonly innerNode: number;
  /** The middle of each layer of the construction, in its order. */
  readonly layers: readonly LayerMiddle[];
}

/** Layers of a construction in the terms of the physics, outside to inside. */
export function physicsLayers(building: Building, construction: Construction): Layer[] {
  return construction.layers.map((layer) => {
    if (!('material' in layer))
      return { kind: 'resistance', resistanceM2KPerW: layer.resistanceM2KPerW };
    const { conductivityWPerMK, densityKgPerM3, specificHeatJPerKgK } = materialOf(
      building,
      layer.material,
    );
    return {
      kind: 'solid',
      thicknessM: layer.thicknessM,
      conductivityWPerMK,
      densityKgPerM3,
      specificHeatJPerKgK,
    };
  });
}

/** Area of a surface without its openings [m²]. */
export function netAreaM2(surface: Surface): number {
  return surface.areaM2 - surface.openings.reduce((sum, opening) => sum + opening.areaM2, 0);
}

/** Height of a face's middle above the ground outside, given or by the custom stated in the schema [m]. */
export function faceHeightM(room: Room, surface: Surface): number {
  if (surface.heightAboveGroundM !== undefined) return surface.heightAboveGroundM;
  const roomHeightM = room.box?.heightM ?? room.volumeM3 / room.floorAreaM2;
  return surface.tiltDeg < 45 ? roomHeightM : roomHeightM / 2;
}

/** Adds the chain of one surface, from its outer to its inner face. */
export function addChain(
  building: Building,
  room: Room,
  surface: Surface,
  fineness: Fineness,
  builder: NetworkBuilder,
): Chain {
  const construction = constructionOf(building, surface.construction);
  const layers = physicsLayers(building, construction);
  if (surface.reversed) layers.reverse();
  const mesh = meshConstruction(layers, { kind: building.physics.conduction, ...fineness });
  const areaM2 = netAreaM2(surface);
  const name = `${room.id}/${surface.id}`;
  const about = (what: string, inputs: Provenance['inputs']): Provenance => ({
    name,
    room: room.id,
    surface: surface.id,
    what,
    method: 'one-dimensional conduction, finite volumes',
    inputs,
  });
  const last = mesh.capacityJPerM2K.length - 1;
  const nodes: number[] = [];
  for (let i = 0; i <= last; i++) {
    const place = i === 0 ? 'outer face' : i === last ? 'inner face' : `node ${i}`;
    const next = builder.node(
      {
        ...about(`${place} of ${construction.name}`, {
          areaM2,
          capacityJPerM2K: mesh.capacityJPerM2K[i],
        }),
        name: `${name}/${place}`,
      },
      mesh.capacityJPerM2K[i] * areaM2,
    );
    if (i > 0)
      builder.constantLink(
        nodes[i - 1],
        next,
        mesh.conductanceWPerM2K[i - 1] * areaM2,
        about(layerText(building, construction, mesh, i - 1, surface.reversed), {
          areaM2,
          conductanceWPerM2K: mesh.conductanceWPerM2K[i - 1],
        }),
      );
    nodes.push(next);
  }
  const layerMiddles = middles(mesh, nodes);
  if (surface.reversed) layerMiddles.reverse();
  return { outerNode: nodes[0], innerNode: nodes[last], layers: layerMiddles };
}

/** The middle of each layer of the mesh on the scale of resistance. */
function middles(mesh: ConductionMesh, nodes: readonly number[]): LayerMiddle[] {
  const { interfaceResistanceM2KPerW: edges, nodeResistanceM2KPerW: at } = mesh;
  return Array.from({ length: edges.length - 1 }, (_, layer) => {
    const middle = (edges[layer] + edges[layer + 1]) / 2;
    let i = 0;
    while (i < at.length - 2 && at[i + 1] < middle) i++;
    const share = (middle - at[i]) / (at[i + 1] - at[i]);
    return { nodes: [nodes[i], nodes[i + 1]], shares: [1 - share, share] };
  });
}

/** Which layer a link of the mesh lies in. */
function layerText(
  building: Building,
  construction: Construction,
  mesh: ConductionMesh,
  link: number,
  reversed: boolean,
): string {
  const middle = (mesh.nodeResistanceM2KPerW[link] + mesh.nodeResistanceM2KPerW[link + 1]) / 2;
  const edges = mesh.interfaceResistanceM2KPerW;
  let index = 0;
  while (index < construction.layers.length - 1 && edges[index + 1] <= middle) index++;
  const layer = construction.layers[reversed ? construction.layers.length - 1 - index : index];
  return 'material' in layer
    ? `conduction, ${materialOf(building, layer.material).name} ${layer.thicknessM} m`
    : `conduction, ${layer.name}`;
}

/** What the outer side of a face is, for films and radiation. */
export interface OuterFace {
  readonly node: number;
  readonly areaM2: number;
  readonly tiltDeg: number;
  readonly azimuthDeg: number;
  readonly heightM: number;
  readonly emissivity: Emissivity;
  readonly roughness: number;
  readonly about: Omit<Provenance, 'what' | 'method' | 'inputs'>;
}

/** Film, and radiation to sky, air and ground, at a face outdoors. */
export function addOuterExchange(
  building: Building,
  face: OuterFace,
  outside: Outdoors,
  builder: NetworkBuilder,
): void {
  const { node, areaM2, tiltDeg, azimuthDeg, heightM, emissivity, roughness } = face;
  const series = outside.filmSeries({ heightM, tiltDeg, azimuthDeg });
  const filmAbout: Provenance = {
    ...face.about,
    what: 'outside film',
    method: outsideFilmMethod[building.physics.outsideConvection],
    inputs: { areaM2, heightM, tiltDeg, azimuthDeg, roughness },
  };
  if (outside.hasNaturalTerm) {
    const natural = thirdPowerFilm(tiltDeg);
    builder.mixedFilmLink(
      node,
      outside.airNode,
      { areaM2, warmerFrom: natural.warmerFace, coolerFrom: natural.coolerFace, roughness, series },
      filmAbout,
    );
  } else builder.scaledLink(node, outside.airNode, areaM2, series, filmAbout);
  const views = outsideViews(tiltDeg, building.physics.outsideLongWave === 'low-sky-at-air');
  const toSkyM2 = areaM2 * views.sky;
  const toAirM2 = areaM2 - toSkyM2;
  const about = (what: string): Provenance => ({
    ...face.about,
    what,
    method:
      'grey face to black surroundings by tilt view factor; low sky at air temperature (Walton 1983)',
    inputs: {
      areaM2,
      emissivity: typeof emissivity === 'number' ? emissivity : 'by step',
      skyViewShare: views.sky,
    },
  });
  if (toSkyM2 > 0)
    addGreyLink(builder, node, outside.skyNode, toSkyM2, emissivity, about('radiation to the sky'));
  if (toAirM2 > 0)
    addGreyLink(
      builder,
      node,
      outside.airNode,
      toAirM2,
      emissivity,
      about('radiation to ground and low sky at air temperature'),
    );
}

const outsideFilmMethod = {
  'yazdanian-klems':
    'Yazdanian & Klems 1994 wind term, joined with natural convection (Walton 1983)',
  'iso-6946': 'ISO 6946, 4 + 4·v',
  mcadams: 'McAdams 1954, rough plate',
  constant: 'constant 20 W/(m²·K), as ISO 6946 has it at 4 m/s',
};

/** Sunlight absorbed by an opaque face outdoors, as a source at its node. */
export function addOuterSun(
  construction: Construction,
  face: OuterFace,
  shaded: ShadedWindow | null,
  outside: Outdoors,
  builder: NetworkBuilder,
): void {
  if (construction.outsideSolarAbsorptance === 0) return;
  const name = `sun absorbed outside, ${face.about.name}`;
  builder.source(
    face.node,
    construction.outsideSolarAbsorptance * face.areaM2,
    outside.totalSunSeries(face, shaded, name),
    name,
  );
}

/** Factor of the construction's roughness class on the wind's share of the film. */
export function roughnessOf(construction: Construction): number {
  return roughnessFactor[construction.outsideRoughness];
}
