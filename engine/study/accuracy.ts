// How sure a figure is: the same pair of runs cut another way in time and walls. What both runs of a
// pair get wrong alike cancels in their difference, so the difference is surer than either figure.
//
// The march is second order in the step, and cells follow the square root of the step, so what is left
// of the walls falls in first order with it. Richardson's estimate of the error of the standard run is
//   twice the step:            |D(2h) − D(h)|/(2¹ − 1),       taken whole (first order, the worse one)
//   half the step, 2× nodes:   |D(h/2) − D(h)|·2²/(2² − 1),   (second order; 8/7 for the walls is less)
import type { RunOf } from './job.ts';

export type AccuracyCheck = 'none' | 'coarser' | 'finer';

export interface SecondCut {
  readonly stepMinutes: number;
  readonly refine: number;
  /** Change of a difference between the two cuts → its uncertainty. */
  readonly factor: number;
  readonly method: string;
}

export function secondCut(
  check: AccuracyCheck,
  { stepMinutes, refine }: Pick<RunOf, 'stepMinutes' | 'refine'>,
): SecondCut | null {
  if (check === 'none') return null;
  if (check === 'coarser' && 60 % (2 * stepMinutes) === 0)
    return {
      stepMinutes: 2 * stepMinutes,
      refine,
      factor: 1,
      method: `Richardson's estimate from runs at ${2 * stepMinutes} min and the coarser walls that go with it`,
    };
  return {
    stepMinutes: stepMinutes / 2,
    refine: 2 * refine,
    factor: 4 / 3,
    method: `Richardson's estimate from runs at ${stepMinutes / 2} min and twice the nodes`,
  };
}
