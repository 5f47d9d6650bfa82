// Where the heat of a heater (or the cold of a chiller) enters the room: at once, by a radiator with
// inertia, or inside a layer of a surface.
import type { Heating, Radiator, Room } from '../building/index.ts';
import type { FlowRef, NetworkBuilder, Provenance } from './network-builder.ts';
import type { Face } from './room-parts.ts';
import { areaShares, type RoomNodes } from './shares.ts';

export interface Delivery {
  readonly nodes: Int32Array;
  readonly shares: Float64Array;
  /** Body with inertia between plant and room, or −1. */
  readonly bodyNode: number;
  /** Share of the power that the plant puts on (or into the surface of) a face. */
  readonly onFaces: readonly { readonly face: Face; readonly share: number }[];
  /** Links from the body to faces. */
  readonly toFaces: readonly { readonly face: Face; readonly ref: FlowRef }[];
}

export function delivery(
  room: Room,
  plant: Heating,
  name: string,
  nodes: RoomNodes,
  builder: NetworkBuilder,
): Delivery {
  const { emitter } = plant;
  if (!emitter) return toRoom(plant.convectiveShare, nodes);
  if (emitter.kind === 'radiator') return byRadiator(room, emitter, name, nodes, builder);
  const face = nodes.faces.find((one) => one.surface === emitter.surface && one.layers);
  const middle = face?.layers?.[emitter.layer];
  if (!face || !middle) throw new Error(`${room.id}/${emitter.surface} has no such layer`); // checked
  return {
    nodes: Int32Array.from(middle.nodes),
    shares: Float64Array.from(middle.shares),
    bodyNode: -1,
    onFaces: [{ face, share: 1 }],
    toFaces: [],
  };
}

/** Part to the air, the rest to all faces by area. */
function toRoom(convectiveShare: number, { airNode, faces }: RoomNodes): Delivery {
  const none = { bodyNode: -1, onFaces: [], toFaces: [] };
  if (convectiveShare === 1)
    return { nodes: Int32Array.of(airNode), shares: Float64Array.of(1), ...none };
  const radiant = areaShares(faces).map((share) => share * (1 - convectiveShare));
  return {
    nodes: Int32Array.of(airNode, ...faces.map((face) => face.node)),
    shares: Float64Array.of(convectiveShare, ...radiant),
    ...none,
    onFaces: faces.map((face, f) => ({ face, share: radiant[f] })),
  };
}

/** Below this difference the power law is let run out straight, or its slope would vanish at 0 [K]. */
const softK = 0.01;
/** Metal and water for each watt of nominal output; common practice, no source [J/K]. */
const capacityPerWatt = 30;

/** Conductance of a radiator's part of nominal output `partW` at this difference [W/K]. */
export function radiatorWPerK(radiator: Radiator, partW: number, differenceK: number): number {
  const { nominalExcessK, exponent } = radiator;
  const ratio2 = (differenceK * differenceK + softK * softK) / (nominalExcessK * nominalExcessK);
  return (partW / nominalExcessK) * ratio2 ** ((exponent - 1) / 2);
}

/**
 * A node with the radiator's capacity, joined to the air and to each face.
 *
 *   Φ = Φ_nominal · (ΔT/ΔT_nominal)^n
 *
 * The radiant part is shared out by area and each share follows the difference to its own face.
 *
 * Source: EN 442-2:2014, characteristic equation of the standard output; the split is common practice.
 */
function byRadiator(
  room: Room,
  radiator: Radiator,
  name: string,
  { airNode, faces }: RoomNodes,
  builder: NetworkBuilder,
): Delivery {
  const { nominalW, nominalExcessK, exponent, radiantShare } = radiator;
  const capacityJPerK = radiator.capacityJPerK ?? capacityPerWatt * nominalW;
  const about = (what: string, method: string, inputs: Provenance['inputs']): Provenance => ({
    name: `emitter, ${name}`,
    room: room.id,
    what,
    method,
    inputs,
  });
  const bodyNode = builder.node(
    about('radiator, metal and water', 'lumped capacity', { capacityJPerK }),
    capacityJPerK,
  );
  const link = (to: number, partW: number, what: string) =>
    builder.functionLink(
      bodyNode,
      to,
      (bodyC, toC) => radiatorWPerK(radiator, partW, bodyC - toC),
      about(what, 'characteristic equation of EN 442', { partW, nominalExcessK, exponent }),
    );
  if (radiantShare < 1) link(airNode, nominalW * (1 - radiantShare), 'convection of the radiator');
  const shares = areaShares(faces);
  const toFaces =
    radiantShare === 0
      ? []
      : faces.map((face, f) => ({
          face,
          ref: link(face.node, nominalW * radiantShare * shares[f], 'radiation of the radiator'),
        }));
  return {
    nodes: Int32Array.of(bodyNode),
    shares: Float64Array.of(1),
    bodyNode,
    onFaces: [],
    toFaces,
  };
}
