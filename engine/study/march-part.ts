// A march inside a study: its progress passed on, a divergence turned into an error that says where.
import { type Method, marchSteps, type Problem, type Run } from '../network/index.ts';
import type { Progress } from '../simulate.ts';

export const studyMethod: Method = { toleranceK: 1e-6, maxIterations: 50 };

/** Marches a problem, reporting between `from` and `to` (0 to 1). */
export function* marchPart(
  problem: Problem,
  what: string,
  from = 0,
  to = 1,
): Generator<Progress, Run> {
  const march = marchSteps(problem, studyMethod);
  let turn = march.next();
  while (!turn.done) {
    const { phase, step, stepCount } = turn.value;
    const share = phase === 'start-up' ? 0 : step / stepCount;
    yield { done: from + (to - from) * share, what };
    turn = march.next();
  }
  const { outcome } = turn.value;
  if (outcome.kind === 'diverged')
    throw new Error(`the run diverged at step ${outcome.atStep} at "${outcome.node}"`);
  return turn.value;
}
