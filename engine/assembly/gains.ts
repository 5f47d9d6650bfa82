// People, lights and equipment as sources, and what of them the findings count hour by hour.
import type { Building, Gain, Room } from '../building/index.ts';
import { activityMet, personGain } from '../physics/index.ts';
import { hourlySetPoint } from './comfort-hours.ts';
import type { NetworkBuilder } from './network-builder.ts';
import type { Face } from './room-parts.ts';
import { scheduleValues } from './schedule-values.ts';
import { areaShares, type RoomNodes } from './shares.ts';
import type { StepClock } from './step-clock.ts';

/** Dry heat of people is stated at this air temperature; above it they sweat more. */
const referenceC = 24;
/** Air at which no dry heat is left. */
const bodyC = 36;
/** Vapour pressure at which people's heat is split: 24 °C at 47 %; common practice, no source. */
export const referenceVapourPa = 1400;

/** People of one gain, for what depends on the room's state: vapour, latent heat, carbon dioxide. */
export interface PeopleHours {
  readonly metRate: number;
  /** Whether their dry heat falls above 24 °C. */
  readonly sweats: boolean;
  /** People in the room, mean of each hour. */
  readonly heads: Float64Array;
}

/** Power that a gain draws from a carrier, mean of each hour. */
export interface DrawnHours {
  readonly carrier: string;
  readonly powerW: Float64Array;
}

export interface GainParts {
  readonly people: readonly PeopleHours[];
  readonly drawn: readonly DrawnHours[];
}

/** People at schedule value 1, or 0 where the gain is not counted by heads. */
export function headsOf(room: Room, gain: Gain): number {
  if (gain.persons !== undefined) return gain.persons;
  return gain.floorPerPersonM2 === undefined ? 0 : room.floorAreaM2 / gain.floorPerPersonM2;
}

export function metRateOf(gain: Gain): number {
  return activityMet[gain.activity ?? 'seated-work'];
}

/** Sensible heat of a gain at schedule value 1, people at 24 °C [W]. */
export function gainPowerW(room: Room, gain: Gain): number {
  if (gain.powerW !== undefined) return gain.powerW;
  if (gain.powerWPerM2 !== undefined) return gain.powerWPerM2 * room.floorAreaM2;
  return headsOf(room, gain) * personGain(metRateOf(gain), referenceC, referenceVapourPa).sensibleW;
}

/** The gain's share of its full value in each step. */
function sharesOf(building: Building, gain: Gain, clock: StepClock): Float64Array {
  return gain.schedule === undefined
    ? new Float64Array(clock.count).fill(1)
    : scheduleValues(building, gain.schedule, clock);
}

/** Adds the gains of a room: part to its air, part as radiation to its faces by area. */
export function addGains(
  building: Building,
  room: Room,
  nodes: RoomNodes,
  clock: StepClock,
  builder: NetworkBuilder,
  meters: { readonly gains: number },
  faceMeter: (face: Face) => number,
): GainParts {
  const shares = areaShares(nodes.faces);
  const people: PeopleHours[] = [];
  const drawn: DrawnHours[] = [];
  for (const gain of room.gains) {
    const powerW = gainPowerW(room, gain);
    if (powerW === 0) continue;
    const values = sharesOf(building, gain, clock);
    const series =
      gain.schedule === undefined
        ? builder.constantSeries(1)
        : builder.series(`${room.id}/${gain.id}`, 'step', values);
    const name = `${gain.kind} ${gain.name ?? gain.id}, ${room.name}`;
    const convectiveW = powerW * (1 - gain.radiantShare);
    if (convectiveW > 0)
      builder.count(meters.gains, 1, builder.source(nodes.airNode, convectiveW, series, name));
    if (gain.radiantShare > 0)
      nodes.faces.forEach((face, f) => {
        const radiantW = powerW * gain.radiantShare * shares[f];
        const ref = builder.source(face.node, radiantW, series, `${name}, radiant`);
        builder.count(meters.gains, 1, ref);
        builder.count(faceMeter(face), -1, ref);
      });
    const hourly = hourlySetPoint(values, clock);
    const heads = headsOf(room, gain);
    const sweats = heads > 0 && gain.dryHeat === 'by-room-temperature';
    if (sweats) addSweat(room, name, powerW, values, nodes.airNode, builder, meters);
    if (heads > 0)
      people.push({ metRate: metRateOf(gain), sweats, heads: hourly.map((v) => v * heads) });
    if (gain.carrier !== undefined)
      drawn.push({ carrier: gain.carrier, powerW: hourly.map((v) => v * powerW) });
  }
  return { people, drawn };
}

/**
 * Dry heat that people hold back as the room warms, as a one-way link to a node at 24 °C.
 *
 *   q = −S·(T − 24)/12 from 24 to 36 °C;  −S above;  0 below
 *
 * With the sources at 24 °C this is `personGain` in every state, solved with the room and not behind it.
 */
function addSweat(
  room: Room,
  name: string,
  dryW: number,
  values: Float64Array,
  airNode: number,
  builder: NetworkBuilder,
  meters: { readonly gains: number },
): void {
  const reference = builder.node(
    {
      name: `${name}: reference`,
      room: room.id,
      what: 'air temperature at which the dry heat of people is stated',
      method: 'fixed',
      inputs: { referenceC },
    },
    0,
    builder.constantSeries(referenceC),
  );
  const ref = builder.functionLink(
    airNode,
    reference,
    (airC, _, step) =>
      airC <= referenceC
        ? 0
        : (dryW * values[step]) / Math.max(bodyC - referenceC, airC - referenceC),
    {
      name: `${name}: dry heat by room temperature`,
      room: room.id,
      what: 'dry heat of people that turns to vapour above 24 °C',
      method: 'falls in proportion to the distance from 36 °C; common practice, no source',
      inputs: { dryW, referenceC, bodyC },
    },
  );
  builder.count(meters.gains, -1, ref);
}
