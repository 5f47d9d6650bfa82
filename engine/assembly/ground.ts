// Surfaces on the ground: half a metre of soil with its heat capacity, a virtual layer that makes up the
// steady U-value of ISO 13370, and behind it the standard's virtual temperature month by month; or a
// column of soil down to a depth of one temperature.
//
// The virtual temperature rests on an inside temperature that has to be known before the run: the
// contact's own, or the monthly mean of the heating set-point (raised to the outdoor air's mean in months
// that are warmer). The run's own room temperature then drives the floor through soil and virtual layer.
import {
  type Building,
  constructionOf,
  type GroundContact,
  groundContactOf,
  type Room,
  type Surface,
} from '../building/index.ts';
import {
  groundMonthFlowW,
  type Layer,
  layerResistanceM2KPerW,
  meshConstruction,
  simulatedSoilM,
  virtualGroundC,
  virtualLayerM2KPerW,
} from '../physics/index.ts';
import { type Fineness, netAreaM2, physicsLayers } from './fabric.ts';
import { type GroundClimate, monthlyMeans, monthOfStep, yearlyCycle } from './ground-climate.ts';
import { type GroundPart, groundPart, type StandardContact } from './ground-part.ts';
import type { NetworkBuilder, Provenance } from './network-builder.ts';
import { scheduledValues } from './schedule-values.ts';
import type { StepClock } from './step-clock.ts';

/** What a surface on the ground is built from and into. */
export interface GroundTask {
  readonly building: Building;
  readonly room: Room;
  readonly fineness: Fineness;
  readonly clock: StepClock;
  readonly climate: () => GroundClimate;
  readonly builder: NetworkBuilder;
  /** Sentences for the report, added to. */
  readonly assumptions: string[];
}

/** Set-points below this mean "off" and say nothing of the room's temperature. */
const leastSetPointC = 5;

/** Adds what lies between the outer face of a surface's construction and the ground's temperature. */
export function addGround(
  task: GroundTask,
  surface: Surface,
  contactId: string,
  outerNode: number,
): void {
  const contact = groundContactOf(task.building, contactId);
  if (contact.kind === 'soil-column') addColumn(task, surface, contact, outerNode);
  else addStandard(task, surface, contact, outerNode);
}

function addColumn(
  task: GroundTask,
  surface: Surface,
  contact: Extract<GroundContact, { kind: 'soil-column' }>,
  outerNode: number,
): void {
  const { clock, builder } = task;
  const deepC = contact.deepTemperatureC ?? task.climate().outside.meanC;
  addSoil(task, surface, outerNode, {
    layers: [soilLayer(contact, contact.depthM)],
    beyond: builder.series(
      `${task.room.id}/${surface.id} deep ground`,
      'step',
      new Float64Array(clock.count).fill(deepC),
    ),
    method: 'one-dimensional column of soil over ground of one temperature',
    inputs: { depthM: contact.depthM, deepTemperatureC: deepC },
  });
  if (contact.deepTemperatureC === undefined)
    task.assumptions.push(
      `Ground "${contact.name ?? contact.id}": ${contact.depthM} m down it keeps the year's mean outdoor temperature, ${deepC.toFixed(1)} °C.`,
    );
}

function addStandard(
  task: GroundTask,
  surface: Surface,
  contact: StandardContact,
  outerNode: number,
): void {
  const { building, room, clock, builder } = task;
  const climate = task.climate();
  const areaM2 = netAreaM2(surface);
  const resistance = constructionResistance(building, surface);
  const part = groundPart(
    contact,
    {
      areaM2,
      upright: surface.tiltDeg <= 135,
      resistanceM2KPerW: resistance,
      floorResistanceM2KPerW: floorResistance(building, contact.id),
    },
    climate.windMPerS,
  );
  const insideC = insideMonths(task, contact);
  const virtualC = virtualMonths(part, areaM2, insideC, climate);
  const soil = contact.soil.conductivityWPerMK;
  const behind = 1 / part.uValueWPerM2K - part.insideFilmM2KPerW - resistance; // all of the ground
  // A small floor with little insulation leaves less than the resistance of 0.5 m of soil: take less.
  const soilM = part.touchesSoil ? Math.min(simulatedSoilM, 0.9 * behind * soil) : 0;
  const virtual =
    soilM === simulatedSoilM
      ? virtualLayerM2KPerW(part.uValueWPerM2K, part.insideFilmM2KPerW, resistance, soil)
      : behind - soilM / soil;
  const month = monthOfStep(clock);
  const layers: Layer[] = [{ kind: 'resistance', resistanceM2KPerW: virtual }];
  if (soilM > 0) layers.push(soilLayer(contact, soilM));
  addSoil(task, surface, outerNode, {
    layers,
    beyond: builder.series(
      `${room.id}/${surface.id} virtual ground`,
      'step',
      Float64Array.from(month, (m) => virtualC[m]),
    ),
    method: `${part.method}: virtual layer and monthly virtual temperature (Annex F)`,
    inputs: {
      areaM2,
      uValueWPerM2K: part.uValueWPerM2K,
      virtualLayerM2KPerW: virtual,
      soilM,
      insidePeriodicWPerK: part.cycle.insidePeriodicWPerK,
      outsidePeriodicWPerK: part.cycle.outsidePeriodicWPerK,
    },
  });
}

