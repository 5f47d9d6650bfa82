// A drawn section of a two-storey house: the picture is the index of the words used by the tool.

import { useWidth } from '../chart/use-width.ts';

const labels = [
  { x: 112, y: 230, end: true, name: 'Outside wall', note: 'layers, U-value' },
  { x: 112, y: 372, end: true, name: 'Infiltration', note: 'air through gaps' },
  { x: 398, y: 134, end: false, name: 'Roof', note: 'insulation' },
  { x: 622, y: 260, end: false, name: 'Sun through glass', note: 'glazing, shading' },
  { x: 638, y: 375, end: false, name: 'Window', note: 'panes, frame' },
  { x: 638, y: 424, end: false, name: 'Heater', note: 'capacity, set-point' },
  { x: 432, y: 352, end: false, name: 'Gains', note: 'people, equipment' },
  { x: 322, y: 503, end: false, name: 'Ground', note: '' },
  { x: 218, y: 224, end: false, name: 'Room', note: 'air, surfaces, mass' },
] as const;

/** Heat on its way out: shaft from, to, and width. */
const arrows = [
  { d: 'M230 252H140', head: 'M130 252l10 -7.5v15z', width: 7 },
  { d: 'M230 394.5H140', head: 'M130 394.5l10 -8.5v17z', width: 9 },
  { d: 'M385 202V127', head: 'M385 117l7 10h-14z', width: 6 },
  { d: 'M305 432V497', head: 'M305 507l-6 -10h12z', width: 4 },
  { d: 'M550 374.5H620', head: 'M630 374.5l-10 6.5v-13z', width: 5 },
] as const;

const walls = [
  [190, 182, 15, 280],
  [565, 182, 15, 35],
  [565, 274.5, 15, 82.5],
  [565, 417, 15, 45],
  [205, 322, 360, 10],
  [205, 184.5, 360, 7.5],
  [190, 462, 390, 12.5],
  [370, 332, 6, 130],
] as const;

const insulation = Array.from({ length: 36 }, (_, i) => `${210 + i * 10} ${i % 2 ? 183.5 : 170.5}`);

/** Width that the drawing is laid out for; narrower, it shrinks, but its words do not. */
const drawnWidth = 770;

export function HouseSection() {
  const [box, width] = useWidth<HTMLDivElement>(drawnWidth);
  const grow = Math.max(1, drawnWidth / Math.max(width, 1));
  return (
    <div ref={box} className="house-section">
      <svg
        viewBox="0 0 770 548"
        style={{ fontSize: `${11 * grow}px` }}
        role="img"
        aria-label="Section through a two-storey house with the ways that heat comes and goes: sun through glass, gains and heater bring it in; roof, outside wall, window, infiltration and ground let it out."
      >
        <defs>
          <pattern id="soil" width="16" height="10" patternUnits="userSpaceOnUse">
            <path d="M2 3h4M10 7h4" className="soil" />
          </pattern>
        </defs>
        <rect y="462" width="770" height="56" fill="url(#soil)" />
        <path d="M0 462H770" className="ground" />
        <rect x="205" y="332" width="360" height="130" className="room-fill" />
        <rect x="205" y="192" width="360" height="130" className="room-fill" />
        <path d="M205 184.5L385 47L565 184.5Z" className="loft-fill" />
        <path d="M572.5 217V274.5L450 322H325Z" className="beam" />
        <path d="M572.5 357V417L470 459.5H320Z" className="beam" />
        {walls.map(([x, y, width, height]) => (
          <rect key={`${x} ${y}`} x={x} y={y} width={width} height={height} className="wall-fill" />
        ))}
        <path
          d="M565 217h15v57.5h-15zM570 217v57.5M575 217v57.5M565 357h15v60h-15zM570 357v60M575 357v60"
          className="wall-line"
        />
        <path d="M170 202L385 37L600 202" className="roof-line" />
        <rect x="210" y="169.5" width="350" height="15" className="insulation" />
        <path d={`M${insulation.join('L')}`} className="insulation-line" />
        <circle cx="732" cy="64" r="17" className="sun-disc" />
        <path d="M700 74L594.3 223.9M707 84L598.5 236.5M714 94L602.7 249.1" className="ray" />
        {arrows.map(({ d, head, width }) => (
          <g key={d} className="loss">
            <path d={d} strokeWidth={width} />
            <path d={head} className="loss-head" />
          </g>
        ))}
        {[502.5, 510.5, 518.5, 526.5, 534.5].map((x) => (
          <rect key={x} x={x} y="424.5" width="6" height="27.5" className="heater" />
        ))}
        <circle cx="420" cy="404" r="7" className="ink-fill" />
        <path d="M412 414h16v26h-4v22h-8v-22h-4z" className="ink-fill" />
        <path d="M150 246L116 226M150 387.5L116 368.5M547.5 438L633.5 420.5" className="leader" />
        {labels.map(({ x, y, end, name, note }) => (
          <g key={name} className={end ? 'end' : ''}>
            <text x={x} y={y} className="body dark medium">
              {name}
            </text>
            <text x={x} y={y + 13.5 * grow}>
              {note}
            </text>
          </g>
        ))}
        {[0, 1, 2, 3, 4, 5, 6, 7].map((i) => (
          <rect
            key={i}
            x={190 + i * 50}
            y="524"
            width={i === 7 ? 40 : 50}
            height="4"
            className={i % 2 ? 'edge-open' : 'edge-full'}
          />
        ))}
        <text x="190" y="541" className="middle">
          0
        </text>
        <text x="440" y="541" className="middle">
          5 m
        </text>
      </svg>
    </div>
  );
}
