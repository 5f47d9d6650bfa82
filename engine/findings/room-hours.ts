// One room's hours: temperatures, powers and flows out of the run's records.
import type { RoomParts } from '../assembly/index.ts';
import type { Run } from '../network/index.ts';
import type { HourlyFlows, RoomHours } from './simulation.ts';

/**
 * Mean radiant temperature is the mean of the faces weighted by area and emissivity; operative is the
 * mean of air and mean radiant temperature, as ISO 7726 allows for air slower than 0.2 m/s.
 */
export function roomHours(run: Run, parts: RoomParts): RoomHours {
  const hours = run.records;
  const { recordNodes, meters } = run.problem;
  const width = recordNodes.length;
  const place = new Map(Array.from(recordNodes, (node, i) => [node, i]));
  const column = (node: number) => {
    const i = place.get(node);
    if (i === undefined) throw new Error(`node ${node} was not recorded`);
    return i;
  };
  const air = column(parts.airNode);
  const faces = parts.faces.map((face) => column(face.node));
  const weight = parts.faces.map((face) => face.areaM2 * face.emissivity);
  const total = weight.reduce((sum, w) => sum + w, 0);
  const airC = new Float64Array(hours);
  const meanRadiantC = new Float64Array(hours);
  const operativeC = new Float64Array(hours);
  for (let h = 0; h < hours; h++) {
    let sum = 0;
    for (let f = 0; f < faces.length; f++) sum += weight[f] * run.meanC[h * width + faces[f]];
    airC[h] = run.meanC[h * width + air];
    meanRadiantC[h] = sum / total;
    operativeC[h] = (airC[h] + meanRadiantC[h]) / 2;
  }
  const meter = (m: number) =>
    Float64Array.from({ length: hours }, (_, h) => run.meterW[h * meters.length + m]);
  const { meters: of } = parts;
  const flowsW: HourlyFlows = {
    solar: meter(of.solar),
    gains: meter(of.gains),
    heating: meter(of.heating),
    cooling: meter(of.cooling),
    opaque: meter(of.opaque),
    glazing: meter(of.glazing),
    ground: meter(of.ground),
    infiltration: meter(of.infiltration),
    ventilation: meter(of.ventilation),
    rooms: meter(of.rooms),
    storage: meter(of.storage),
  };
  const { comfort } = parts;
  return {
    id: parts.room.id,
    name: parts.room.name,
    floorAreaM2: parts.room.floorAreaM2,
    airC,
    meanRadiantC,
    operativeC,
    heatingW: Float64Array.from(flowsW.heating, (w) => Math.max(0, w)),
    coolingW: Float64Array.from(flowsW.cooling, (w) => Math.max(0, -w)),
    bandLowC: comfort ? comfort.bandLowC.slice() : new Float64Array(hours).fill(Number.NaN),
    bandHighC: comfort ? comfort.bandHighC.slice() : new Float64Array(hours).fill(Number.NaN),
    occupied: comfort ? comfort.occupied.slice() : new Uint8Array(hours),
    flowsW,
  };
}
