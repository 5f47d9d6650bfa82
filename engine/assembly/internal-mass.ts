// Furniture and other things inside the room that store heat.
import type { Building, Room } from '../building/index.ts';
import { thirdPowerFilm } from '../physics/index.ts';
import type { NetworkBuilder } from './network-builder.ts';
import type { RoomParts } from './room-parts.ts';

/** A capacity that exchanges with the air through its own surface, as an upright face would; gives its node. */
export function addInternalMass(
  building: Building,
  room: Room,
  mass: Room['internalMasses'][number],
  parts: Pick<RoomParts, 'airNode' | 'meters'>,
  builder: NetworkBuilder,
): number {
  const name = `${room.id}/${mass.id}`;
  const node = builder.node(
    {
      name,
      room: room.id,
      what: mass.name ?? 'internal mass',
      method: 'lumped capacity',
      inputs: { capacityJPerK: mass.capacityJPerK },
    },
    mass.capacityJPerK,
  );
  const about = {
    name: `${name} film`,
    room: room.id,
    what: 'convection at the internal mass',
    method: 'natural convection at an upright face (ASHRAE Handbook, Walton 1983)',
    inputs: { areaM2: mass.areaM2 },
  };
  if (building.physics.insideConvection === 'iso-6946')
    builder.constantLink(node, parts.airNode, 2.5 * mass.areaM2, {
      ...about,
      method: 'ISO 6946, Annex C',
    });
  else {
    const film = thirdPowerFilm(90);
    builder.buoyantLink(
      node,
      parts.airNode,
      film.warmerFace * mass.areaM2,
      film.coolerFace * mass.areaM2,
      about,
    );
  }
  builder.count(parts.meters.storage, 1, { kind: 'storage', node });
  return node;
}
