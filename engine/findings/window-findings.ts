// What each window did in the run, beside its values under standard conditions.
import type { Assembly, RoomParts } from '../assembly/index.ts';
import type { Glazing } from '../building/index.ts';
import type { GlazingExplained } from './explain-glazing.ts';
import { explainWindow } from './explain-window.ts';
import type { RoomHours, WindowFindings } from './simulation.ts';

/** Less sun on the window than this counts as dark [W/m²]. */
const darkWPerM2 = 1;
/** Smaller differences of air say nothing of U. */
const leastDifferenceK = 2;

/**
 * Mean U-value seen: heat through glass, frame and edge from air to air, over the dark hours in which
 * the room is heated (so no sun is in it), against the area and the difference of the airs. It differs
 * from the standard one by the films and the sky of those hours, and by what covers the glass.
 */
export function windowFindings(
  assembly: Assembly,
  parts: RoomParts,
  hours: RoomHours,
  outdoorC: Float64Array,
  meterW: (meter: number) => Float64Array,
  explain: (glazing: Glazing) => GlazingExplained,
): WindowFindings[] {
  return parts.windows.map((window): WindowFindings => {
    const surface = parts.room.surfaces.find((one) => one.id === window.surface);
    const opening = surface?.openings.find((one) => one.id === window.opening);
    if (!opening) throw new Error(`no opening ${window.opening} in ${parts.room.id}`);
    const standard = explainWindow(
      assembly.building,
      parts.room.id,
      window.surface,
      opening,
      explain,
    );
    const intoW = meterW(window.meter);
    let lostWh = 0;
    let kelvinHours = 0;
    let seenHours = 0;
    let incidentWh = 0;
    let passedWh = 0;
    for (let h = 0; h < intoW.length; h++) {
      incidentWh += window.incidentW[h];
      passedWh += window.passedW[h];
      const differenceK = hours.airC[h] - outdoorC[h];
      const dark = window.incidentW[h] < darkWPerM2 * standard.glassAreaM2;
      if (!dark || hours.heatingW[h] <= 0 || differenceK < leastDifferenceK) continue;
      lostWh -= intoW[h];
      kelvinHours += differenceK;
      seenHours++;
    }
    return {
      room: parts.room.id,
      surface: window.surface,
      opening: window.opening,
      areaM2: opening.areaM2,
      uValueWPerM2K: standard.uValueWPerM2K,
      gValue: standard.gValue,
      seenUValueWPerM2K: seenHours > 0 ? lostWh / (kelvinHours * opening.areaM2) : null,
      seenHours,
      incidentKWh: incidentWh / 1000,
      transmittedKWh: passedWh / 1000,
      transmittedShare: incidentWh > 0 ? passedWh / incidentWh : null,
      blindHours: window.blindHours,
      nightInsulationHours: window.nightInsulationHours,
    };
  });
}
