// What passes a glazing by the angle of the sun to its normal.

import type { GlazingExplained } from '../../../../engine/index.ts';
import { Drawing } from '../../chart/drawing.tsx';
import { useWidth } from '../../chart/use-width.ts';
import { figure } from '../../format/index.ts';

const height = 190;
const left = 84;
const right = 110;
const top = 14;
const floor = height - 34;

export function AngleCurve({ explained }: { explained: GlazingExplained }) {
  const [ref, width] = useWidth<HTMLDivElement>();
  const { angles } = explained;
  const x = (degrees: number) => left + ((width - left - right) * degrees) / 90;
  const y = (share: number) => floor - share * (floor - top);
  const last = angles.at(-1);
  // At 90° nothing passes any pane; between the last reckoned angle and it the curve is not drawn.
  const line = (of: (one: (typeof angles)[number]) => number) =>
    angles
      .map((one, i) => `${i === 0 ? 'M' : 'L'}${x(one.incidenceDeg)} ${y(of(one)).toFixed(1)}`)
      .join('');
  const words = angles.map((one) => `${one.incidenceDeg}° g ${figure(one.gValue, 2)}`).join(', ');
  return (
    <Drawing
      title="By the angle of the sun"
      note="0° straight on; points are reckoned, lines join them"
      equivalent={`Share of the sun that reaches the room: ${words}.`}
      table={{
        columns: ['Angle, °', 'g', 'let through', 'thrown back'],
        rows: () =>
          angles.map((one) => [
            figure(one.incidenceDeg),
            figure(one.gValue, 3),
            figure(one.transmittance, 3),
            figure(one.reflectance, 3),
          ]),
      }}
    >
      <div ref={ref}>
        <svg width={width} height={height} aria-hidden="true" className="section-picture">
          {[0, 0.25, 0.5, 0.75, 1].map((share) => (
            <g key={share}>
              <line className="grid" x1={left} x2={width - right} y1={y(share)} y2={y(share)} />
              <text x={left - 8} y={y(share) + 4} textAnchor="end">
                {figure(share, 2)}
              </text>
            </g>
          ))}
          <path className="heat" d={line((one) => one.gValue)} />
          <path className="sun-line" d={line((one) => one.transmittance)} />
          <path className="air-line" d={line((one) => one.reflectance)} />
          {angles.map((one) => (
            <circle
              key={one.incidenceDeg}
              className="heat-dot"
              cx={x(one.incidenceDeg)}
              cy={y(one.gValue)}
              r={3}
            />
          ))}
          {last && (
            <>
              <text className="heat-word" x={x(last.incidenceDeg) + 8} y={y(last.gValue) - 4}>
                g
              </text>
              <text
                className="sun-word"
                x={x(last.incidenceDeg) + 8}
                y={y(last.transmittance) + 12}
              >
                let through
              </text>
              <text x={x(last.incidenceDeg) + 8} y={y(last.reflectance) + 4}>
                thrown back
              </text>
            </>
          )}
          {[0, 1, 2, 3, 4, 5].map((i) => (
            <rect
              key={i}
              className={i % 2 === 0 ? 'edge-bar is-filled' : 'edge-bar'}
              x={x(i * 15)}
              y={floor + 6}
              width={x(15) - x(0)}
              height={4}
            />
          ))}
          {[0, 15, 30, 45, 60, 75, 90].map((degrees) => (
            <text key={degrees} x={x(degrees)} y={floor + 24} textAnchor="middle">
              {degrees}
              {degrees === 90 && '°'}
            </text>
          ))}
        </svg>
      </div>
    </Drawing>
  );
}
