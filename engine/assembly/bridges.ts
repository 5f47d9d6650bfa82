// Thermal bridges as links between the room's air and what lies beyond.
//
//   H = l·ψ  or  n·χ   (ISO 14683, ISO 10211);  times b towards an unheated space (ISO 13789)
//
// ISO 14683 refers ψ and χ to the inside environment; the link ends at the air, without heat capacity.
import type { Building, Room, ThermalBridge } from '../building/index.ts';
import { bridgeTransmissionWPerK } from '../physics/index.ts';
import { monthOfStep } from './ground-climate.ts';
import type { NetworkBuilder, Provenance } from './network-builder.ts';
import type { Outdoors } from './outdoors.ts';
import type { RoomMeters } from './room-parts.ts';
import { scheduledValues } from './schedule-values.ts';
import type { StepClock } from './step-clock.ts';

/** Conductance of a bridge to what lies beyond it [W/K]; negative where its ψ is. */
export function bridgeWPerK(bridge: ThermalBridge): number {
  const plain =
    bridge.kind === 'linear'
      ? bridgeTransmissionWPerK([bridge.lengthM], [bridge.psiWPerMK], [])
      : bridgeTransmissionWPerK([], [], [bridge.count * bridge.chiWPerK]);
  return bridge.beyond.kind === 'outdoors' ? plain * bridge.beyond.reductionShare : plain;
}

/**
 * Adds the bridges of a room: those to outdoors as one link each where ψ is positive; negative ones are
 * taken off the sum, which the parser keeps from falling below 0.
 */
export function addBridges(
  building: Building,
  room: Room,
  parts: { readonly airNode: number; readonly meters: RoomMeters },
  outside: Outdoors,
  clock: StepClock,
  builder: NetworkBuilder,
): void {
  const byBeyond = new Map<string, ThermalBridge[]>();
  for (const bridge of room.thermalBridges) {
    const key = bridge.beyond.kind === 'outdoors' ? 'outdoors' : JSON.stringify(bridge.beyond);
    byBeyond.set(key, [...(byBeyond.get(key) ?? []), bridge]);
  }
  for (const bridges of byBeyond.values()) {
    const values = bridges.map(bridgeWPerK);
    const total = values.reduce((sum, value) => sum + value, 0);
    const positive = values.reduce((sum, value) => sum + Math.max(0, value), 0);
    if (!(total > 0)) continue;
    const { beyond } = bridges[0];
    const node = beyondNode(building, room, bridges[0], outside, clock, builder);
    bridges.forEach((bridge, i) => {
      if (!(values[i] > 0)) return;
      const about: Provenance = {
        name: `${room.id} bridge ${bridge.id}`,
        room: room.id,
        ...(bridge.surface === undefined ? {} : { surface: bridge.surface }),
        what: `thermal bridge, ${bridge.name ?? bridge.id}`,
        method: bridge.kind === 'linear' ? 'l·ψ, ISO 14683' : 'n·χ, ISO 10211',
        inputs: { conductanceWPerK: values[i], negativeBridgesShare: 1 - total / positive },
      };
      const ref = builder.constantLink(node, parts.airNode, (values[i] * total) / positive, about);
      builder.count(beyond.kind === 'ground' ? parts.meters.ground : parts.meters.opaque, 1, ref);
    });
  }
}

function beyondNode(
  building: Building,
  room: Room,
  bridge: ThermalBridge,
  outside: Outdoors,
  clock: StepClock,
  builder: NetworkBuilder,
): number {
  const { beyond } = bridge;
  if (beyond.kind === 'outdoors') return outside.airNode;
  const { temperatureC } = beyond;
  const values =
    typeof temperatureC === 'number'
      ? new Float64Array(clock.count).fill(temperatureC)
      : 'schedule' in temperatureC
        ? scheduledValues(building, temperatureC, clock)
        : Float64Array.from(monthOfStep(clock), (m) => temperatureC[m]);
  const name = `${room.id} beyond bridge ${bridge.id}`;
  return builder.node(
    { name, room: room.id, what: 'beyond a thermal bridge', method: 'as given', inputs: {} },
    0,
    builder.series(name, 'step', values),
  );
}
