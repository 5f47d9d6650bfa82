// The year as a carpet: a day across, an hour upward, one crisp cell an hour, coloured by steps that
// can be named. The chosen week is a bracket, the chosen hour a triangle at the hour axis.

import { useEffect, useRef } from 'react';
import { type Calendar, clock } from '../format/index.ts';
import { type InkName, useInk } from './ink.ts';
import { edgeBars, evenUnits, monthUnits } from './measured-edge.ts';
import { usePlotMargin } from './plot-margin.ts';
import { useWidth } from './use-width.ts';

export interface YearCarpetProps {
  readonly calendar: Calendar;
  /** Colour of each hour. */
  readonly stepOf: (hour: number) => InkName;
  /** Changes when the colours of the hours do. */
  readonly version: unknown;
  readonly week: { readonly firstHour: number; readonly endHour: number } | null;
  readonly hour: number | null;
  readonly onHover?: (hour: number | null) => void;
  readonly onPick?: (hour: number) => void;
  readonly rowHeight?: number;
}

/** Room for the upper half of the word at 24:00. */
const top = 8;

export function YearCarpet(props: YearCarpetProps) {
  const { calendar, stepOf, version, week, hour, onHover, onPick, rowHeight = 6.5 } = props;
  const [box, width] = useWidth<HTMLDivElement>();
  const canvas = useRef<HTMLCanvasElement>(null);
  const margin = usePlotMargin();
  const ink = useInk();
  const plotWidth = Math.max(1, width - margin.left - margin.right);
  const plotHeight = Math.round(24 * rowHeight);
  const { days } = calendar;

  // biome-ignore lint/correctness/useExhaustiveDependencies: `version` stands for `stepOf`
  useEffect(() => {
    const ctx = canvas.current?.getContext('2d');
    if (!ctx || !canvas.current) return;
    const scale = globalThis.devicePixelRatio || 1;
    const w = Math.round(plotWidth * scale);
    const h = Math.round(plotHeight * scale);
    canvas.current.width = w;
    canvas.current.height = h;
    for (let day = 0; day < days; day++) {
      const x0 = Math.round((day * w) / days);
      const x1 = Math.round(((day + 1) * w) / days);
      for (let k = 0; k < 24; k++) {
        const y0 = Math.round(h - ((k + 1) * h) / 24);
        const y1 = Math.round(h - (k * h) / 24);
        ctx.fillStyle = ink[stepOf(day * 24 + k)];
        ctx.fillRect(x0, y0, x1 - x0, y1 - y0);
      }
    }
  }, [ink, plotWidth, plotHeight, days, version]);

  const x = (h: number) => margin.left + (h / (days * 24)) * plotWidth;
  const y = (hourOfDay: number) => top + plotHeight - (hourOfDay / 24) * plotHeight;

  function at(clientX: number, clientY: number): number | null {
    const rect = canvas.current?.getBoundingClientRect();
    if (!rect) return null;
    const day = Math.floor(((clientX - rect.left) / rect.width) * days);
    const k = 23 - Math.floor(((clientY - rect.top) / rect.height) * 24);
    return day < 0 || day >= days || k < 0 || k > 23 ? null : day * 24 + k;
  }

  const edgeY = top + plotHeight + 2;
  return (
    <div ref={box} className="carpet" aria-hidden="true" style={{ height: plotHeight + 32 }}>
      <canvas
        ref={canvas}
        style={{ left: margin.left, top, width: plotWidth, height: plotHeight }}
        onPointerMove={(event) => onHover?.(at(event.clientX, event.clientY))}
        onPointerLeave={() => onHover?.(null)}
        onClick={(event) => {
          const picked = at(event.clientX, event.clientY);
          if (picked !== null) onPick?.(picked);
        }}
      />
      <svg width={width} height={plotHeight + 32} aria-hidden="true">
        {[0, 6, 12, 18, 24]
          .filter((k) => hour === null || Math.abs(k - (hour % 24) - 0.5) > 2)
          .map((k) => (
            <text key={k} x={margin.left - 8} y={y(k) + 4} className="end">
              {`${String(k).padStart(2, '0')}:00`}
            </text>
          ))}
        {edgeBars(evenUnits(0, 24, 6), (k) => -y(k)).map((bar) => (
          <rect
            key={bar.x}
            x={margin.left - 5}
            y={-bar.x - bar.width}
            width={4}
            height={bar.width}
            className={bar.isFilled ? 'edge-full' : 'edge-open'}
          />
        ))}
        {edgeBars(monthUnits(calendar.months), x).map((bar) => (
          <g key={bar.label}>
            <rect
              x={bar.x}
              y={edgeY}
              width={Math.max(0, bar.width)}
              height={4}
              className={bar.isFilled ? 'edge-full' : 'edge-open'}
            />
            <text x={bar.x + bar.width / 2} y={edgeY + 17} className="middle">
              {bar.label}
            </text>
          </g>
        ))}
        {week && (
          <rect
            x={x(week.firstHour) - 1}
            y={top - 2}
            width={x(week.endHour) - x(week.firstHour) + 2}
            height={plotHeight + 4}
            className="bracket"
          />
        )}
        {hour !== null && (
          <>
            <path
              d={`M${margin.left - 6} ${y((hour % 24) + 0.5)}l-9 -5v10z`}
              className="mark-fill"
            />
            <text
              x={margin.left - 18}
              y={y((hour % 24) + 0.5) + 4}
              className="end mark-fill strong"
            >
              {clock(hour)}
            </text>
            <path
              d={`M${x(Math.floor(hour / 24) * 24 + 12)} ${top}V${top + plotHeight}`}
              className="day-mark"
            />
          </>
        )}
      </svg>
    </div>
  );
}
