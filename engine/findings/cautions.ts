// Where a result could hurt someone, the words that go with it.
import type { SupplyFindings } from './final-energy.ts';
import type { RoomFindings } from './simulation.ts';

const frostC = 5; // pipes in the coldest corner are colder than the air; common practice, no source
const heatStressC = 32; // operative; common practice, no source

/** One sentence a danger, naming the rooms; screens and reports show all of them. */
export function cautions(
  rooms: readonly RoomFindings[],
  supplies: readonly SupplyFindings[] = [],
): string[] {
  const named = (list: readonly RoomFindings[]) => list.map((room) => room.name).join(', ');
  const list: string[] = [];
  const cold = rooms.filter((room) => room.airTemperatureC.min < frostC);
  if (cold.length > 0)
    list.push(
      `Frost: the air falls below ${frostC} °C in ${named(cold)}. Pipes there can freeze; have frost protection designed by a licensed practitioner.`,
    );
  const hot = rooms.filter((room) => room.operativeTemperatureC.max > heatStressC);
  if (hot.length > 0)
    list.push(
      `Heat: the operative temperature passes ${heatStressC} °C in ${named(hot)}. For infants, the old and the ill this is a danger to health; check against local rules on overheating.`,
    );
  const short = rooms.filter((room) => room.hoursHeatingShort > 0);
  if (short.length > 0)
    list.push(
      `Heating too small: at full power the set-point is missed in ${named(short)}. Sizes follow local codes and a licensed practitioner's design, most of all for vulnerable people.`,
    );
  const small = supplies.filter((one) => one.hoursShort > 0);
  if (small.length > 0)
    list.push(
      `Supply too small: the rooms together take more than ${small.map((one) => `"${one.id}" can give in ${one.hoursShort} h`).join(', ')}. The temperatures shown assume that it could; size it by local codes and a licensed practitioner's design.`,
    );
  const damp = rooms.filter(isDamp);
  if (damp.length > 0)
    list.push(
      `Damp: surfaces in ${named(damp)} stay humid enough for mould to grow (ISO 13788). Mould harms health; have ventilation, heating and thermal bridges looked at by a specialist.`,
    );
  const wet = rooms.filter((room) => room.moisture?.interstitial.some((one) => !one.driesOut));
  if (wet.length > 0)
    list.push(
      `Condensation: water gathers inside the envelope of ${named(wet)} from year to year by the monthly method of ISO 13788. Timber can rot; have the build-up checked by a hygrothermal calculation.`,
    );
  return list;
}

const dampShare = 0.05; // of the year above 80 % at a surface; common practice, no source

/** By the fabric's temperature factor in the critical month, or by hours above 80 % at a surface. */
function isDamp({ moisture }: RoomFindings): boolean {
  if (!moisture) return false;
  const { requiredFactor, worstPlane, bridgeFactor } = moisture.surfaceFactor;
  const weakest = Math.min(worstPlane?.factor ?? 1, bridgeFactor ?? 1);
  const hours = Math.max(moisture.worstFace?.hoursAbove80 ?? 0, moisture.bridge?.hoursAbove80 ?? 0);
  return requiredFactor > weakest || hours > dampShare * 8760;
}

/** What stands under every result. */
export const standingCaution =
  'Results are estimates for design decisions. Frost, heat stress, heater size, damp and combustion air are matters of local codes and licensed practice.';
