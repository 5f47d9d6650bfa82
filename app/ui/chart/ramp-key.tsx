// A ramp's key: one field a step, the cuts written between them, the band bracketed above.

import type { InkName } from './ink.ts';

export interface RampKeyProps {
  readonly steps: readonly InkName[];
  /** One a cut, so one fewer than the steps. */
  readonly labels: readonly string[];
  readonly unit: string;
  readonly before: string;
  readonly after: string;
  /** First step inside the band and one past the last. */
  readonly band: readonly [number, number] | null;
}

const fieldWidth = 38;

export function RampKey({ steps, labels, unit, before, after, band }: RampKeyProps) {
  const left = before ? 70 : 6;
  const width = left + steps.length * fieldWidth + (after ? 48 : 6);
  const x = (i: number) => left + i * fieldWidth;
  return (
    <svg
      width={width}
      height={29}
      className="ramp-key"
      role="img"
      aria-label={`Colours from ${before || 'low'} to ${after || 'high'}, changing at ${labels.join(', ')} ${unit}`}
    >
      {steps.map((step, i) => (
        <rect
          key={step}
          x={x(i)}
          y={4}
          width={fieldWidth}
          height={11}
          className="key-field"
          style={{ fill: `var(--${step})` }}
        />
      ))}
      {labels.map((label, i) => (
        <text key={label} x={x(i + 1)} y={26} className="middle">
          {i === labels.length - 1 ? `${label} ${unit}` : label}
        </text>
      ))}
      {band && <path d={`M${x(band[0])} 1.5H${x(band[1])}`} className="band-bracket" />}
      <text x={left - 6} y={14} className="end">
        {before}
      </text>
      <text x={x(steps.length) + 6} y={14}>
        {after}
      </text>
    </svg>
  );
}
