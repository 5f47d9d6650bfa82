// What the parser takes from the library, and what it refuses of use, plant, energy and comfort. The
// expectations are the format's own rules, unless a source is named.
import { describe, expect, test } from 'vitest';
import { carnotHeatingCop } from '../../../engine/physics/index.ts';
import { building, type Json, messages, plainProject, plainRoom } from '../assembly/plain-room.ts';

const gas = { id: 'gas', name: 'Gas', costPerKWh: 0.1, co2KgPerKWh: 0.2 };

/** The plain room with some fields set, and energy beside it. */
const withRoom = (fields: Json, energy: Json = {}) =>
  plainProject([{ ...plainRoom(), ...fields }], { energy });
const one = (fields: Json, energy: Json = {}) => {
  const list = messages(withRoom(fields, energy));
  expect(list).toHaveLength(1);
  return list[0];
};

describe('ids that the project does not define', () => {
  test('are taken from the generic library, with all they need, and said so', () => {
    const project = plainProject([plainRoom()]);
    const [room] = project.rooms;
    room.surfaces[0].construction = 'wall-cavity-filled-50';
    room.surfaces[0].openings = [{ id: 'w', glazing: 'double-warm-argon', areaM2: 3 }];
    room.surfaces[1].construction = 'own';
    const layers = [{ material: 'brick-solid', thicknessM: 0.1 }];
    project.constructions.push({ id: 'own', name: 'Own', layers });
    const read = building(project);
    const ids = (list: readonly { id: string }[]) => list.map((item) => item.id);
    expect(ids(read.constructions)).toEqual(['shell', 'slab', 'own', 'wall-cavity-filled-50']);
    expect(ids(read.glazings)).toEqual(['double-warm-argon']);
    expect(ids(read.materials)).toContain('brick-solid');
    const [wall] = read.constructions.slice(-1);
    for (const layer of wall.layers)
      if ('material' in layer) expect(ids(read.materials)).toContain(layer.material);
    expect(read.fromLibrary?.join(' ')).toContain('constructions wall-cavity-filled-50');
    expect(read.fromLibrary?.join(' ')).toContain('glazings double-warm-argon');
  });

  test('of usage profiles become gains and schedules', () => {
    const read = building(withRoom({ usage: { profile: 'living-room', ventilation: true } }));
    const [room] = read.rooms;
    expect(room.gains.map((gain) => gain.kind)).toEqual(['people', 'lighting', 'equipment']);
    expect(room.gains[0]).toMatchObject({ floorPerPersonM2: 12, activity: 'seated' });
    // 0.42 l/(s·m²) on 80 m²: EN 16798-1:2019, Annex B, dwellings (from memory).
    expect(room.ventilation.map((air) => air.flowM3PerS)).toEqual([expect.closeTo(0.0336, 9)]);
    expect(read.schedules.map((schedule) => schedule.id)).toContain('living-room-occupancy');
    expect(read.fromLibrary?.join()).toContain('usage profiles living-room');
  });

  test('of schedules come by usage and what is meant, also alone', () => {
    const read = building(
      withRoom({ heating: { setPointC: { schedule: 'office-single-heating' } } }),
    );
    const profile = read.profiles.find((item) => item.id === 'office-single-heating-weekday');
    expect(profile?.kind === 'hours' && Math.max(...profile.values)).toBeGreaterThan(
      profile?.kind === 'hours' ? Math.min(...profile.values) : 0,
    );
  });

  test('are named with the nearest one where the library has none', () => {
    expect(one({ usage: 'livingroom' })).toContain('Did you mean "living-room"?');
  });

  test('never replace what the project defines itself', () => {
    const read = building({
      ...withRoom({ usage: 'living-room' }),
      profiles: [{ kind: 'hours', id: 'x', values: Array.from({ length: 24 }, () => 0.3) }],
      schedules: [{ id: 'living-room-occupancy', profile: 'x' }],
    });
    expect(
      read.schedules.filter((item) => item.id === 'living-room-occupancy').map((s) => s.profile),
    ).toEqual(['x']);
  });
});

describe('gains', () => {
  const gains = (gain: Json) => ({ gains: [{ id: 'g', kind: 'people', ...gain }] });
  test.each([
    ['no amount', {}, 'found no amount, expected exactly one of powerW'],
    ['two amounts', { powerW: 5, persons: 2 }, 'found powerW and persons together'],
    ['lights by heads', { kind: 'lighting', persons: 2 }, 'persons with kind "lighting"'],
    ['an unknown carrier', { powerW: 5, carrier: 'gas' }, 'the id of a carrier under energy'],
    ['a negative power', { powerW: -5 }, 'gains[0].powerW: found -5'],
  ])('with %s are refused', (_, gain, text) => {
    expect(one(gains(gain))).toContain(text);
  });
});

