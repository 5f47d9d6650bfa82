// One construction: its values, its section that is the editor, its layers as a table.

import { useState } from 'react';
import {
  type Building,
  constructionSection,
  libraryConstructions,
  libraryMaterials,
} from '../../../../engine/index.ts';
import {
  type ConstructionForm,
  constructionEdit,
  copyEdit,
  type LayerForm,
  layersEdit,
  type ProjectForm,
  swapEdit,
} from '../../../project/index.ts';
import { figure } from '../../format/index.ts';
import { NumberCell } from '../../parts/number-cell.tsx';
import { PickDialog } from '../../parts/pick-dialog.tsx';
import { TextCell } from '../../parts/text-cell.tsx';
import { explainedOf, useApp } from '../../state/index.ts';
import { ConstructionValues } from './construction-values.tsx';
import { LayerTable } from './layer-table.tsx';
import { SectionDrawing } from './section-drawing.tsx';

export interface ConstructionSheetProps {
  readonly form: ProjectForm;
  readonly building: Building;
  readonly construction: ConstructionForm & Building['constructions'][number];
}

type Picking = 'material' | 'swap' | { readonly replace: number } | null;

/** Conditions of the drawn section: cold outside, as a person would look at it. */
const usual = { insideC: 20, outsideC: -5, insideHumidity: 0.5, outsideHumidity: 0.8 };
const newLayerM = 0.05;

