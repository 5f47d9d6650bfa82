// One day of 24 hours: drag up or down over the bars to paint, or type below.

import { type PointerEvent, useRef } from 'react';
import { Drawing } from '../../chart/drawing.tsx';
import { roundTicks, tickDecimals } from '../../chart/ticks.ts';
import { useWidth } from '../../chart/use-width.ts';
import { figure } from '../../format/index.ts';
import { NumberCell } from '../../parts/number-cell.tsx';

export interface DayPainterProps {
  readonly name: string;
  readonly values: readonly number[];
  readonly onPaint: (values: readonly number[], gesture?: string) => void;
  readonly onEnd: () => void;
}

const height = 220;
const left = 84;
const right = 24;
const top = 14;
const floor = height - 30;
const paintedSteps = 20;

export function DayPainter({ name, values, onPaint, onEnd }: DayPainterProps) {
  const [ref, width] = useWidth<HTMLDivElement>();
  const painting = useRef(false);
  const most = Math.max(1, ...values);
  const least = Math.min(0, ...values);
  const ticks = roundTicks(least, most > 1.5 ? most * 1.1 : most, 5);
  const low = ticks[0] ?? 0;
  const high = ticks.at(-1) ?? 1;
  const x = (hour: number) => left + ((width - left - right) * hour) / 24;
  const y = (value: number) => floor - ((value - low) / (high - low)) * (floor - top);

  function paint(event: PointerEvent<SVGSVGElement>) {
    if (!painting.current) return;
    const box = event.currentTarget.getBoundingClientRect();
    const hour = Math.floor(((event.clientX - box.left - left) / (width - left - right)) * 24);
    if (hour < 0 || hour > 23) return;
    const raw = low + ((floor - (event.clientY - box.top)) / (floor - top)) * (high - low);
    const step = (high - low) / paintedSteps;
    const value = Number((Math.round(Math.max(low, Math.min(high, raw)) / step) * step).toFixed(4));
    if (value === values[hour]) return;
    onPaint(
      values.map((old, h) => (h === hour ? value : old)),
      `paint ${name}`,
    );
  }
  const stop = () => {
    if (!painting.current) return;
    painting.current = false;
    onEnd();
  };
  const words = values.map((value, hour) => `${hour} h ${figure(value, 2)}`).join(', ');

  return (
    <Drawing
      title={name}
      note="drag over the hours to paint, or type below"
      equivalent={`By the hour: ${words}.`}
      table={{
        columns: ['Hour', 'Value'],
        rows: () => values.map((value, hour) => [`${hour} to ${hour + 1}`, figure(value, 3)]),
      }}
    >
      <div ref={ref}>
        <svg
          width={width}
          height={height}
          aria-hidden="true"
          className="section-picture painter"
          onPointerDown={(event) => {
            event.currentTarget.setPointerCapture(event.pointerId);
            painting.current = true;
            paint(event);
          }}
          onPointerMove={paint}
          onPointerUp={stop}
          onPointerCancel={stop}
        >
          {ticks.map((tick) => (
            <g key={tick}>
              <line className="grid" x1={left} x2={width - right} y1={y(tick)} y2={y(tick)} />
              <text x={left - 8} y={y(tick) + 4} textAnchor="end">
                {figure(tick, tickDecimals(ticks))}
              </text>
            </g>
          ))}
          {values.map((value, hour) => (
            <rect
              // biome-ignore lint/suspicious/noArrayIndexKey: an hour is its place
              key={hour}
              className="hour-bar"
              x={x(hour)}
              y={Math.min(y(value), y(Math.max(0, low)))}
              width={Math.max(1, x(hour + 1) - x(hour) - 1)}
              height={Math.abs(y(value) - y(Math.max(0, low)))}
            />
          ))}
          {[0, 6, 12, 18].map((hour, i) => (
            <rect
              key={hour}
              className={i % 2 === 0 ? 'edge-bar is-filled' : 'edge-bar'}
              x={x(hour)}
              y={floor + 3}
              width={x(6) - x(0)}
              height={4}
            />
          ))}
          {[0, 3, 6, 9, 12, 15, 18, 21, 24].map((hour) => (
            <text key={hour} x={x(hour)} y={floor + 22} textAnchor="middle">
              {String(hour).padStart(2, '0')}:00
            </text>
          ))}
        </svg>
      </div>
      <div className="hour-cells">
        {values.map((value, hour) => (
          // biome-ignore lint/suspicious/noArrayIndexKey: an hour is its place
          <div key={hour}>
            <span className="note" aria-hidden="true">
              {hour}
            </span>
            <NumberCell
              label={`${name}, ${hour} to ${hour + 1} h`}
              quantity="number"
              value={value}
              min={-100}
              max={1e6}
              step={most > 1.5 ? 0.5 : 0.1}
              onCommit={(next) => onPaint(values.map((old, h) => (h === hour ? next : old)))}
            />
          </div>
        ))}
      </div>
    </Drawing>
  );
}
