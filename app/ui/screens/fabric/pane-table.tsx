// Panes and gaps of a glazing, from outside to inside.

import type { Building } from '../../../../engine/index.ts';
import type { GlazingForm } from '../../../project/index.ts';
import { Drawing } from '../../chart/drawing.tsx';
import { Choice } from '../../parts/choice.tsx';
import { NumberCell } from '../../parts/number-cell.tsx';

type Panes = Extract<Building['glazings'][number], { kind: 'panes' }>;
type Pane = Panes['panes'][number];

export interface PaneTableProps {
  readonly glazing: Panes;
  readonly onChange: (next: GlazingForm, name: string) => void;
}

const gases = [
  { value: 'air', name: 'Air' },
  { value: 'argon', name: 'Argon' },
  { value: 'krypton', name: 'Krypton' },
  { value: 'xenon', name: 'Xenon' },
] as const;
const shares = [
  ['solarTransmittance', 'Sun through', 'of the bare pane, straight on; clear 4 mm 0.83'],
  [
    'frontSolarReflectance',
    'Thrown back, front',
    'empty for clear glass: from its refractive index',
  ],
  ['backSolarReflectance', 'Thrown back, back', 'empty for clear glass'],
  ['frontEmissivity', 'Emissivity, front', 'plain glass 0.84, hard coat 0.17, soft coat 0.03'],
  ['backEmissivity', 'Emissivity, back', 'plain glass 0.84, hard coat 0.17, soft coat 0.03'],
] as const;
const newGap = { gas: 'argon', thicknessM: 0.016 } as const;

export function PaneTable({ glazing, onChange }: PaneTableProps) {
  const { panes, gaps } = glazing;
  const setPane = (i: number, change: Partial<Pane>, name: string) =>
    onChange(
      { ...glazing, panes: panes.map((pane, p) => (p === i ? { ...pane, ...change } : pane)) },
      `Pane ${i + 1}, ${name.toLowerCase()}`,
    );
  function emptyPane(i: number, field: (typeof shares)[number][0]) {
    const next = panes.map((pane, p) => {
      if (p !== i) return pane;
      const { [field]: _, ...rest } = pane;
      return rest as Pane;
    });
    onChange({ ...glazing, panes: next }, `Pane ${i + 1} as clear glass`);
  }
  return (
    <Drawing
      title="Panes and gaps"
      note="outside to inside; fronts face outside"
      equivalent={`${panes.length} panes.`}
      aside={
        <>
          <button
            type="button"
            className="button"
            disabled={panes.length >= 5}
            onClick={() =>
              onChange(
                {
                  ...glazing,
                  panes: [...panes, ...panes.slice(-1)],
                  gaps: [...gaps, gaps.at(-1) ?? newGap],
                },
                'Pane added',
              )
            }
          >
            Add pane
          </button>
          <button
            type="button"
            className="button"
            disabled={panes.length <= 1}
            onClick={() =>
              onChange(
                { ...glazing, panes: panes.slice(0, -1), gaps: gaps.slice(0, -1) },
                'Inner pane removed',
              )
            }
          >
            Remove pane
          </button>
        </>
      }
    >
      <table className="layers grid-table">
        <thead>
          <tr>
            <th scope="col">Pane or gap</th>
            <th scope="col">Thickness</th>
            {shares.map(([field, name]) => (
              <th key={field} scope="col">
                {name}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {panes.flatMap((pane, i) => {
            const gap = gaps[i];
            const label = `Pane ${i + 1}`;
            const row = (
              <tr key={label}>
                <th scope="row">{label}</th>
                <td className="number">
                  <NumberCell
                    label={`${label}, thickness`}
                    quantity="thickness"
                    value={pane.thicknessM}
                    min={0.001}
                    max={0.1}
                    onCommit={(thicknessM) => setPane(i, { thicknessM }, 'thickness')}
                  />
                </td>
                {shares.map(([field, name, help]) => (
                  <td key={field} className="number">
                    <NumberCell
                      label={`${label}, ${name.toLowerCase()}`}
                      quantity="share"
                      value={pane[field]}
                      min={field.endsWith('Emissivity') ? 0.01 : 0}
                      max={1}
                      step={0.01}
                      help={help}
                      {...(field.endsWith('Reflectance')
                        ? { onEmpty: () => emptyPane(i, field) }
                        : {})}
                      onCommit={(value) => setPane(i, { [field]: value }, name)}
                    />
                  </td>
                ))}
              </tr>
            );
            if (!gap) return [row];
            const setGap = (change: Partial<typeof gap>, name: string) =>
              onChange(
                { ...glazing, gaps: gaps.map((one, g) => (g === i ? { ...one, ...change } : one)) },
                `Gap ${i + 1}, ${name}`,
              );
            return [
              row,
              <tr key={`${label}, gap`} className="film">
                <th scope="row">
                  <Choice
                    label={`Gas of gap ${i + 1}`}
                    value={gap.gas}
                    options={gases}
                    onChoose={(gas) => setGap({ gas }, gas)}
                  />
                </th>
                <td className="number">
                  <NumberCell
                    label={`Gap ${i + 1}, thickness`}
                    quantity="thickness"
                    value={gap.thicknessM}
                    min={0.002}
                    max={0.2}
                    onCommit={(thicknessM) => setGap({ thicknessM }, 'thickness')}
                  />
                </td>
                <td colSpan={5} />
              </tr>,
            ];
          })}
        </tbody>
      </table>
    </Drawing>
  );
}
