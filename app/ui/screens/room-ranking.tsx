// The rooms as a ranked table whose middle column is the drawing: a bar from zero for an amount, a
// mark on a scale beside the room's band for a level. All rows share one measured scale.

import type { ReactNode } from 'react';
import { edgeBars, evenUnits } from '../chart/measured-edge.ts';
import { roundTicks, tickDecimals } from '../chart/ticks.ts';
import { useWidth } from '../chart/use-width.ts';
import { carpetBand } from '../chart/warm-step.ts';
import { type FigureKind, rankRooms } from '../findings/index.ts';
import { figure } from '../format/index.ts';
import type { RoomSeries, RoomTotals } from '../simulation.ts';
import { useApp, useAppState } from '../state/index.ts';

export interface RoomRankingProps {
  readonly kind: FigureKind;
  readonly rooms: readonly RoomTotals[];
  readonly series: readonly RoomSeries[];
}

interface Scale {
  readonly low: number;
  readonly high: number;
  readonly ticks: readonly number[];
  readonly x: (value: number) => number;
}

const end = 12;

function makeScale(values: readonly number[], isLevel: boolean, width: number): Scale {
  const known = values.filter(Number.isFinite);
  const least = isLevel ? Math.min(...known) : 0;
  const most = Math.max(...known, isLevel ? -Infinity : 0);
  const ticks = roundTicks(known.length ? least : 0, most > least ? most : least + 1, 5);
  const low = ticks[0] ?? 0;
  const high = ticks.at(-1) ?? 1;
  const x = (value: number) => ((value - low) / (high - low || 1)) * (width - 2 * end) + end;
  return { low, high, ticks, x };
}

/** Lowest and highest edge of the room's band over the year. */
function bandOf(series: readonly RoomSeries[], id: string): readonly [number, number] | null {
  const room = series.find((one) => one.id === id);
  const band = room && carpetBand(room.bandLowC, room.bandHighC);
  if (!band) return null;
  return [Math.min(...band.lowC), Math.max(...band.highC)];
}

/** Step 1 to 5 of the ramp by the share of the largest. */
const rampStep = (share: number) => Math.min(5, Math.max(1, Math.ceil(share * 5)));

export function RoomRanking({ kind, rooms, series }: RoomRankingProps) {
  const app = useApp();
  const roomId = useAppState((state) => state.roomId);
  const [box, width] = useWidth<HTMLDivElement>(360);
  const isLevel = kind.kind === 'level';
  const ranked = rankRooms(rooms, kind);
  const bands = new Map(isLevel ? rooms.map((room) => [room.id, bandOf(series, room.id)]) : []);
  const extent = ranked
    .map(({ value }) => value)
    .concat([...bands.values()].flatMap((band) => band ?? []));
  const scale = makeScale(extent, isLevel, width);
  const { unit } = kind.write(0);

  return (
    <table className="ranking">
      <caption className="unseen">{`Rooms ranked by ${kind.head.toLowerCase()}`}</caption>
      <thead>
        <tr>
          <th scope="col">Room</th>
          <th scope="col" className="drawn">
            {kind.head}
          </th>
          <th scope="col" className="number">
            {unit}
          </th>
          <th scope="col" className="number">
            {kind.besideHead}
          </th>
          <th scope="col" className="number">
            m²
          </th>
        </tr>
      </thead>
      <tbody>
        {ranked.map(({ room, value }, i) => (
          <tr
            key={room.id}
            className={room.id === roomId ? 'is-chosen' : ''}
            onClick={() => app.set({ roomId: room.id })}
            onDoubleClick={() => app.go('room', room.id)}
          >
            <th scope="row">
              <button
                type="button"
                className="row-name"
                aria-pressed={room.id === roomId}
                title={`Choose ${room.name}; Enter again opens it`}
                onClick={(event) => {
                  event.stopPropagation();
                  if (room.id === roomId) app.go('room', room.id);
                  else app.set({ roomId: room.id });
                }}
              >
                {room.name}
              </button>
            </th>
            <td className="drawn">
              <div ref={i === 0 ? box : undefined}>
                <Row scale={scale} width={width}>
                  {Number.isNaN(value) ? (
                    <text x={end} y={17}>
                      not occupied
                    </text>
                  ) : isLevel ? (
                    <Level
                      scale={scale}
                      value={value}
                      band={bands.get(room.id) ?? null}
                      kind={kind}
                    />
                  ) : (
                    <rect
                      x={scale.x(0)}
                      y={5}
                      width={Math.max(0, scale.x(value) - scale.x(0))}
                      height={16}
                      className={`fill-${kind.ramp}-${rampStep(value / scale.high)}`}
                    />
                  )}
                </Row>
              </div>
            </td>
            <td className="number strong">{kind.write(value).figure}</td>
            <td className="number quiet">{Number.isNaN(value) ? '' : kind.beside(room)}</td>
            <td className="number quiet">{figure(room.floorAreaM2, 1)}</td>
          </tr>
        ))}
      </tbody>
      <tfoot>
        <tr>
          <td />
          <td className="drawn">
            <ScaleEdge scale={scale} width={width} unit={unit} power={kind.key === 'peak'} />
          </td>
          <td colSpan={3} />
        </tr>
      </tfoot>
    </table>
  );
}

