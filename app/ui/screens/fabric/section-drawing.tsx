// The section through a construction: true thickness on a measured edge, temperature and dew point
// through it, and a handle on the inner edge of the chosen layer.

import { type KeyboardEvent, type PointerEvent, useRef } from 'react';
import type { Building, ConstructionSection } from '../../../../engine/index.ts';
import type { ConstructionForm } from '../../../project/index.ts';
import { Drawing } from '../../chart/drawing.tsx';
import { roundTicks } from '../../chart/ticks.ts';
import { useWidth } from '../../chart/use-width.ts';
import { figure } from '../../format/index.ts';
import { layerHatch, SectionHatches } from './section-hatches.tsx';
import { sectionScale } from './section-scale.ts';
import { wetPath } from './wet-path.ts';

export interface SectionDrawingProps {
  readonly construction: ConstructionForm;
  readonly building: Building;
  readonly section: ConstructionSection;
  readonly chosen: number;
  readonly onChoose: (index: number) => void;
  /** As a handle moves: the thickness of the chosen layer. */
  readonly onThickness: (thicknessM: number) => void;
  readonly onEnd: () => void;
}

const height = 236;
const top = 26;
const bottom = 58;
const thinnestM = 0.001;
const thickestM = 1;

export function SectionDrawing(props: SectionDrawingProps) {
  const { construction, building, section, chosen, onChoose, onThickness, onEnd } = props;
  const [ref, width] = useWidth<HTMLDivElement>();
  const drag = useRef<{ x: number; thicknessM: number; pxPerM: number } | null>(null);
  const scale = sectionScale(section.layers, width);
  const dew = section.layers.flatMap((layer) => layer.dewPointC ?? []);
  const { insideC, outsideC } = section.climate;
  const ticks = roundTicks(
    Math.min(insideC, outsideC, section.outsideDewPointC, ...dew),
    Math.max(insideC, outsideC) + 1,
    5,
  );
  const low = ticks[0] ?? 0;
  const high = ticks.at(-1) ?? 1;
  const floor = height - bottom;
  const y = (celsius: number) => floor - ((celsius - low) / (high - low)) * (floor - top);
  const chosenLayer = construction.layers[chosen];
  const thicknessM = chosenLayer && 'material' in chosenLayer ? chosenLayer.thicknessM : null;
  const place = scale.places[chosen];
  const handleX = place ? place.x + place.width : 0;

  const clamp = (value: number) =>
    Math.max(thinnestM, Math.min(thickestM, Math.round(value * 1000) / 1000));

  function grab(event: PointerEvent<SVGGElement>) {
    if (thicknessM === null) return;
    event.currentTarget.setPointerCapture(event.pointerId);
    drag.current = { x: event.clientX, thicknessM, pxPerM: scale.pxPerM };
  }
  function move(event: PointerEvent) {
    const from = drag.current;
    if (!from) return;
    const next = clamp(from.thicknessM + (event.clientX - from.x) / from.pxPerM);
    if (next !== thicknessM) onThickness(next);
  }
  function drop() {
    if (!drag.current) return;
    drag.current = null;
    onEnd();
  }
  function press(event: KeyboardEvent) {
    if (thicknessM === null) return;
    const by = event.shiftKey ? 0.01 : 0.001;
    const next = {
      ArrowRight: thicknessM + by,
      ArrowUp: thicknessM + by,
      ArrowLeft: thicknessM - by,
      ArrowDown: thicknessM - by,
      PageUp: thicknessM + 0.02,
      PageDown: thicknessM - 0.02,
    }[event.key];
    if (next === undefined) return;
    event.preventDefault();
    onThickness(clamp(next));
  }

  const temperature: (readonly [number, number])[] = [
    [scale.left - 52, outsideC],
    [scale.left - 22, outsideC],
    ...section.layers.flatMap((layer, i) => {
      const { x, width: w } = scale.places[i] ?? { x: 0, width: 0 };
      return [[x, layer.outerC] as const, [x + w, layer.innerC] as const];
    }),
    [scale.right + 22, insideC],
    [scale.right + 56, insideC],
  ];
  const path = (points: readonly (readonly [number, number])[]) =>
    points
      .map(([px, t], i) => `${i === 0 ? 'M' : 'L'}${px.toFixed(1)} ${y(t).toFixed(1)}`)
      .join('');
  const dewPoints = section.layers.flatMap((layer, i) => {
    const { x, width: w } = scale.places[i] ?? { x: 0, width: 0 };
    return (layer.dewPointC ?? []).map(
      (t, p, all) => [x + (w * p) / Math.max(1, all.length - 1), t] as const,
    );
  });
  const names = section.layers.map((layer) => layer.name).join(', ');
  const words = `From outside: ${names}. Outside ${figure(outsideC, 1)} °C, outer face ${figure(section.outerFaceC, 1)}, inner face ${figure(section.innerFaceC, 1)}, room ${figure(insideC, 1)} °C. Dew point of the room air ${figure(section.insideDewPointC, 1)} °C.`;
  const rows = () =>
    section.layers.map((layer) => [
      layer.name,
      figure(layer.thicknessM * 1000, 1),
      figure(layer.outerC, 1),
      figure(layer.innerC, 1),
      layer.dewPointC ? figure(layer.dewPointC[0] ?? NaN, 1) : '–',
    ]);

  return (
    <Drawing
      title="Section"
      note={
        section.vapourUnknown.length > 0
          ? `no dew point: ${section.vapourUnknown[0]} has no vapour factor`
          : 'temperature and dew point in steady cold'
      }
      equivalent={words}
      table={{ columns: ['Layer', 'mm', 'outer, °C', 'inner, °C', 'dew point outer, °C'], rows }}
    >
      <div ref={ref} className="section">
        <svg width={width} height={height} aria-hidden="true" className="section-picture">
          <SectionHatches />
          {ticks.map((tick, i) => (
            <g key={tick}>
              <line
                className="grid"
                x1={scale.left - 52}
                x2={scale.right + 56}
                y1={y(tick)}
                y2={y(tick)}
              />
              <text x={scale.left - 60} y={y(tick) + 4} textAnchor="end">
                {figure(tick)}
                {i === ticks.length - 1 && ' °C'}
              </text>
            </g>
          ))}
          <text className="strong" x={scale.left - 12} y={16} textAnchor="end">
            Outside
          </text>
          <text className="strong" x={scale.right + 12} y={16}>
            Inside
          </text>
          {section.layers.map((layer, i) => {
            const at = scale.places[i];
            if (!at) return null;
            return (
              <g
                // biome-ignore lint/suspicious/noArrayIndexKey: a layer is its place
                key={i}
                onPointerDown={() => onChoose(i)}
              >
                <rect
                  className="layer-ground"
                  x={at.x}
                  y={top}
                  width={at.width}
                  height={floor - top}
                />
                <rect
                  x={at.x}
                  y={top}
                  width={at.width}
                  height={floor - top}
                  fill={layerHatch(construction.layers[i], building)}
                />
                {i === chosen && (
                  <rect
                    className="layer-chosen"
                    x={at.x}
                    y={top}
                    width={at.width}
                    height={floor - top}
                  />
                )}
                <line className="layer-edge" x1={at.x} x2={at.x} y1={top} y2={floor} />
                <line
                  className="layer-edge"
                  x1={at.x + at.width}
                  x2={at.x + at.width}
                  y1={top}
                  y2={floor}
                />
                {at.width > 54 && (
                  <text x={at.x + at.width / 2} y={16} textAnchor="middle">
                    {cut(layer.name, at.width)}
                  </text>
                )}
              </g>
            );
          })}
          <path className="dew-wet" fill="url(#hatch-wet)" d={wetPath(section, scale.places, y)} />
          {dewPoints.length > 0 && <path className="dew-halo" d={path(dewPoints)} />}
          {dewPoints.length > 0 && <path className="dew" d={path(dewPoints)} />}
          <path className="heat-halo" d={path(temperature)} />
          <path className="heat" d={path(temperature)} />
          <text className="heat-word" x={scale.right + 56} y={y(insideC) - 6} textAnchor="end">
            {figure(insideC, 1)} °C
          </text>
          <text className="heat-word" x={scale.left - 52} y={y(outsideC) - 6}>
            {figure(outsideC, 1)} °C
          </text>
          {dewPoints.length > 0 && (
            <text className="dew-word" x={scale.right + 6} y={y(section.insideDewPointC) + 4}>
              dew point {figure(section.insideDewPointC, 1)}
            </text>
          )}
          {scale.edge.map((bar) => (
            <rect
              key={bar.x}
              className={bar.isFilled ? 'edge-bar is-filled' : 'edge-bar'}
              x={bar.x}
              y={floor + 6}
              width={bar.width}
              height={4}
            />
          ))}
          {scale.marks.map(({ x, label }) => (
            <text key={label} x={x} y={floor + 24} textAnchor="middle">
              {label}
            </text>
          ))}
          {thicknessM !== null && place && (
            <>
              <path
                className="select-line"
                d={`M${place.x} ${floor + 30}v8M${handleX} ${floor + 30}v8M${place.x} ${floor + 34}H${handleX}`}
              />
              <text
                className="select-word"
                x={place.x + place.width / 2}
                y={floor + 52}
                textAnchor="middle"
              >
                {figure(thicknessM * 1000, thicknessM * 1000 < 10 ? 1 : 0)} mm
              </text>
            </>
          )}
        </svg>
        {thicknessM !== null && (
          <div
            role="slider"
            tabIndex={0}
            className="section-handle"
            aria-label={`Thickness of ${section.layers[chosen]?.name ?? 'the layer'}`}
            aria-valuemin={thinnestM * 1000}
            aria-valuemax={thickestM * 1000}
            aria-valuenow={thicknessM * 1000}
            aria-valuetext={`${figure(thicknessM * 1000, 1)} mm`}
            aria-orientation="horizontal"
            style={{ left: handleX - 12, top, height: floor - top }}
            onPointerDown={(event) => grab(event as unknown as PointerEvent<SVGGElement>)}
            onPointerMove={move}
            onPointerUp={drop}
            onPointerCancel={drop}
            onKeyDown={press}
            onKeyUp={onEnd}
          />
        )}
      </div>
    </Drawing>
  );
}

const pxPerLetter = 6.2;
const cut = (name: string, width: number) => {
  const letters = Math.floor(width / pxPerLetter);
  return name.length <= letters ? name : `${name.slice(0, Math.max(3, letters - 1))}…`;
};
