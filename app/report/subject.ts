// The room at risk and the week that shows it: what the drawings of a report are about.

import type { RoomFindings, RoomHours, Simulation } from '../../engine/index.ts';

export interface Subject {
  readonly findings: RoomFindings;
  readonly hours: RoomHours;
  /** Which side of the band it is about; none where no occupied hour lies outside. */
  readonly side: 'above' | 'below' | 'none';
  readonly week: { readonly firstHour: number; readonly endHour: number };
}

const most = (rooms: readonly RoomFindings[], of: (room: RoomFindings) => number) =>
  rooms.reduce((a, b) => (of(b) > of(a) ? b : a));

/** The room with the most degree hours above its band; if none, below; if none, the warmest room. */
export function subjectOf(simulation: Simulation): Subject {
  const { rooms } = simulation.findings;
  const above = most(rooms, (room) => room.degreeHoursAbove);
  const below = most(rooms, (room) => room.degreeHoursBelow);
  if (above.degreeHoursAbove > 0)
    return subject(simulation, above, 'above', above.worstWeekAbove?.firstHour);
  if (below.degreeHoursBelow > 0)
    return subject(simulation, below, 'below', below.worstWeekBelow?.firstHour);
  const warmest = most(rooms, (room) => room.operativeTemperatureC.max);
  return subject(simulation, warmest, 'none', undefined);
}

function subject(
  { rooms, hours }: Simulation,
  findings: RoomFindings,
  side: Subject['side'],
  firstHour: number | undefined,
): Subject {
  const room = rooms.find((one) => one.id === findings.id);
  if (!room) throw new Error(`no hours for the room "${findings.id}"`);
  let hottest = 0;
  room.operativeC.forEach((t, h) => {
    if (t > room.operativeC[hottest]) hottest = h;
  });
  const around = firstHour ?? Math.floor(hottest / 24) * 24 - 72;
  const first = Math.max(0, Math.min(around, hours - 168));
  return { findings, hours: room, side, week: { firstHour: first, endHour: first + 168 } };
}

/** -1 below the band, 1 above it, 0 inside it or when nobody is there. */
export function sideOfBand(room: RoomHours, hour: number): -1 | 0 | 1 {
  if (!room.occupied[hour]) return 0;
  if (room.operativeC[hour] < room.bandLowC[hour]) return -1;
  return room.operativeC[hour] > room.bandHighC[hour] ? 1 : 0;
}
