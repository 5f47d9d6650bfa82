// The year against size, the coincident peak, and the peak hour taken apart: the same for both sides.
import type { Building, Room } from '../building/index.ts';
import { peakHour } from './peak-hour.ts';
import type { Side } from './room-plants.ts';
import type { SideSizing, SizedRoom, SizeOptions } from './size-types.ts';
import type { SizeOutcome, SizesJob, SizesResult } from './sizes-job.ts';
import { ask, type Study } from './study.ts';

/** Of the chosen sizes. */
export const curveShares = [0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1, 1.1, 1.2, 1.35, 1.5];

/** Up to the next step of a size. */
export const upTo = (w: number, step: number) => Math.ceil(w / step - 1e-9) * step;
export const runOf = (building: Building, { weather, stepMinutes }: SizeOptions) => ({
  building,
  weather,
  stepMinutes,
  refine: 1,
});

/** Greatest power as found: Infinity without limit, NaN without plant. */
export function presentW(room: Room, side: Side): number {
  const plant = room[side];
  if (!plant) return Number.NaN;
  const nominal = plant.emitter?.kind === 'radiator' ? plant.emitter.nominalW : undefined;
  return plant.maxW ?? nominal ?? Number.POSITIVE_INFINITY;
}

/** Dealt out in turn, so that every piece has large and small. */
export function pieces<T>(list: readonly T[], count: number): T[][] {
  const used = Math.max(1, Math.min(count, list.length));
  return Array.from({ length: used }, (_, p) => list.filter((_, i) => i % used === p));
}

export function* curveAndPeak(
  building: Building,
  options: SizeOptions,
  rooms: readonly Room[],
  sized: readonly SizedRoom[],
  side: Side,
  from: number,
  to: number,
): Study<Omit<SideSizing, 'warmUp' | 'designDay'>> {
  const run = runOf(building, options);
  const present = sized.every((room) => Number.isFinite(room.presentW));
  const sizes = [
    ...curveShares.map((share) => sized.map((room) => share * room.chosenW)),
    ...(present ? [sized.map((room) => room.presentW)] : []),
  ];
  const dealt = pieces(
    sizes.map((_, i) => i),
    options.pieces,
  );
  const jobs = dealt.map(
    (own): SizesJob => ({ kind: 'sizes', ...run, side, sizesW: own.map((i) => sizes[i]) }),
  );
  const results: SizesResult[] = yield* ask(
    'sizes',
    jobs,
    'running the sizing curve',
    from,
    from + 0.85 * (to - from),
  );
  const outcomes: SizeOutcome[] = [];
  dealt.forEach((own, p) => {
    own.forEach((i, k) => {
      outcomes[i] = results[p].sizes[k];
    });
  });
  const chosen = withSizes(building, rooms, sized, side);
  const [year] = yield* ask(
    'year',
    [{ kind: 'year', ...run, building: chosen, withHours: true }],
    'taking the peak hour apart',
    from + 0.85 * (to - from),
    to,
  );
  const sumW = sized.reduce((sum, room) => sum + room.chosenW, 0);
  const atChosen = outcomes[curveShares.indexOf(1)];
  const total = (of: readonly number[]) => of.reduce((a, b) => a + b, 0);
  return {
    side,
    rooms: sized,
    sumW,
    coincidentPeakW: atChosen.coincidentPeakW,
    coincidenceShare: atChosen.coincidentPeakW / sumW,
    plantW: upTo(atChosen.coincidentPeakW, options.plantStepW),
    curve: curveShares.map((share, i) => ({
      share,
      totalW: total(sizes[i]),
      outcome: outcomes[i],
    })),
    present: present
      ? {
          share: total(sizes[curveShares.length]) / sumW,
          totalW: total(sizes[curveShares.length]),
          outcome: outcomes[curveShares.length],
        }
      : null,
    peak: year.simulation && peakHour(year.simulation, side),
  };
}

/** The building with the chosen sizes in place of its own, and without backup heaters. */
function withSizes(
  building: Building,
  rooms: readonly Room[],
  sized: readonly SizedRoom[],
  side: Side,
): Building {
  const ids = rooms.map((room) => room.id);
  return {
    ...building,
    rooms: building.rooms.map((room): Room => {
      const at = ids.indexOf(room.id);
      const plant = room[side];
      if (at < 0 || !plant) return room;
      const { backupHeating: _, ...rest } = room;
      return {
        ...(side === 'heating' ? rest : room),
        [side]: { ...plant, maxW: sized[at].chosenW },
      };
    }),
  };
}
