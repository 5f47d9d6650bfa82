// Ground contacts and thermal bridges that contradict the rest of the building.
import type { Fault } from '../../weather/index.ts';
import type { Building } from './schema-project.ts';

type Add = (path: string, found: string, expected: string, mend: string) => void;

/** Drawings round to centimetres. */
const slack = 1.01;

/** Sizes of ground contacts and sums of bridges that cannot be. References must be sound already. */
export function groundFaults(building: Building, file: string): Fault[] {
  const faults: Fault[] = [];
  const add: Add = (path, found, expected, mend) =>
    faults.push({ file, place: { path }, found, expected, mend });
  building.groundContacts.forEach((contact, i) => {
    const path = `groundContacts[${i}]`;
    const on = building.rooms.flatMap((room) =>
      room.surfaces.filter(
        ({ boundary }) => boundary.kind === 'ground-contact' && boundary.contact === contact.id,
      ),
    );
    const areaOf = (upright: boolean) =>
      on
        .filter((surface) => surface.tiltDeg <= 135 === upright)
        .reduce((sum, surface) => sum + surface.areaM2, 0);
    if (contact.kind === 'soil-column') return;
    const floorM2 = areaOf(false);
    const wallM2 = areaOf(true);
    if (floorM2 > contact.areaM2 * slack)
      add(
        `${path}.areaM2`,
        `${contact.areaM2} m² with floors of ${round(floorM2)} m² on it`,
        `at least ${round(floorM2)}`,
        'The contact stands for the whole floor on the ground, across all rooms.',
      );
    if (contact.kind !== 'heated-basement') {
      if (wallM2 > 0)
        add(
          `${path}.kind`,
          `"${contact.kind}" with upright surfaces of ${round(wallM2)} m² on it`,
          '"heated-basement" or "soil-column"',
          'Only a basement has walls against the ground.',
        );
      return;
    }
    const most = contact.depthM * contact.perimeterM;
    if (wallM2 > most * slack)
      add(
        `${path}.depthM`,
        `walls of ${round(wallM2)} m² on depth times perimeter of ${round(most)} m²`,
        `walls of at most ${round(most)} m²`,
        'Cut the walls at ground level: what lies above looks outdoors.',
      );
  });
  building.rooms.forEach((room, i) => {
    bridgeFaults(room.thermalBridges, `rooms[${i}].thermalBridges`, add);
  });
  return faults;
}

function bridgeFaults(
  bridges: Building['rooms'][number]['thermalBridges'],
  path: string,
  add: Add,
) {
  const sums = new Map<string, number>();
  for (const bridge of bridges) {
    const plain =
      bridge.kind === 'linear' ? bridge.lengthM * bridge.psiWPerMK : bridge.count * bridge.chiWPerK;
    const outdoors = bridge.beyond.kind === 'outdoors';
    const key = outdoors ? 'outdoors' : JSON.stringify(bridge.beyond);
    const share = bridge.beyond.kind === 'outdoors' ? bridge.beyond.reductionShare : 1;
    sums.set(key, (sums.get(key) ?? 0) + plain * share);
  }
  for (const sum of sums.values())
    if (sum < 0)
      add(
        path,
        `bridges that add up to ${round(sum)} W/K`,
        'a sum of 0 or more',
        'Negative ψ goes with areas by outside dimensions: enter areas and ψ by inside dimensions.',
      );
}

const round = (value: number): number => Number(value.toPrecision(5));
