// Cautions on results that could hurt someone. The engine says which rooms are in danger and prints
// it; here the same dangers are written with the room's figures and a way to it: what was found, why
// it matters, what to do. Thresholds are the engine's (test/app/ui/findings/cautions.test.ts).

import { figure, plain, quantity, stampText } from '../format/index.ts';
import type { RoomTotals } from '../simulation.ts';

export interface Caution {
  readonly kind: 'frost' | 'heat' | 'heating';
  /** The bold phrase. */
  readonly title: string;
  readonly text: string;
  /** The room that has it worst. */
  readonly roomId: string;
}

const frostBelowC = 5; // common practice for frost guards, no source
const heatAboveC = 32; // operative; common practice, no source

interface Danger {
  readonly kind: Caution['kind'];
  readonly title: string;
  /** How far beyond the limit; 0 or less is no danger. */
  readonly by: (room: RoomTotals) => number;
  readonly text: (room: RoomTotals) => string;
}

const dangers: readonly Danger[] = [
  {
    kind: 'frost',
    title: 'Frost.',
    by: (room) => frostBelowC - room.airTemperatureC.min,
    text: ({ name, airTemperatureC: { min, minAt } }) =>
      `${name} falls to ${plain(quantity.temperatureC(min))} on ${stampText(minAt)}. Pipes near cold surfaces can freeze before the room does. Keep a frost guard on, or drain; follow the local code and a licensed practitioner.`,
  },
  {
    kind: 'heat',
    title: 'Heat stress.',
    by: (room) => room.operativeTemperatureC.max - heatAboveC,
    text: ({ name, operativeTemperatureC: { max, maxAt } }) =>
      `${name} reaches ${plain(quantity.temperatureC(max))} on ${stampText(maxAt)}, above ${heatAboveC} °C. For infants, old and ill people this is a danger. Shade or ventilate, and judge it by the local code.`,
  },
  {
    kind: 'heating',
    title: 'Heating may be too small.',
    by: (room) => room.hoursHeatingShort,
    text: (room) =>
      `${room.name} misses its set-point for ${figure(room.hoursHeatingShort)} h with the heater at its largest, ${plain(quantity.roomPowerW(room.peakHeatingW))}. That peak is a limit, not the need. Have the size checked by a licensed practitioner.`,
  },
];

export function findCautions(rooms: readonly RoomTotals[]): Caution[] {
  return dangers.flatMap(({ kind, title, by, text }) => {
    const [worst, ...others] = rooms.filter((room) => by(room) > 0).sort((a, b) => by(b) - by(a));
    if (!worst) return [];
    const also = others.map((room) => room.name).join(', ');
    const ending = also && ` Also: ${also}.`;
    return [{ kind, title, text: text(worst) + ending, roomId: worst.id }];
  });
}
