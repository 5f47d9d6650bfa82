// How late the light of each day is against the sun, from the first harmonic of the day.
//
// The phase of the harmonic, atan2(Σ I·sin ωt, Σ I·cos ωt), is the centre of the light on the circle of
// 24 hours: unlike a plain centre it sees a shift of any size, also past midnight. It is compared with
// the phase of a clear day in the site's geometry over the same steps.

export interface DayShift {
  /** Day of the table, from 0. */
  readonly day: number;
  /** Light of the day over that of a clear one. */
  readonly clearness: number;
  /** How late the light is, -720 to 720. */
  readonly shiftMinutes: number;
}

/**
 * @param light global radiation, @param clear that of the clear sky over the same steps
 * @param perDay steps of a day, @param firstHour hour of the day at which step 0 begins
 */
export function dayShifts(
  light: Float64Array,
  clear: Float64Array,
  perDay: number,
  firstHour = 0,
): readonly DayShift[] {
  const shifts: DayShift[] = [];
  const lead = Math.round(((24 - firstHour) % 24) * (perDay / 24));
  const turns = Float64Array.from({ length: perDay }, (_, s) => (2 * Math.PI * (s + 0.5)) / perDay);
  const sines = turns.map(Math.sin);
  const cosines = turns.map(Math.cos);
  const hoursPerStep = 24 / perDay;
  for (let from = lead, day = 0; from + perDay <= light.length; from += perDay, day++) {
    let [sum, sine, cosine, clearSum, clearSine, clearCosine] = [0, 0, 0, 0, 0, 0];
    let isWhole = true;
    for (let s = 0; s < perDay; s++) {
      const value = light[from + s];
      if (Number.isNaN(value)) {
        isWhole = false;
        break;
      }
      sum += value;
      sine += value * sines[s];
      cosine += value * cosines[s];
      const wanted = clear[from + s];
      clearSum += wanted;
      clearSine += wanted * sines[s];
      clearCosine += wanted * cosines[s];
    }
    // Wh/m²: polar night, or a day without a shadow.
    if (!isWhole || clearSum * hoursPerStep < 500 || sum * hoursPerStep < 250) continue;
    const apart = Math.atan2(sine, cosine) - Math.atan2(clearSine, clearCosine);
    const turned = apart - 2 * Math.PI * Math.round(apart / (2 * Math.PI));
    shifts.push({ day, clearness: sum / clearSum, shiftMinutes: (turned / (2 * Math.PI)) * 1440 });
  }
  return shifts;
}

export interface Middle {
  readonly minutes: number;
  /** Half the range that holds the middle half. */
  readonly spreadMinutes: number;
}

/** Median on the circle of 24 hours, turned to where most values lie. */
export function middleOf(minutes: readonly number[]): Middle {
  const rad = Math.PI / 720;
  const sine = minutes.reduce((sum, m) => sum + Math.sin(m * rad), 0);
  const cosine = minutes.reduce((sum, m) => sum + Math.cos(m * rad), 0);
  const about = Math.atan2(sine, cosine) / rad;
  const near = minutes.map((m) => wrapMinutes(m - about)).sort((a, b) => a - b);
  const at = (share: number) => near[Math.round(share * (near.length - 1))];
  return { minutes: wrapMinutes(about + at(0.5)), spreadMinutes: (at(0.75) - at(0.25)) / 2 };
}

/** Minutes on the circle of 24 hours, -720 to 720. */
export function wrapMinutes(minutes: number): number {
  return minutes - 1440 * Math.round(minutes / 1440);
}