/** θ_v of the twelve months. */
export function virtualMonths(
  part: GroundPart,
  areaM2: number,
  insideC: readonly number[],
  climate: GroundClimate,
): number[] {
  const inside = yearlyCycle(insideC);
  return insideC.map((monthC, m) => {
    const flowW = groundMonthFlowW(
      part.cycle,
      inside,
      climate.outside,
      m + 1,
      climate.coldestMonth,
    );
    return virtualGroundC(monthC, flowW, areaM2, part.uValueWPerM2K);
  });
}

/** Inside temperature that the monthly flow rests on, with a sentence where it had to be assumed. */
function insideMonths(task: GroundTask, contact: StandardContact): number[] {
  const { building, room, clock, assumptions } = task;
  const climate = task.climate();
  const given = contact.insideC;
  if (given !== undefined)
    return typeof given === 'number' ? new Array<number>(12).fill(given) : [...given];
  const about = `Ground "${contact.name ?? contact.id}" under ${room.name}: for the monthly flow of ISO 13370 the room is taken`;
  if (!room.heating) {
    assumptions.push(`${about} at the outdoor air's monthly means, as it has no heating.`);
    return [...climate.monthC];
  }
  const set = scheduledValues(building, room.heating.setPointC, clock);
  const sums = monthlyMeans(
    set.map((v) => (v >= leastSetPointC ? v : 0)),
    clock,
  );
  const shares = monthlyMeans(
    set.map((v) => (v >= leastSetPointC ? 1 : 0)),
    clock,
  );
  const months = climate.monthC.map((outsideC, m) =>
    shares[m] > 0 ? Math.max(outsideC, sums[m] / shares[m]) : outsideC,
  );
  assumptions.push(
    `${about} at its heating set-point or the outdoor mean, whichever is higher: ${Math.min(...months).toFixed(1)} to ${Math.max(...months).toFixed(1)} °C by month.`,
  );
  return months;
}

function constructionResistance(building: Building, surface: Surface): number {
  const layers = physicsLayers(building, constructionOf(building, surface.construction));
  return layers.reduce((sum, layer) => sum + layerResistanceM2KPerW(layer), 0);
}

/** Mean by area of the floors that lie on a contact, in all rooms. */
function floorResistance(building: Building, contact: string): number {
  let areaM2 = 0;
  let sum = 0;
  for (const { surfaces } of building.rooms)
    for (const surface of surfaces) {
      const { boundary, tiltDeg } = surface;
      if (boundary.kind !== 'ground-contact' || boundary.contact !== contact || tiltDeg <= 135)
        continue;
      areaM2 += surface.areaM2;
      sum += surface.areaM2 * constructionResistance(building, surface);
    }
  return sum / areaM2;
}

function soilLayer(contact: GroundContact, thicknessM: number): Layer {
  const { conductivityWPerMK, heatCapacityJPerM3K } = contact.soil;
  return {
    kind: 'solid',
    thicknessM,
    conductivityWPerMK,
    densityKgPerM3: 1, // only the product with the specific heat counts
    specificHeatJPerKgK: heatCapacityJPerM3K,
  };
}

interface Soil {
  /** From the ground's temperature up to the construction. */
  readonly layers: readonly Layer[];
  /** Series of the temperature beyond. */
  readonly beyond: number;
  readonly method: string;
  readonly inputs: Provenance['inputs'];
}

/** Adds the chain from the ground's temperature to the outer face, whose node its last cell shares. */
function addSoil(task: GroundTask, surface: Surface, outerNode: number, soil: Soil): void {
  const { building, room, fineness, builder } = task;
  const areaM2 = netAreaM2(surface);
  const name = `${room.id}/${surface.id}`;
  const about = (what: string): Provenance => ({
    name: `${name} ${what}`,
    room: room.id,
    surface: surface.id,
    what,
    method: soil.method,
    inputs: soil.inputs,
  });
  const mesh = meshConstruction(soil.layers, { kind: building.physics.conduction, ...fineness });
  const last = mesh.capacityJPerM2K.length - 1;
  let node = builder.node(about('ground'), 0, soil.beyond);
  for (let i = 1; i <= last; i++) {
    const capacity = mesh.capacityJPerM2K[i] * areaM2;
    let next = outerNode;
    if (i === last) builder.addCapacity(outerNode, capacity);
    else next = builder.node(about(`soil node ${i}`), capacity);
    builder.constantLink(
      node,
      next,
      mesh.conductanceWPerM2K[i - 1] * areaM2,
      about(i === 1 ? 'ground below' : 'soil'),
    );
    node = next;
  }
}
