// How far a finding is from the base: the base is the upright line in the middle, ticks stand every
// 25 % of it, the bar runs to the value. The scale is the same in all findings, so lengths compare.

const width = 272;
const height = 13;
const middle = width / 2;
const ticks = [-1, -0.75, -0.5, -0.25, 0.25, 0.5, 0.75, 1];
const toX = (share: number) => middle + Math.max(-1, Math.min(1, share)) * (middle - 6);

export interface GaugeProps {
  /** Difference over base. */
  readonly share: number;
  /** Of the difference, over base. */
  readonly plusMinus: number | null;
  /** Less is what one wishes for. */
  readonly isWished: boolean;
  readonly isSure: boolean;
}

export function Gauge({ share, plusMinus, isWished, isSure }: GaugeProps) {
  const isOff = Math.abs(share) > 1;
  const end = toX(share);
  const whisker = plusMinus === null ? 0 : Math.min(1, plusMinus) * (middle - 6);
  return (
    <svg className="gauge" viewBox={`0 0 ${width} ${height}`} aria-hidden="true">
      <line className="gauge-axis" x1={6} x2={width - 6} y1={6.5} y2={6.5} />
      {ticks.map((tick) => (
        <line key={tick} className="gauge-tick" x1={toX(tick)} x2={toX(tick)} y1={5} y2={8} />
      ))}
      {isSure && (
        <rect
          className={isWished ? 'gauge-bar' : 'gauge-bar is-worse'}
          x={Math.min(middle, end)}
          width={Math.abs(end - middle)}
          y={3.5}
          height={6}
        />
      )}
      {isSure && whisker > 0.6 && (
        <line className="gauge-whisker" x1={end - whisker} x2={end + whisker} y1={6.5} y2={6.5} />
      )}
      {isSure && isOff && (
        <path
          className="gauge-arrow"
          d={share > 0 ? `M${end} 2l5 4.5l-5 4.5` : `M${end} 2l-5 4.5l5 4.5`}
        />
      )}
      <line className="gauge-base" x1={middle} x2={middle} y1={1} y2={12} />
    </svg>
  );
}
