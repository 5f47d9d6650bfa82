// Heat into a room and out of it as streams to scale. Name and figure stand beside every stream, so
// the picture needs no colour to be read.

import { figure } from '../format/index.ts';
import type { Flows } from '../series/year.ts';
import { streams } from '../simulation.ts';
import { type FlowPart, type FlowStream, layFlow, streamPath } from './flow.ts';
import { useWidth } from './use-width.ts';

const namesInto: Readonly<Record<string, string>> = {
  solar: 'Sun through glass',
  gains: 'People and equipment',
  heating: 'Heating',
  cooling: 'Cooling',
  opaque: 'Walls, roof, floor',
  glazing: 'Window glass',
  ground: 'Ground',
  infiltration: 'Air through gaps',
  ventilation: 'Ventilation',
  rooms: 'Other rooms',
  storage: 'Given back by fabric',
};

export function streamName(key: string, isOut: boolean): string {
  if (key === 'storage' && isOut) return 'Taken up by fabric and air';
  return namesInto[key] ?? key;
}

/** Positive into the room; what the fabric takes up counts as leaving the room's air. */
export function partsOf(flows: Flows): FlowPart[] {
  const parts = streams.map((key) => ({ key: key as string, value: flows[key] }));
  return [...parts, { key: 'storage', value: -flows.storage }];
}

/** The picture in words. */
export function flowText(flows: Flows, unit: string): string {
  const { into, out } = layFlow(partsOf(flows), 100);
  const list = (side: readonly FlowStream[], isOut: boolean) =>
    side.map((s) => `${streamName(s.key, isOut)} ${figure(s.shown)} ${unit}`).join(', ') ||
    'nothing';
  return `Into the room: ${list(into, false)}. Out of the room, or stored: ${list(out, true)}.`;
}

export function flowRows(flows: Flows): string[][] {
  const { into, out } = layFlow(partsOf(flows), 100);
  return [
    ...into.map((s) => [`${streamName(s.key, false)}, in`, figure(s.shown)]),
    ...out.map((s) => [`${streamName(s.key, true)}, out`, figure(-s.shown)]),
  ];
}

/** Kept while the pointer runs over hours with few or many streams, so that nothing below moves. */
const leastHeight = 180;

export interface FlowPictureProps {
  readonly flows: Flows;
  readonly unit: string;
  /** Under the bar: whose heat it is. */
  readonly name: string;
  readonly wordsInto?: string;
  readonly barHeight?: number;
}

function colorOf(key: string, isOut: boolean): string {
  if (key === 'storage') return 'stream-stored';
  if (key === 'solar' && !isOut) return 'stream-sun';
  return isOut ? 'stream-out' : 'stream-in';
}

export function FlowPicture(props: FlowPictureProps) {
  const { flows, unit, name, wordsInto = 'Into the room', barHeight = 124 } = props;
  const [box, width] = useWidth<HTMLDivElement>();
  const picture = layFlow(partsOf(flows), barHeight);
  const bar = { x: Math.round(width / 2) - 34, width: 20 };
  const reach = Math.min(194, Math.max(90, width / 2 - 250));
  const x0 = bar.x - reach;
  const x1 = bar.x + bar.width + reach;
  const top = 34;
  const longest = Math.max(
    1,
    ...[...picture.into, ...picture.out].map((s) => figure(s.shown).length),
  );
  /** From a stream's end to its name: the figure, as wide as the longest. */
  const column = 24 + 7.6 * longest;

  return (
    <div ref={box}>
      <svg
        width={width}
        height={top + Math.max(picture.height, leastHeight) + 12}
        aria-hidden="true"
      >
        <text x={x0 - 8} y={12} className="end">
          {wordsInto}
        </text>
        <text x={x1 + 2} y={12}>
          {wordsInto.replace('Into', 'Out of')}, or stored
        </text>
        <g transform={`translate(0 ${top})`}>
          {picture.into.map((s) => (
            <g key={s.key}>
              <path
                d={streamPath(x0, s.outerY, bar.x, s.innerY, Math.max(0.7, s.width))}
                className={colorOf(s.key, false)}
              />
              <text x={x0 - column} y={s.labelY + 4.5} className="end body">
                {streamName(s.key, false)}
              </text>
              <text x={x0 - 8} y={s.labelY + 4.5} className="end strong body">
                {figure(s.shown)}
              </text>
            </g>
          ))}
          {picture.out.map((s) => (
            <g key={s.key}>
              <path
                d={streamPath(x1, s.outerY, bar.x + bar.width, s.innerY, Math.max(0.7, s.width))}
                className={colorOf(s.key, true)}
              />
              <text x={x1 + column - 8} y={s.labelY + 4.5} className="end strong body">
                {figure(s.shown)}
              </text>
              <text x={x1 + column} y={s.labelY + 4.5} className="body">
                {streamName(s.key, true)}
              </text>
            </g>
          ))}
          <rect
            x={bar.x}
            y={picture.barY}
            width={bar.width}
            height={picture.sum > 0 ? barHeight : 1}
            className="ink-fill"
          />
          <text x={bar.x + 10} y={picture.barY - 7} className="middle strong body">
            {`${figure(picture.sum)} ${unit}`}
          </text>
          <text x={bar.x + 10} y={picture.barY + barHeight + 15} className="middle dark">
            {name}
          </text>
        </g>
      </svg>
    </div>
  );
}
