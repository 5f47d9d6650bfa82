// Single changes that might cure a room that overheats. Each is an ordinary measure in the terms of the
// project, put on the rooms that fail and nowhere else; what it does is found by running it.
import {
  type Building,
  constructionOf,
  type Glazing,
  glazingOf,
  type Opening,
  type Room,
} from '../building/index.ts';
import { glassUWPerM2K } from './u-values.ts';

export interface Trial {
  readonly id: string;
  readonly name: string;
  /** What exactly is changed, as a sentence. */
  readonly what: string;
  /** Null where it has nothing to change. */
  readonly apply: (building: Building, rooms: ReadonlySet<string>) => Building | null;
}

const own = 'study-trial'; // prefix of what trials add
const sunProtectionG = 0.28; // a usual sun-protection double glazing; common practice, no source

type Ventilation = Room['ventilation'][number];

function changeRooms(
  building: Building,
  rooms: ReadonlySet<string>,
  change: (room: Room) => Room | null,
): Building | null {
  let touched = false;
  const list = building.rooms.map((room) => {
    const next = rooms.has(room.id) ? change(room) : null;
    if (next) touched = true;
    return next ?? room;
  });
  return touched ? { ...building, rooms: list } : null;
}

/** Changes the openings of surfaces to outdoors; null where none is. */
function changeOpenings(room: Room, change: (opening: Opening) => Opening | null): Room | null {
  let touched = false;
  const surfaces = room.surfaces.map((surface) => ({
    ...surface,
    openings: surface.openings.map((opening) => {
      const next = change(opening);
      if (next) touched = true;
      return next ?? opening;
    }),
  }));
  return touched ? { ...room, surfaces } : null;
}

function outsideBlinds(building: Building, rooms: ReadonlySet<string>): Building | null {
  const covering = `${own}-blind`;
  const changed = changeRooms(building, rooms, (room) =>
    changeOpenings(room, (opening) =>
      opening.blind
        ? null
        : {
            ...opening,
            blind: {
              covering,
              position: 'outside',
              gap: 0,
              distanceM: 0.1,
              openShare: 1,
              control: { sunAboveWPerM2: 120, outdoorAboveC: 14, bandK: 1, atNight: false },
            },
          },
    ),
  );
  return (
    changed && {
      ...changed,
      coverings: [
        ...changed.coverings,
        {
          kind: 'blind',
          id: covering,
          name: 'Outside blind, light cloth',
          solarTransmittance: 0.15,
          openness: 0.05,
          solarReflectance: 0.55,
          frontEmissivity: 0.9,
          backEmissivity: 0.9,
        },
      ],
    }
  );
}

function sunGlass(building: Building, rooms: ReadonlySet<string>): Building | null {
  const added = new Map<string, Glazing>();
  const changed = changeRooms(building, rooms, (room) =>
    changeOpenings(room, (opening) => {
      const glazing = glazingOf(building, opening.glazing);
      if (glazing.kind === 'simple' && glazing.gValue <= sunProtectionG) return null;
      const id = `${own}-${opening.glazing}`;
      added.set(id, {
        kind: 'simple',
        id,
        name: `${glazing.name}, sun protection`,
        uValueWPerM2K: Math.min(7, glassUWPerM2K(glazing)),
        gValue: sunProtectionG,
      });
      return { ...opening, glazing: id };
    }),
  );
  return changed && { ...changed, glazings: [...changed.glazings, ...added.values()] };
}

function canopies(building: Building, rooms: ReadonlySet<string>): Building | null {
  return changeRooms(building, rooms, (room) =>
    changeOpenings(room, (opening) =>
      (opening.shading?.overhang?.depthM ?? 0) >= 1 || !opening.rectangle
        ? null
        : {
            ...opening,
            shading: {
              revealM: 0,
              ...opening.shading,
              overhang: { depthM: 1, gapM: 0.1, leftM: 0.5, rightM: 0.5 },
            },
          },
    ),
  );
}

/** Air brought in while outdoors is cooler; heat recovery and schedules stay out of it. */
function coolerAir(
  id: string,
  changesPerH: number,
  control: NonNullable<Ventilation['control']>,
): Trial['apply'] {
  return (building, rooms) =>
    changeRooms(building, rooms, (room) => ({
      ...room,
      ventilation: [
        ...room.ventilation,
        {
          id: `${own}-${id}`,
          flowM3PerS: (changesPerH * room.volumeM3) / 3600,
          heatRecovery: 0,
          moistureRecovery: 0,
          control,
        },
      ],
    }));
}

