// Heaters, chillers and the machines behind them: names that lead nowhere and numbers that no machine has.
import type { Fault } from '../../weather/index.ts';
import { carnotHeatingCop, ratedAt } from '../physics/index.ts';
import { nearest } from './check-references.ts';
import { constructionOf } from './find.ts';
import type { Supply } from './schema-energy.ts';
import type { Heating } from './schema-plant.ts';
import type { Building } from './schema-project.ts';
import type { Room } from './schema-room.ts';

type Add = (path: string, found: string, expected: string, mend: string) => void;

/** Every fault in the plant of the rooms and in the supplies. Constructions must be sound already. */
export function plantFaults(building: Building, file: string): Fault[] {
  const faults: Fault[] = [];
  const add: Add = (path, found, expected, mend) =>
    faults.push({ file, place: { path }, found, expected, mend });
  building.energy.supplies.forEach((supply, i) => {
    supplyFaults(building, supply, `energy.supplies[${i}]`, add);
  });
  for (const list of ['carriers', 'supplies'] as const) {
    const ids = building.energy[list].map((one) => one.id);
    ids.forEach((id, i) => {
      if (ids.indexOf(id) !== i)
        add(`energy.${list}[${i}].id`, `"${id}"`, 'an id used once', 'Rename one of them.');
    });
  }
  building.rooms.forEach((room, i) => {
    const path = `rooms[${i}]`;
    for (const field of ['heating', 'backupHeating', 'cooling'] as const) {
      const plant = room[field];
      if (plant) heatingFaults(building, room, plant, field, `${path}.${field}`, add);
    }
    if (room.backupHeating && !room.heating)
      add(
        `${path}.backupHeating`,
        'no heating to back up',
        'heating',
        'Name it "heating" instead.',
      );
    room.gains.forEach((gain, j) => {
      carrierFault(building, gain.carrier, `${path}.gains[${j}].carrier`, add);
    });
  });
  return faults;
}

function carrierFault(building: Building, id: string | undefined, path: string, add: Add) {
  const ids = building.energy.carriers.map((one) => one.id);
  if (id === undefined || ids.includes(id)) return;
  const near = nearest(id, new Set(ids));
  add(
    path,
    `"${id}"`,
    'the id of a carrier under energy.carriers',
    near ? `Did you mean "${near}"?` : 'Define it there, with its cost and CO₂.',
  );
}

function heatingFaults(
  building: Building,
  room: Room,
  plant: Heating,
  field: 'heating' | 'backupHeating' | 'cooling',
  path: string,
  add: Add,
) {
  const { emitter, maxW, bandK } = plant;
  const needsMost = (why: string) => {
    if (maxW === undefined && emitter?.kind !== 'radiator')
      add(`${path}.maxW`, 'nothing', 'the greatest power', why);
  };
  if (field === 'backupHeating') needsMost('It takes over by degrees, as a share of its power.');
  if (bandK > 0) needsMost('A proportional band is a share of the greatest power.');
  if (emitter?.kind === 'embedded')
    needsMost(
      'Without a limit the layer would be heated without bounds to serve the room at once.',
    );
  if (emitter && plant.convectiveShare !== 1)
    add(
      `${path}.convectiveShare`,
      `${plant.convectiveShare} with an emitter`,
      'no such field beside an emitter',
      'A radiator has its own radiantShare; an embedded emitter heats its surface.',
    );
  if (plant.optimumStart && (field !== 'heating' || typeof plant.setPointC === 'number'))
    add(
      `${path}.optimumStart`,
      field === 'heating' ? 'a constant set-point' : `optimum start of ${field}`,
      'heating whose set-point rises by a schedule',
      'Without a rise there is nothing to start ahead of.',
    );
  if (plant.available !== undefined && !building.schedules.some((s) => s.id === plant.available))
    add(
      `${path}.available`,
      `"${plant.available}"`,
      'the id of a schedule in this file',
      'Define it under schedules, or correct the name.',
    );
  if (field === 'backupHeating' && typeof plant.setPointC !== 'number') {
    const id = plant.setPointC.schedule;
    if (!building.schedules.some((s) => s.id === id))
      add(
        `${path}.setPointC.schedule`,
        `"${id}"`,
        'the id of a schedule in this file',
        'Define it under schedules, or correct the name.',
      );
  }
  if (emitter?.kind === 'embedded') embeddedFaults(building, room, emitter, `${path}.emitter`, add);
  if (plant.supply !== undefined) servedBy(building, plant.supply, field, `${path}.supply`, add);
}