describe('plant', () => {
  test.each<[string, Json, string]>([
    ['a band without limit', { bandK: 1 }, 'heating.maxW: found nothing'],
    [
      'an emitter in no surface',
      { maxW: 1000, emitter: { kind: 'embedded', surface: 'flor', layer: 0 } },
      'emitter.surface: found "flor"',
    ],
    [
      'an emitter in a layer that is none',
      { maxW: 1000, emitter: { kind: 'embedded', surface: 'floor', layer: 3 } },
      'emitter.layer: found 3, expected the number of a layer with a material, 0 to 0',
    ],
    [
      'an emitter in a mere resistance',
      { maxW: 1000, emitter: { kind: 'embedded', surface: 'south', layer: 0 } },
      'a resistance without thickness',
    ],
    [
      'an embedded emitter without limit',
      { emitter: { kind: 'embedded', surface: 'floor', layer: 0 } },
      'heating.maxW: found nothing',
    ],
    [
      'an emitter and a share',
      { convectiveShare: 0.5, emitter: { kind: 'radiator', nominalW: 1000 } },
      'no such field beside an emitter',
    ],
    ['an early start with nothing to start for', { optimumStart: {} }, 'a constant set-point'],
    ['an unknown season', { available: 'winter' }, 'heating.available: found "winter"'],
    ['an unknown supply', { supply: 'boiler' }, 'the id of a supply under energy.supplies'],
  ])('with %s is refused', (_, fields, text) => {
    expect(one({ heating: { setPointC: 20, ...fields } })).toContain(text);
  });

  test('a backup needs something to back up, and a limit', () => {
    const list = messages(withRoom({ backupHeating: { setPointC: 20 } }));
    expect(list.join('\n')).toContain('backupHeating.maxW: found nothing');
    expect(list.join('\n')).toContain('no heating to back up');
  });

  test('a chiller cannot heat', () => {
    const supplies = [
      { kind: 'chiller', id: 'c', carrier: 'gas', eer: [{ outdoorC: 30, value: 3 }] },
    ];
    expect(
      one({ heating: { setPointC: 20, supply: 'c' } }, { carriers: [gas], supplies }),
    ).toContain('a chiller for heating');
  });
});

describe('supplies', () => {
  const pump = (fields: Json) =>
    messages(
      withRoom(
        {},
        { carriers: [gas], supplies: [{ kind: 'heat-pump', id: 'p', carrier: 'gas', ...fields }] },
      ),
    ).join('\n');

  // Carnot: no machine between 0 °C and a room at 20 °C does better than 293.15/20 = 14.66.
  test('above the Carnot limit are refused with the limit', () => {
    expect(carnotHeatingCop(0, 20)).toBeCloseTo(14.6575, 4);
    expect(pump({ cop: [{ outdoorC: 0, value: 15 }] })).toContain('at most 14.7');
    expect(pump({ cop: [{ outdoorC: 0, value: 4 }] })).toBe('');
  });
  test.each<[string, Json, string]>([
    ['no efficiency', {}, 'neither cop nor carnot'],
    [
      'points out of order',
      {
        cop: [
          { outdoorC: 7, value: 4 },
          { outdoorC: 2, value: 3 },
        ],
      },
      'cop[1].outdoorC: found 2, expected more than 7',
    ],
    ['an unknown carrier', { carrier: 'gaz', cop: [{ outdoorC: 7, value: 4 }] }, 'mean "gas"'],
    [
      'a source warmer than the flow',
      { sourceC: 40, carnot: { flowC: 35 } },
      'found 35, expected more than sourceC, 40',
    ],
  ])('with %s are refused', (_, fields, text) => {
    expect(pump(fields)).toContain(text);
  });

  test('a boiler that gives more than it burns (on gross value 100 %, on net 111 %) is refused', () => {
    const boiler = {
      kind: 'boiler',
      id: 'b',
      carrier: 'gas',
      nominalW: 9000,
      fullLoadEfficiency: 1.3,
      partLoadEfficiency: 0.9,
    };
    expect(one({}, { carriers: [gas], supplies: [boiler] })).toContain('at most 1.11');
  });
});

describe('comfort', () => {
  const comfort = (votes: Json) => ({ comfort: { bandLowC: 20, bandHighC: 26, votes } });
  test.each<[string, Json, string]>([
    ['clothing of 3 clo', { clothingClo: 3 }, 'votes.clothingClo'],
    ['activity below sleep', { metRate: 0.5 }, 'votes.metRate'],
    ['humidity above 1', { relativeHumidity: 1.5 }, 'votes.relativeHumidity: found 1.5'],
    ['a schedule that is none', { metRate: { schedule: 'm' } }, 'metRate.schedule: found "m"'],
  ])('with %s is refused', (_, votes, text) => {
    expect(one(comfort(votes))).toContain(text);
  });

  test('a clothing schedule beyond the method is refused', () => {
    const project = {
      ...withRoom(comfort({ clothingClo: { schedule: 'c' } })),
      profiles: [{ kind: 'hours', id: 'heavy', values: Array.from({ length: 24 }, () => 2.5) }],
      schedules: [{ id: 'c', profile: 'heavy' }],
    };
    expect(messages(project).join()).toContain('2.5 in profile "heavy", expected 0 to 2 clo');
  });
});
