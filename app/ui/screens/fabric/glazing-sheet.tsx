// One glazing: U and g, sun by its angle, and panes and gaps as a table.

import { useState } from 'react';
import { type Building, type GlazingExplained, libraryGlazings } from '../../../../engine/index.ts';
import {
  copyGlazingEdit,
  type GlazingForm,
  glazingEdit,
  type ProjectForm,
  swapGlazingEdit,
} from '../../../project/index.ts';
import { Drawing } from '../../chart/drawing.tsx';
import { figure } from '../../format/index.ts';
import { NumberCell } from '../../parts/number-cell.tsx';
import { PickDialog } from '../../parts/pick-dialog.tsx';
import { TextCell } from '../../parts/text-cell.tsx';
import { explainedOf, useApp } from '../../state/index.ts';
import { AngleCurve } from './angle-curve.tsx';
import { PaneTable } from './pane-table.tsx';

export interface GlazingSheetProps {
  readonly form: ProjectForm;
  readonly building: Building;
  readonly glazing: Building['glazings'][number];
}

export function GlazingSheet({ form, building, glazing }: GlazingSheetProps) {
  const app = useApp();
  const [isSwapping, setSwapping] = useState(false);
  const explained = explainedOf(building).glazings.find(({ id }) => id === glazing.id);
  const openings = building.rooms
    .flatMap((room) => room.surfaces)
    .flatMap((surface) => surface.openings)
    .filter((opening) => opening.glazing === glazing.id);
  const areaM2 = openings.reduce((sum, opening) => sum + opening.areaM2, 0);
  const set = (next: GlazingForm, name: string) => app.edit(glazingEdit(form, next, name));
  if (!explained) return null;

  return (
    <>
      <div className="sheet-head">
        <h1 className="unseen">{glazing.name}</h1>
        <TextCell
          label="Name of the glazing"
          className="is-title"
          value={glazing.name}
          onCommit={(name) => set({ ...glazing, name }, `Named ${name}`)}
        />
        <span className="quiet">
          {openings.length > 0
            ? `${figure(areaM2, 1)} m² in ${openings.length === 1 ? '1 window' : `${openings.length} windows`}`
            : 'not used yet'}
        </span>
        <span className="sheet-acts">
          <button type="button" className="button" onClick={() => setSwapping(true)}>
            Swap for…
          </button>
          <button
            type="button"
            className="button"
            onClick={() => {
              const copied = copyGlazingEdit(
                form,
                glazing,
                building.glazings.map(({ id }) => id),
              );
              app.edit(copied.edit);
              app.choose('fabric', `glazing:${copied.id}`);
            }}
          >
            Copy glazing
          </button>
        </span>
      </div>
      <GlazingValues explained={explained} />
      <AngleCurve explained={explained} />
      {glazing.kind === 'simple' ? (
        <Drawing title="Given as U and g" equivalent="U-value and g-value as typed.">
          <div className="pairs">
            <span>U-value</span>
            <NumberCell
              label="U-value"
              quantity="transmittance"
              hasUnit
              value={glazing.uValueWPerM2K}
              min={0.1}
              max={7}
              step={0.1}
              help="Upright, in the middle of the glass. Single 5.8, double with a coating 1.1, triple 0.6"
              onCommit={(uValueWPerM2K) =>
                set({ ...glazing, uValueWPerM2K }, 'U-value of the glass')
              }
            />
            <span>g-value</span>
            <NumberCell
              label="g-value"
              quantity="share"
              value={glazing.gValue}
              min={0}
              max={1}
              step={0.01}
              help="Share of the sun that reaches the room. Clear double 0.75, sun control 0.3"
              onCommit={(gValue) => set({ ...glazing, gValue }, 'g-value of the glass')}
            />
          </div>
        </Drawing>
      ) : (
        <PaneTable glazing={glazing} onChange={set} />
      )}
      {isSwapping && (
        <PickDialog
          label="Glazing of the library"
          picks={libraryGlazings.map(({ glazing: one, typicalUWPerM2K, typicalG }) => ({
            id: one.id,
            name: one.name,
            kind: one.kind === 'simple' ? 'U and g' : 'panes',
            aside: `U ${typicalUWPerM2K[0]} g ${typicalG[0]}`,
          }))}
          onPick={(id) => {
            const swap = swapGlazingEdit(form, glazing, id);
            if (swap) app.edit(swap);
          }}
          onClose={() => setSwapping(false)}
        />
      )}
    </>
  );
}

function GlazingValues({ explained }: { explained: GlazingExplained }) {
  const rows = [
    ['U-value', figure(explained.uValueWPerM2K, 2), 'W/(m²·K)', 'upright, EN 673'],
    ['g-value', figure(explained.gValue, 2), '', 'sun straight on, EN 410'],
    ['Sun let through', figure(explained.transmittance, 2), '', 'straight on'],
    ['Sun thrown back', figure(explained.reflectance, 2), '', 'straight on'],
    ['Diffuse light through', figure(explained.diffuseTransmittance, 2), '', 'from the whole sky'],
    ['g, diffuse', figure(explained.diffuseGValue, 2), '', 'from the whole sky'],
  ] as const;
  return (
    <dl className="values">
      {rows.map(([name, value, unit, note]) => (
        <div key={name}>
          <dt>{name}</dt>
          <dd>
            <b>{value}</b> {unit && <span>{unit}</span>}
            <span className="note">{note}</span>
          </dd>
        </div>
      ))}
    </dl>
  );
}
