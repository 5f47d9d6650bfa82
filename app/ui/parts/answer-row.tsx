// One finding: its name and the base, its value and the difference, the gauge.

import type { Against, Answer } from '../findings/index.ts';
import { difference, figure } from '../format/index.ts';
import { Gauge } from './gauge.tsx';

export interface AnswerRowProps {
  readonly answer: Answer;
  readonly against: Against | undefined;
}

export function AnswerRow({ answer, against }: AnswerRowProps) {
  const { decimals, kind } = answer;
  return (
    <div className={answer.isMain ? 'answer' : 'answer is-small'}>
      <div className="answer-name">
        <span>{answer.name}</span>
        <span className="note">
          {against ? `base ${figure(against.base, decimals)}` : answer.aside}
        </span>
      </div>
      <div className="answer-value">
        <b className="figure">{answer.quantity.figure}</b>
        <span>{answer.quantity.unit}</span>
        {against ? (
          <Difference against={against} answer={answer} />
        ) : (
          answer.note && <span className="note answer-note">{answer.note}</span>
        )}
      </div>
      {against && kind === 'amount' && against.base > 0 && (
        <Gauge
          share={against.difference / against.base}
          plusMinus={against.plusMinus === null ? null : against.plusMinus / against.base}
          isWished={against.difference < 0}
          isSure={against.isSure}
        />
      )}
    </div>
  );
}

function Difference({ against, answer }: { against: Against; answer: Answer }) {
  const { decimals, kind } = answer;
  const sure =
    against.plusMinus === null
      ? ''
      : `±${figure(Math.max(against.plusMinus, 10 ** -decimals), decimals)}`;
  if (!against.isSure) {
    return (
      <span className="answer-difference plus-minus">no difference beyond ± {sure.slice(1)}</span>
    );
  }
  const percent = (100 * against.difference) / against.base;
  return (
    <span
      className="answer-difference"
      title="± of the difference: from hour steps and quarter-hour steps of both houses, by Richardson's estimate"
    >
      <b className="difference-figure">{difference(against.difference, decimals)}</b>{' '}
      {kind === 'level' ? 'K ' : against.base > 0 && `${difference(percent)} % `}
      <span className="plus-minus">{sure}</span>
    </span>
  );
}
