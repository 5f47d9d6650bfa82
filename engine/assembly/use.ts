// People, lights and equipment as sources; heaters and chillers as controlled sources.
import type { Building, Heating, Room } from '../building/index.ts';
import type { NetworkBuilder } from './network-builder.ts';
import type { Face } from './room-parts.ts';
import { scheduledRamp, scheduleValues } from './schedule-values.ts';
import type { StepClock } from './step-clock.ts';

/** Nodes that feel a room's heat, and how radiation is shared out between the faces. */
export interface RoomNodes {
  readonly airNode: number;
  readonly faces: readonly Face[];
}

/** Share of each face when radiation reaches all of them by area; adds up to 1. */
export function areaShares(faces: readonly Face[]): Float64Array {
  const total = faces.reduce((sum, face) => sum + face.areaM2, 0);
  return Float64Array.from(faces, (face) => face.areaM2 / total);
}

/** Adds the gains of a room. `count(meter, …)` is left to the caller through the refs handed back. */
export function addGains(
  building: Building,
  room: Room,
  nodes: RoomNodes,
  clock: StepClock,
  builder: NetworkBuilder,
  meters: { readonly gains: number },
  faceMeter: (face: Face) => number,
): void {
  const shares = areaShares(nodes.faces);
  for (const gain of room.gains) {
    if (gain.powerW === 0) continue;
    const series =
      gain.schedule === undefined
        ? builder.constantSeries(1)
        : builder.series(
            `${room.id}/${gain.id}`,
            'step',
            scheduleValues(building, gain.schedule, clock),
          );
    const name = `${gain.kind} ${gain.name ?? gain.id}, ${room.name}`;
    const convectiveW = gain.powerW * (1 - gain.radiantShare);
    if (convectiveW > 0)
      builder.count(meters.gains, 1, builder.source(nodes.airNode, convectiveW, series, name));
    if (gain.radiantShare === 0) continue;
    nodes.faces.forEach((face, f) => {
      const ref = builder.source(
        face.node,
        gain.powerW * gain.radiantShare * shares[f],
        series,
        `${name}, radiant`,
      );
      builder.count(meters.gains, 1, ref);
      builder.count(faceMeter(face), -1, ref);
    });
  }
}

/** Adds a heater or chiller of a room; gives its index. */
export function addPlant(
  building: Building,
  room: Room,
  heating: Heating,
  kind: 'heater' | 'chiller',
  nodes: RoomNodes,
  clock: StepClock,
  builder: NetworkBuilder,
): number {
  const shares = areaShares(nodes.faces);
  const faceNodes = nodes.faces.map((face) => face.node);
  const mix = (airShare: number) =>
    airShare === 1
      ? { nodes: Int32Array.of(nodes.airNode), shares: Float64Array.of(1) }
      : {
          nodes: Int32Array.of(nodes.airNode, ...faceNodes),
          shares: Float64Array.of(airShare, ...Array.from(shares, (s) => s * (1 - airShare))),
        };
  const sensor = mix(heating.sensor === 'air' ? 1 : 0.5);
  const delivery = mix(heating.convectiveShare);
  return builder.plant({
    name: `${kind} of ${room.name}`,
    kind,
    sensorNodes: sensor.nodes,
    sensorWeights: sensor.shares,
    deliveryNodes: delivery.nodes,
    deliveryShares: delivery.shares,
    setPointSeries: builder.series(
      `${kind} set-point, ${room.name}`,
      'ramp',
      scheduledRamp(building, heating.setPointC, clock),
    ),
    maxSeries: builder.constantSeries(heating.maxW ?? Number.POSITIVE_INFINITY),
    bandK: heating.bandK,
  });
}