function embeddedFaults(
  building: Building,
  room: Room,
  emitter: { readonly surface: string; readonly layer: number },
  path: string,
  add: Add,
) {
  const surface = room.surfaces.find((one) => one.id === emitter.surface);
  if (!surface) {
    const ids = room.surfaces.map((one) => one.id);
    add(
      `${path}.surface`,
      `"${emitter.surface}"`,
      `a surface of room "${room.id}": ${ids.join(', ')}`,
      'Name the surface that holds the pipes.',
    );
    return;
  }
  const { layers } = constructionOf(building, surface.construction);
  const layer = layers[emitter.layer];
  if (layer && 'material' in layer) return;
  add(
    `${path}.layer`,
    layer ? `layer ${emitter.layer}, a resistance without thickness` : `${emitter.layer}`,
    `the number of a layer with a material, 0 to ${layers.length - 1}`,
    'Count the layers of the construction from 0 as they are listed.',
  );
}

function servedBy(
  building: Building,
  id: string,
  field: 'heating' | 'backupHeating' | 'cooling',
  path: string,
  add: Add,
) {
  const { supplies } = building.energy;
  const supply = supplies.find((one) => one.id === id);
  if (!supply) {
    const near = nearest(id, new Set(supplies.map((one) => one.id)));
    add(
      path,
      `"${id}"`,
      'the id of a supply under energy.supplies',
      near ? `Did you mean "${near}"?` : 'Define it there, or leave the field out.',
    );
    return;
  }
  const cools = supply.kind === 'chiller';
  if (supply.kind === 'direct') return;
  if (cools !== (field === 'cooling'))
    add(
      path,
      `a ${supply.kind} for ${field}`,
      field === 'cooling' ? 'a chiller' : 'a boiler or heat pump',
      'Choose a supply that makes what is needed.',
    );
}

function supplyFaults(building: Building, supply: Supply, path: string, add: Add) {
  carrierFault(building, supply.carrier, `${path}.carrier`, add);
  carrierFault(building, supply.auxiliaryCarrier, `${path}.auxiliaryCarrier`, add);
  if (supply.kind === 'direct' || supply.kind === 'boiler') return;
  const name = supply.kind === 'chiller' ? 'eer' : 'cop';
  const tested = supply.kind === 'chiller' ? supply.eer : supply.cop;
  if ((tested === undefined) === (supply.carnot === undefined))
    add(
      path,
      tested ? `${name} and carnot together` : `neither ${name} nor carnot`,
      `one of ${name} (tested values) and carnot (a share of the limit)`,
      'Give the one that you know.',
    );
  const flow = supply.carnot?.flowC;
  const lists = { [name]: tested, capacityW: supply.capacityW };
  for (const [field, list] of Object.entries(lists)) rising(list, `${path}.${field}`, add);
  if (Array.isArray(flow)) rising(flow, `${path}.carnot.flowC`, add);
  if (supply.kind !== 'heat-pump') return;
  carrierFault(building, supply.backup?.carrier, `${path}.backup.carrier`, add);
  // No machine that heats a room delivers below 20 °C, so this limit holds for all of them.
  supply.cop?.forEach((point, i) => {
    const coldC = point.outdoorC;
    if (coldC >= 20) return;
    const limit = carnotHeatingCop(coldC, 20);
    if (point.value > limit)
      add(
        `${path}.cop[${i}].value`,
        `${point.value}`,
        `at most ${limit.toFixed(1)}, the Carnot limit from ${coldC} °C to a room at 20 °C`,
        'No machine exceeds it; check the test point.',
      );
  });
  if (supply.carnot && supply.sourceC !== undefined) {
    const hotC = typeof flow === 'number' ? flow : ratedAt(flow ?? [], supply.sourceC);
    if (hotC <= supply.sourceC)
      add(
        `${path}.carnot.flowC`,
        `${hotC}`,
        `more than sourceC, ${supply.sourceC}`,
        'Heat that is warm enough needs no heat pump; correct one of them.',
      );
  }
}

function rising(list: readonly { outdoorC: number }[] | undefined, path: string, add: Add) {
  list?.forEach((point, i) => {
    if (i > 0 && point.outdoorC <= list[i - 1].outdoorC)
      add(
        `${path}[${i}].outdoorC`,
        `${point.outdoorC}`,
        `more than ${list[i - 1].outdoorC}`,
        'Put the points in rising order of temperature, each once.',
      );
  });
}
