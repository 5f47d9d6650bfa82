// What the findings need of a window, hour by hour.
import { hourlySetPoint as hourlyMean } from './comfort-hours.ts';
import type { StepClock } from './step-clock.ts';
import type { WindowLightIn } from './sun-inside.ts';
import type { WindowParts } from './window.ts';

/** A covering that asks for the room's temperature. */
export interface RoomDrawn {
  /** Of the window's coverings, as `drawnByRoom` names it. */
  readonly key: string;
  readonly roomAboveC: number;
  readonly bandK: number;
  /** Share over which all its other conditions let it be drawn, mean of each hour. */
  readonly allowedHours: Float64Array;
}

export interface WindowHours {
  readonly surface: string;
  readonly opening: string;
  /** Meter of the heat through glass, frame and edge, positive into the room. */
  readonly meter: number;
  /** Sunlight on the glass, shades taken off, and what of it passes; mean of each hour [W]. */
  readonly incidentW: Float64Array;
  readonly passedW: Float64Array;
  /** Hours of covering over the whole glass, in the year; null without. */
  readonly blindHours: number | null;
  readonly nightInsulationHours: number | null;
  readonly byRoom: readonly RoomDrawn[];
}

export function windowHours(light: WindowLightIn, surface: string, clock: StepClock): WindowHours {
  const { window, passedW } = light;
  const { sun, glassAreaM2, opening, blind, nightInsulation } = window;
  const incident = sun.beamWPerM2.map((beam, k) => glassAreaM2 * (beam + sun.diffuseWPerM2[k]));
  const hours = (share: Float64Array) =>
    (share.reduce((sum, one) => sum + one, 0) * clock.stepS) / 3600;
  return {
    surface,
    opening: opening.id,
    meter: window.meter,
    incidentW: hourlyMean(incident, clock),
    passedW: hourlyMean(passedW, clock),
    blindHours: blind && hours(blind.share),
    nightInsulationHours: nightInsulation && hours(nightInsulation.share),
    byRoom: [
      ...roomDrawn(window, 'blind', opening.blind, blind),
      ...roomDrawn(window, 'night insulation', opening.nightInsulation, nightInsulation),
    ],
  };
}

function roomDrawn(
  window: WindowParts,
  what: string,
  held: WindowParts['opening']['blind'] | WindowParts['opening']['nightInsulation'],
  drawn: WindowParts['blind'],
): RoomDrawn[] {
  if (!held || !drawn?.allowedHours || held.control.roomAboveC === undefined) return [];
  const { roomAboveC, bandK } = held.control;
  return [{ key: `${window.name} ${what}`, roomAboveC, bandK, allowedHours: drawn.allowedHours }];
}
