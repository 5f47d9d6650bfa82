// How often and how far a temperature leaves its band while people are there.

export interface BandExceedance {
  readonly occupiedHours: number;
  readonly hoursBelow: number;
  readonly hoursAbove: number;
  /** Sum over the hours of what is missing, or too much [K·h]. */
  readonly degreeHoursBelow: number;
  readonly degreeHoursAbove: number;
  /** Hours outside over hours occupied, 0 to 1; 0 if never occupied. */
  readonly shareOutside: number;
}

/**
 * Hours and degree hours outside a band; each value stands for one hour, a value on a limit is inside.
 *
 * @param operativeC, @param lowC, @param highC, @param occupied one value an hour; occupied is 0 or 1
 *
 * Source: EN 15251:2007, Annex F, methods A and B (EN 16798-2).
 */
export function bandExceedance(
  operativeC: ArrayLike<number>,
  lowC: ArrayLike<number>,
  highC: ArrayLike<number>,
  occupied: ArrayLike<number>,
): BandExceedance {
  let occupiedHours = 0;
  let hoursBelow = 0;
  let hoursAbove = 0;
  let degreeHoursBelow = 0;
  let degreeHoursAbove = 0;
  for (let h = 0; h < operativeC.length; h++) {
    if (occupied[h] === 0) continue;
    occupiedHours++;
    const under = lowC[h] - operativeC[h];
    const over = operativeC[h] - highC[h];
    if (under > 0) {
      hoursBelow++;
      degreeHoursBelow += under;
    }
    if (over > 0) {
      hoursAbove++;
      degreeHoursAbove += over;
    }
  }
  const shareOutside = occupiedHours > 0 ? (hoursBelow + hoursAbove) / occupiedHours : 0;
  return {
    occupiedHours,
    hoursBelow,
    hoursAbove,
    degreeHoursBelow,
    degreeHoursAbove,
    shareOutside,
  };
}
