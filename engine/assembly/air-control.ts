// When openings are open and conditional fans run: limits of the weather and schedules for each step, and
// a gradual answer to the room's temperature.
import type { AirControl, Building } from '../building/index.ts';
import type { AirSite } from './air-site.ts';
import { scheduledValues, scheduleValues } from './schedule-values.ts';

/** Open share, 0 to 1, in a step at a room and an outdoor temperature. */
export type OpenShare = (step: number, roomC: number, outdoorC: number) => number;

/** 0 below 0, 1 above the band, straight between. */
function ramp(excessK: number, bandK: number): number {
  return excessK <= 0 ? 0 : excessK >= bandK ? 1 : excessK / bandK;
}

/**
 * All limits that are given hold together. Wind, outdoor temperature and humidity are those in the middle
 * of the step; humidity stands in for rain, which weather tables of a typical year leave out.
 */
export function openShare(building: Building, control: AirControl, site: AirSite): OpenShare {
  const { clock } = site;
  const allowed = new Float64Array(clock.count).fill(1);
  if (control.schedule !== undefined)
    scheduleValues(building, control.schedule, clock).forEach((share, k) => {
      allowed[k] *= Math.min(1, Math.max(0, share));
    });
  if (control.occupied !== undefined)
    scheduleValues(building, control.occupied, clock).forEach((people, k) => {
      if (!(people > 0)) allowed[k] = 0;
    });
  const { outdoorAboveC, windBelowMPerS, outdoorHumidityBelow } = control;
  for (let k = 0; k < clock.count; k++) {
    if (outdoorAboveC !== undefined && site.outdoorC[k] < outdoorAboveC) allowed[k] = 0;
    if (windBelowMPerS !== undefined && site.windMPerS[k] > windBelowMPerS) allowed[k] = 0;
    if (outdoorHumidityBelow !== undefined && site.relativeHumidity(k) > outdoorHumidityBelow)
      allowed[k] = 0;
  }
  const aboveC =
    control.roomAboveC === undefined ? null : scheduledValues(building, control.roomAboveC, clock);
  const { warmerThanOutdoorsK, bandK } = control;
  return (step, roomC, outdoorC) => {
    let share = allowed[step];
    if (share === 0) return 0;
    if (aboveC) share *= ramp(roomC - aboveC[step], bandK);
    if (warmerThanOutdoorsK !== undefined)
      share *= ramp(roomC - outdoorC - warmerThanOutdoorsK, bandK);
    return share;
  };
}

/** Whether the share depends on the room, so that its flow needs a law of its own. */
export function feelsRoom(control: AirControl | undefined): boolean {
  return (
    control !== undefined &&
    (control.roomAboveC !== undefined || control.warmerThanOutdoorsK !== undefined)
  );
}
