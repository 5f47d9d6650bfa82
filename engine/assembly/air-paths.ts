// Air that fans and fixed paths move, room by room: what they bring in less what they take out.
import type { Building, Room } from '../building/index.ts';
import { extractOf, flowShare } from './air-recovery.ts';
import type { AirSite } from './air-site.ts';
import { scheduleValues } from './schedule-values.ts';

/** By airPaths and ventilation units between rooms, in each step [kg/s]. */
export function pathSurplusKgPerS(building: Building, room: Room, site: AirSite): Float64Array {
  const { clock, properties } = site;
  const surplus = new Float64Array(clock.count);
  const add = (flowM3PerS: number, schedule: string | undefined) => {
    const massKgPerS = flowM3PerS * properties.densityKgPerM3;
    const share = schedule === undefined ? null : scheduleValues(building, schedule, clock);
    for (let k = 0; k < surplus.length; k++)
      surplus[k] += massKgPerS * (share === null ? 1 : share[k]);
  };
  for (const { from, to, flowM3PerS, schedule } of building.airPaths) {
    if (to === room.id) add(flowM3PerS, schedule);
    if (from === room.id) add(-flowM3PerS, schedule);
  }
  for (const { supply, extract, schedule } of building.airUnits) {
    for (const end of supply) if (end.room === room.id) add(end.flowM3PerS, schedule);
    for (const end of extract) if (end.room === room.id) add(-end.flowM3PerS, schedule);
  }
  return surplus;
}

/** By the room's own ventilation, where it takes out another amount than it brings in [kg/s]. */
export function ownSurplusKgPerS(building: Building, room: Room, site: AirSite): Float64Array {
  const surplus = new Float64Array(site.clock.count);
  for (const one of room.ventilation) {
    const net = (one.flowM3PerS - extractOf(one)) * site.properties.densityKgPerM3;
    if (net === 0) continue;
    flowShare(building, one, site).forEach((share, k) => {
      surplus[k] += net * share;
    });
  }
  return surplus;
}
