// Cautions on results that could hurt someone. Each says what was found, why it matters and what to
// do, and defers to local codes and licensed practice.

import { type Calendar, figure, plain, quantity, whenText } from '../format/index.ts';
import { outsideBand } from '../series/year.ts';
import type { RoomSeries, RoomTotals, Simulation } from '../simulation.ts';

export interface Caution {
  readonly kind: 'frost' | 'heat' | 'heating';
  /** The bold phrase. */
  readonly title: string;
  readonly text: string;
  readonly roomId: string;
}

/**
 * Air below this may mean freezing pipes near cold surfaces and in dead corners, before the room's
 * mean reaches 0 °C. Common practice for frost guards of heating controls, no source.
 */
export const frostBelowC = 5;

/**
 * Operative temperature in occupied hours above which older and ill people are at risk. Common
 * practice, no source: published criteria start lower and are judged by the user's own code.
 */
export const heatStressAboveC = 32;

/** Hours with the heater at its largest while people sit below the band, before it is called small. */
export const shortHours = 10;

interface Spell {
  readonly totals: RoomTotals;
  readonly count: number;
}

/** Hours in which the heater gives all it has and the occupied room is below its band. */
export function hoursShortOfHeat(room: RoomSeries, peakW: number): number {
  if (!(peakW > 0)) return 0;
  let count = 0;
  for (let h = 0; h < room.heatingW.length; h++) {
    if (room.heatingW[h] >= 0.995 * peakW && outsideBand(room, h) === -1) count++;
  }
  return count;
}

function hoursAbove(room: RoomSeries, limitC: number): number {
  let count = 0;
  for (let h = 0; h < room.operativeC.length; h++) {
    if (room.occupied[h] && room.operativeC[h] > limitC) count++;
  }
  return count;
}

function worst(spells: readonly Spell[]): { spell: Spell; others: string } | null {
  const found = spells.filter(({ count }) => count > 0).sort((a, b) => b.count - a.count);
  const [spell, ...rest] = found;
  if (!spell) return null;
  const names = rest.map(({ totals }) => totals.name).join(', ');
  return { spell, others: names && ` Also: ${names}.` };
}

export function findCautions(simulation: Simulation, calendar: Calendar): Caution[] {
  const { findings, rooms } = simulation;
  const cautions: Caution[] = [];
  const spells = (count: (room: RoomSeries, totals: RoomTotals) => number): Spell[] =>
    rooms.flatMap((room) => {
      const totals = findings.rooms.find((one) => one.id === room.id);
      return totals ? [{ totals, count: count(room, totals) }] : [];
    });

  const frost = worst(
    spells((_room, totals) => Math.max(0, frostBelowC - totals.airTemperatureC.min)),
  );
  if (frost) {
    const { totals } = frost.spell;
    const { min, minAt } = totals.airTemperatureC;
    cautions.push({
      kind: 'frost',
      roomId: totals.id,
      title: 'Frost.',
      text: `${totals.name} falls to ${plain(quantity.temperatureC(min))} on ${whenText(calendar, minAt)}. Pipes near cold surfaces can freeze before the room does. Keep a frost guard on, or drain; follow the local code.${frost.others}`,
    });
  }

  const heat = worst(spells((room) => hoursAbove(room, heatStressAboveC)));
  if (heat) {
    const { totals, count } = heat.spell;
    const { max } = totals.operativeTemperatureC;
    cautions.push({
      kind: 'heat',
      roomId: totals.id,
      title: 'Heat stress.',
      text: `${totals.name} is above ${heatStressAboveC} °C for ${figure(count)} occupied hours, at most ${plain(quantity.temperatureC(max))}. Older and ill people are at risk. Shade or ventilate, and judge it by the local code.${heat.others}`,
    });
  }

  const short = worst(
    spells((room, totals) => {
      const count = hoursShortOfHeat(room, totals.peakHeatingW);
      return count >= shortHours ? count : 0;
    }),
  );
  if (short) {
    const { totals, count } = short.spell;
    cautions.push({
      kind: 'heating',
      roomId: totals.id,
      title: 'Heating may be too small.',
      text: `${totals.name} stays below its band for ${figure(count)} occupied hours with the heater at its largest, ${plain(quantity.roomPowerW(totals.peakHeatingW))}. That peak is a limit, not the need. Have the size checked by a licensed practitioner.${short.others}`,
    });
  }
  return cautions;
}