function Row({ scale, width, children }: { scale: Scale; width: number; children: ReactNode }) {
  return (
    <svg width={width} height={26} aria-hidden="true">
      {scale.ticks.map((tick) => (
        <path key={tick} d={`M${Math.round(scale.x(tick)) + 0.5} 0V26`} className="grid" />
      ))}
      {children}
    </svg>
  );
}

interface LevelProps {
  readonly scale: Scale;
  readonly value: number;
  readonly band: readonly [number, number] | null;
  readonly kind: FigureKind;
}

/** The band is an area, the level a mark; the line between them is how far it lies outside. */
function Level({ scale, value, band, kind }: LevelProps) {
  const nearest = band && Math.min(band[1], Math.max(band[0], value));
  const color = kind.ramp === 'amount' ? 'heat-in' : 'heat-out';
  return (
    <>
      {band && (
        <rect
          x={scale.x(band[0])}
          y={4}
          width={scale.x(band[1]) - scale.x(band[0])}
          height={18}
          className="band-fill"
        />
      )}
      {nearest !== null && nearest !== value && (
        <path d={`M${scale.x(nearest)} 13H${scale.x(value)}`} className={`reach ${color}`} />
      )}
      <rect x={scale.x(value) - 2} y={5} width={4} height={16} className={`mark ${color}`} />
    </>
  );
}

interface ScaleEdgeProps {
  readonly scale: Scale;
  readonly width: number;
  readonly unit: string;
  /** Watts are written in kilowatts. */
  readonly power: boolean;
}

function ScaleEdge({ scale, width, unit, power }: ScaleEdgeProps) {
  const { ticks, x, low, high } = scale;
  const factor = power ? 0.001 : 1;
  const shown = ticks.map((tick) => tick * factor);
  const decimals = tickDecimals(shown);
  const size = (ticks[1] ?? 1) - (ticks[0] ?? 0);
  return (
    <svg width={width} height={24} aria-hidden="true">
      {edgeBars(evenUnits(low, high, size), x).map((bar) => (
        <rect
          key={bar.x}
          x={bar.x}
          y={1}
          width={bar.width}
          height={4}
          className={bar.isFilled ? 'edge-full' : 'edge-open'}
        />
      ))}
      {ticks.map((tick, i) => {
        const isLast = i === ticks.length - 1;
        return (
          <text
            key={tick}
            x={isLast ? x(tick) + end : x(tick)}
            y={18}
            className={isLast ? 'end' : 'middle'}
          >
            {`${figure(tick * factor, decimals)}${isLast ? ` ${unit}` : ''}`}
          </text>
        );
      })}
    </svg>
  );
}
