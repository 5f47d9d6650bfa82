// Ids that a project uses without defining them: filled in from the generic library, so that
// everything past the parser sees a complete building. What the project defines itself always prevails.
import {
  type DayShares,
  libraryConstructions,
  libraryGlazings,
  libraryMaterial,
  libraryUsages,
  projectConstruction,
  type UsageProfile,
} from './library/index.ts';
import type { Construction, Material } from './schema-fabric.ts';
import type { Gain, Usage } from './schema-gains.ts';
import type { Building } from './schema-project.ts';
import { type Room, roomSchema } from './schema-room.ts';
import type { Profile, Schedule } from './schema-use.ts';

const gainForm = roomSchema.shape.gains.unwrap().element;
const ventilationForm = roomSchema.shape.ventilation.unwrap().element;

/** The building with all that its ids find in the library, and a sentence on each kind taken from it. */
export function withLibrary(building: Building): Building {
  const rooms = building.rooms.map(withUsage);
  const fabric = fabricFromLibrary(building);
  const when = whenFromLibrary(building, rooms);
  const taken: [string, readonly string[]][] = [
    ['materials', fabric.materials.map((one) => one.id)],
    ['constructions', fabric.constructions.map((one) => one.id)],
    ['glazings', fabric.glazings.map((one) => one.id)],
    ['usage profiles', [...when.usages]],
  ];
  const fromLibrary = taken.flatMap(([what, ids]) =>
    ids.length === 0
      ? []
      : [`From the generic library (no product data): ${what} ${ids.join(', ')}.`],
  );
  if (fromLibrary.length === 0) return building;
  return {
    ...building,
    materials: [...building.materials, ...fabric.materials],
    constructions: [...building.constructions, ...fabric.constructions],
    glazings: [...building.glazings, ...fabric.glazings],
    profiles: [...building.profiles, ...when.profiles],
    schedules: [...building.schedules, ...when.schedules],
    rooms,
    fromLibrary,
  };
}

type Ided = { readonly id: string };
const idsOf = (list: readonly Ided[]) => new Set(list.map((one) => one.id));

function fabricFromLibrary(building: Building) {
  const materials = new Map<string, Material>();
  const constructions = new Map<string, Construction>();
  const glazings = new Map<string, Building['glazings'][number]>();
  const own = {
    materials: idsOf(building.materials),
    constructions: idsOf(building.constructions),
    glazings: idsOf(building.glazings),
  };
  const take = (id: string) => {
    const material = own.materials.has(id) ? undefined : libraryMaterial(id);
    if (material) materials.set(id, { ...material });
  };
  for (const room of building.rooms)
    for (const surface of room.surfaces) {
      const entry = libraryConstructions.find((one) => one.id === surface.construction);
      if (entry && !own.constructions.has(entry.id))
        constructions.set(entry.id, projectConstruction(entry).construction);
      for (const { glazing: id } of surface.openings) {
        const glazing = libraryGlazings.find((one) => one.glazing.id === id);
        if (glazing && !own.glazings.has(id)) glazings.set(id, glazing.glazing);
      }
    }
  for (const { layers } of [...building.constructions, ...constructions.values()])
    for (const layer of layers) if ('material' in layer) take(layer.material);
  return {
    materials: [...materials.values()],
    constructions: [...constructions.values()],
    glazings: [...glazings.values()],
  };
}

/** What of a usage profile a schedule can be: `living-room-occupancy` and so on. */
const facets = ['occupancy', 'lighting', 'equipment', 'heating', 'cooling'] as const;
type Facet = (typeof facets)[number];

export const usageSchedule = (usage: string, facet: Facet): string => `${usage}-${facet}`;
export const usageOf = (id: string): UsageProfile | undefined =>
  libraryUsages.find((one) => one.id === id);