const nightAir: Trial['apply'] = (building, rooms) => {
  const id = `${own}-night`;
  const changed = coolerAir('night-air', 4, {
    schedule: id,
    roomAboveC: 21,
    warmerThanOutdoorsK: 2,
    bandK: 1,
  })(building, rooms);
  const values = Array.from({ length: 24 }, (_, h) => (h >= 22 || h < 7 ? 1 : 0));
  return (
    changed && {
      ...changed,
      profiles: [...changed.profiles, { kind: 'hours', id, values }],
      schedules: [...changed.schedules, { id, profile: id, periods: [] }],
    }
  );
};

const dayAir = coolerAir('wide-windows', 6, {
  roomAboveC: 23,
  warmerThanOutdoorsK: 1,
  bandK: 1,
});

function fewerGains(building: Building, rooms: ReadonlySet<string>): Building | null {
  return changeRooms(building, rooms, (room) => {
    if (!room.gains.some((gain) => gain.kind !== 'people')) return null;
    return {
      ...room,
      gains: room.gains.map((gain) =>
        gain.kind === 'people'
          ? gain
          : {
              ...gain,
              ...(gain.powerW === undefined ? {} : { powerW: gain.powerW / 2 }),
              ...(gain.powerWPerM2 === undefined ? {} : { powerWPerM2: gain.powerWPerM2 / 2 }),
            },
      ),
    };
  });
}

/** 6 cm of concrete for each square metre of floor: 2300 kg/m³ · 1000 J/kgK · 0.06 m. */
const massJPerM2K = 138_000;

function moreMass(building: Building, rooms: ReadonlySet<string>): Building | null {
  return changeRooms(building, rooms, (room) => ({
    ...room,
    internalMasses: [
      ...room.internalMasses,
      {
        id: `${own}-mass`,
        capacityJPerK: massJPerM2K * room.floorAreaM2,
        areaM2: room.floorAreaM2,
      },
    ],
  }));
}

function lightFaces(building: Building, rooms: ReadonlySet<string>): Building | null {
  const added = new Map<string, Building['constructions'][number]>();
  const changed = changeRooms(building, rooms, (room) => {
    let touched = false;
    const surfaces = room.surfaces.map((surface) => {
      const construction = constructionOf(building, surface.construction);
      if (surface.boundary.kind !== 'outdoors' || construction.outsideSolarAbsorptance <= 0.3)
        return surface;
      touched = true;
      const id = `${own}-light-${construction.id}`.slice(0, 60);
      added.set(id, { ...construction, id, outsideSolarAbsorptance: 0.3 });
      return { ...surface, construction: id };
    });
    return touched ? { ...room, surfaces } : null;
  });
  return changed && { ...changed, constructions: [...changed.constructions, ...added.values()] };
}

export const trials: readonly Trial[] = [
  {
    id: 'outside-blinds',
    name: 'Outside blinds',
    what: 'Light cloth before every window, drawn while the sun on it passes 120 W/m² and outdoors is above 14 °C.',
    apply: outsideBlinds,
  },
  {
    id: 'sun-glass',
    name: `Glazing with g ${sunProtectionG}`,
    what: `All glass with a g-value of ${sunProtectionG} and the U-value that it has.`,
    apply: sunGlass,
  },
  {
    id: 'canopies',
    name: 'Canopies 1 m deep',
    what: 'A plate 1 m deep over every window whose place on the wall is given.',
    apply: canopies,
  },
  {
    id: 'night-air',
    name: 'Night air, 4 air changes',
    what: 'From 22:00 to 07:00, 4 air changes an hour while the room is above 21 °C and outdoors is 2 K cooler.',
    apply: nightAir,
  },
  {
    id: 'wide-windows',
    name: 'Windows wide open, 6 air changes',
    what: 'Day and night, 6 air changes an hour while the room is above 23 °C and outdoors is 1 K cooler.',
    apply: dayAir,
  },
  {
    id: 'half-gains',
    name: 'Half the lights and equipment',
    what: 'Power of lights and equipment halved.',
    apply: fewerGains,
  },
  {
    id: 'more-mass',
    name: 'Mass of 6 cm of concrete',
    what: 'An open mass like 6 cm of concrete over the floor area.',
    apply: moreMass,
  },
  {
    id: 'light-faces',
    name: 'Light outside faces',
    what: 'Outside walls and roofs that absorb 0.3 of the sun.',
    apply: lightFaces,
  },
];
