// How well the run went, and who made it when.

import { figure, powerOfTen } from '../figures.ts';
import { markup } from '../markup.ts';
import type { ChapterMaker } from '../report.ts';

export const quality: ChapterMaker = ({ simulation: { findings }, version, madeOn }) => {
  const { relativeBalanceResidual, unconvergedSteps, warmUpDays, warmUpDriftK, nodes } =
    findings.quality;
  return {
    id: 'quality',
    title: 'Quality of the run',
    html: markup`<dl class="lines">
<div><dt>Energy balance</dt><dd>closes to ${powerOfTen(relativeBalanceResidual)} of its throughput, in every step and room</dd></div>
<div><dt>Steps</dt><dd>of ${figure(findings.stepMinutes, Number.isInteger(findings.stepMinutes) ? 0 : 1)} min; ${unconvergedSteps === 0 ? 'all converged' : `${figure(unconvergedSteps)} not converged`}</dd></div>
<div><dt>Warm-up</dt><dd>${figure(warmUpDays)} days, until two passes differed by ${powerOfTen(warmUpDriftK)} K</dd></div>
<div><dt>Network</dt><dd>${figure(nodes)} nodes</dd></div>
<div><dt>Uncertainty</dt><dd>not in this report: the command line’s --check-accuracy shows what half the step and twice the nodes change</dd></div>
<div><dt>Made</dt><dd>with Inglenook ${version} on ${madeOn}</dd></div>
</dl>\n`,
  };
};