/** The schedules that rooms and air paths name, where the library has them and the project has not. */
function whenFromLibrary(building: Building, rooms: readonly Room[]) {
  const usages = new Set<string>();
  const profiles = new Map<string, Profile>();
  const schedules = new Map<string, Schedule>();
  const ownProfiles = idsOf(building.profiles);
  const ownSchedules = idsOf(building.schedules);
  const named = new Set<string>();
  collectScheduleIds([rooms, building.airPaths, building.airExchanges], named);
  for (const id of named) {
    if (ownSchedules.has(id)) continue;
    const facet = facets.find((one) => id.endsWith(`-${one}`));
    const usage = facet && usageOf(id.slice(0, -facet.length - 1));
    if (!facet || !usage) continue;
    usages.add(usage.id);
    for (const day of ['weekday', 'weekend'] as const) {
      const profile = `${id}-${day}`;
      const values = [...facetValues(usage, facet, day)];
      if (!ownProfiles.has(profile)) profiles.set(profile, { kind: 'hours', id: profile, values });
    }
    const weekend = `${id}-weekend`;
    schedules.set(id, {
      id,
      name: `${usage.name}, ${facet}`,
      profile: `${id}-weekday`,
      saturday: weekend,
      sunday: weekend,
      holiday: weekend,
      periods: [],
    });
  }
  return { usages, profiles: [...profiles.values()], schedules: [...schedules.values()] };
}

/** Set-points hold while anybody is there, set-backs at all other hours. */
function facetValues(usage: UsageProfile, facet: Facet, day: 'weekday' | 'weekend'): DayShares {
  const { occupancy, lighting, equipment } = usage[day];
  if (facet === 'lighting') return lighting;
  if (facet === 'equipment') return equipment;
  if (facet === 'occupancy') return occupancy;
  const [set, back] =
    facet === 'heating'
      ? [usage.heatingSetPointC, usage.heatingSetBackC]
      : [usage.coolingSetPointC, usage.coolingSetBackC];
  return occupancy.map((share) => (share > 0 ? set : back));
}

const scheduleFields = new Set(['schedule', 'occupied', 'available']);

function collectScheduleIds(value: unknown, found: Set<string>): void {
  if (typeof value !== 'object' || value === null) return;
  for (const [key, inner] of Object.entries(value)) {
    if (typeof inner === 'string' && scheduleFields.has(key)) found.add(inner);
    else collectScheduleIds(inner, found);
  }
}

/** The room with the gains, and where asked the outdoor air, of its usage profile. */
function withUsage(room: Room): Room {
  if (room.usage === undefined) return room;
  const own: Exclude<Usage, string> =
    typeof room.usage === 'string'
      ? { profile: room.usage, ventilation: false, heatRecovery: 0 }
      : room.usage;
  const usage = usageOf(own.profile);
  if (!usage) return room; // named as a fault later
  const floorPerPersonM2 = own.floorPerPersonM2 ?? usage.floorPerPersonM2;
  const gain = (kind: Gain['kind'], facet: Facet, amount: Partial<Gain>) =>
    gainForm.parse({
      id: `${usage.id}-${kind}`,
      kind,
      name: `${kind} as in "${usage.name}"`,
      schedule: usageSchedule(usage.id, facet),
      ...amount,
    });
  const drawn = own.carrier === undefined ? {} : { carrier: own.carrier };
  const gains = [
    gain('people', 'occupancy', { floorPerPersonM2, activity: usage.activity }),
    gain('lighting', 'lighting', {
      powerWPerM2: own.lightingWPerM2 ?? usage.lightingWPerM2,
      ...drawn,
    }),
    gain('equipment', 'equipment', {
      powerWPerM2: own.equipmentWPerM2 ?? usage.equipmentWPerM2,
      ...drawn,
    }),
  ];
  const persons = room.floorAreaM2 / floorPerPersonM2;
  const air = (id: string, flowM3PerS: number, schedule: { schedule?: string }) =>
    flowM3PerS === 0
      ? []
      : [ventilationForm.parse({ id, flowM3PerS, heatRecovery: own.heatRecovery, ...schedule })];
  const ventilation = own.ventilation
    ? [
        ...air(`${usage.id}-people`, persons * usage.airPerPersonM3PerS, {
          schedule: usageSchedule(usage.id, 'occupancy'),
        }),
        ...air(`${usage.id}-building`, room.floorAreaM2 * usage.airPerAreaM3PerSM2, {}),
      ]
    : [];
  return {
    ...room,
    gains: [...room.gains, ...gains],
    ventilation: [...room.ventilation, ...ventilation],
  };
}