export function ConstructionSheet({ form, building, construction }: ConstructionSheetProps) {
  const app = useApp();
  const [at, setAt] = useState(() => thickestInsulation(building, construction));
  const [climate, setClimate] = useState(usual);
  const [picking, setPicking] = useState<Picking>(null);
  const own = { form, building, construction };
  const explained = explainedOf(building).constructions.find(({ id }) => id === construction.id);
  const use = explained?.uses.reduce((a, b) => (b.areaM2 > a.areaM2 ? b : a));
  const { layers } = construction;
  const chosen = Math.min(at, layers.length - 1);
  if (!explained || !use) return null;
  const section = constructionSection(building, construction, use.heatFlow, use.behind, climate);
  const edit = (next: readonly LayerForm[], name: string, gesture?: string) =>
    app.edit(layersEdit(own, next, name, gesture));

  function setThickness(index: number, thicknessM: number, gesture?: string) {
    const layer = layers[index];
    if (!layer || !('material' in layer)) return;
    const name = section.layers[index]?.name ?? 'Layer';
    const words = `${name} ${figure(layer.thicknessM * 1000)} to ${figure(thicknessM * 1000)} mm`;
    edit(
      layers.map((one, i) => (i === index ? { ...layer, thicknessM } : one)),
      gesture === undefined ? words : `${name} to ${figure(thicknessM * 1000)} mm`,
      gesture,
    );
  }

  function pickMaterial(id: string) {
    const material = [...building.materials, ...libraryMaterials].find((one) => one.id === id);
    const name = material?.name ?? id;
    if (picking !== null && typeof picking === 'object') {
      const old = layers[picking.replace];
      const thicknessM = old && 'material' in old ? old.thicknessM : newLayerM;
      const next = { material: id, thicknessM };
      edit(
        layers.map((one, i) => (i === picking.replace ? next : one)),
        `${section.layers[picking.replace]?.name ?? 'Layer'} replaced by ${name}`,
      );
    } else {
      const next = { material: id, thicknessM: newLayerM };
      edit([...layers.slice(0, chosen + 1), next, ...layers.slice(chosen + 1)], `${name} added`);
      setAt(chosen + 1);
    }
  }

  const rooms = building.rooms.filter((room) =>
    room.surfaces.some((surface) => surface.construction === construction.id),
  ).length;
  const areaM2 = explained.uses.reduce((sum, one) => sum + one.areaM2, 0);

  return (
    <>
      <div className="sheet-head">
        <h1 className="unseen">{construction.name}</h1>
        <TextCell
          label="Name of the construction"
          className="is-title"
          value={construction.name}
          onCommit={(name) => app.edit(constructionEdit(own, 'name', name, `Named ${name}`))}
        />
        <span className="quiet">
          {areaM2 > 0
            ? `${figure(areaM2)} m² in ${rooms === 1 ? '1 room' : `${rooms} rooms`}`
            : 'not used yet'}
        </span>
        <span className="sheet-acts">
          <button type="button" className="button" onClick={() => setPicking('material')}>
            Add layer
          </button>
          <button type="button" className="button" onClick={() => setPicking('swap')}>
            Swap for…
          </button>
          <button
            type="button"
            className="button"
            onClick={() => {
              const { edit: copied, id } = copyEdit(own);
              app.edit(copied);
              app.choose('fabric', `construction:${id}`);
            }}
          >
            Copy construction
          </button>
        </span>
      </div>
      <ConstructionValues explained={explained} use={use} section={section} />
      <SectionDrawing
        construction={construction}
        building={building}
        section={section}
        chosen={chosen}
        onChoose={setAt}
        onThickness={(thicknessM) =>
          setThickness(chosen, thicknessM, `thickness ${construction.id} ${chosen}`)
        }
        onEnd={() => app.endGesture()}
      />
      <div className="climate-row">
        <span className="note">Drawn for</span>
        <NumberCell
          label="Outside air"
          quantity="temperature"
          hasUnit
          value={climate.outsideC}
          min={-50}
          max={50}
          onCommit={(outsideC) => setClimate({ ...climate, outsideC })}
        />
        <span className="note">outside,</span>
        <NumberCell
          label="Room air"
          quantity="temperature"
          hasUnit
          value={climate.insideC}
          min={0}
          max={40}
          onCommit={(insideC) => setClimate({ ...climate, insideC })}
        />
        <span className="note">and</span>
        <NumberCell
          label="Humidity of the room, share"
          quantity="share"
          value={climate.insideHumidity}
          min={0.05}
          max={1}
          step={0.05}
          onCommit={(insideHumidity) => setClimate({ ...climate, insideHumidity })}
        />
        <span className="note">humidity inside. Steady state, films of ISO 6946.</span>
      </div>
      <LayerTable
        {...own}
        section={section}
        chosen={chosen}
        onChoose={setAt}
        onThickness={setThickness}
        onLayers={edit}
        onReplace={(replace) => setPicking({ replace })}
      />
      {picking === 'swap' && (
        <PickDialog
          label="Construction of the library"
          picks={libraryConstructions.map(({ id, name, kind, typicalUWPerM2K: [low, high] }) => ({
            id,
            name,
            kind,
            aside: low === high ? `U ${low}` : `U ${low} to ${high}`,
          }))}
          onPick={(id) => {
            const swap = swapEdit(own, id);
            if (swap) app.edit(swap);
          }}
          onClose={() => setPicking(null)}
        />
      )}
      {picking !== null && picking !== 'swap' && (
        <PickDialog
          label="Material of the layer"
          picks={materialPicks(building)}
          onPick={pickMaterial}
          onClose={() => setPicking(null)}
        />
      )}
    </>
  );
}

function materialPicks(building: Building) {
  const own = new Set(building.materials.map(({ id }) => id));
  const row = (kind: string) => (material: Building['materials'][number]) => ({
    id: material.id,
    name: material.name,
    kind,
    aside: `λ ${material.conductivityWPerMK}`,
  });
  return [
    ...building.materials.map(row('project')),
    ...libraryMaterials.filter(({ id }) => !own.has(id)).map(row('library')),
  ];
}

/** The layer that people most often want to change. */
function thickestInsulation(building: Building, { layers }: ConstructionForm): number {
  let best = 0;
  let most = 0;
  layers.forEach((layer, i) => {
    if (!('material' in layer)) return;
    const material = building.materials.find(({ id }) => id === layer.material);
    const resistance = layer.thicknessM / (material?.conductivityWPerMK ?? 1);
    if (resistance <= most) return;
    best = i;
    most = resistance;
  });
  return best;
}
