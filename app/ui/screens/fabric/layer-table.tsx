// The layers as a table: every figure can be typed, rows move with Alt and an arrow.

import type { KeyboardEvent } from 'react';
import type { ConstructionSection } from '../../../../engine/index.ts';
import { type FabricAt, type LayerForm, materialEdit } from '../../../project/index.ts';
import { figure, type QuantityName, shownUnit } from '../../format/index.ts';
import { NumberCell } from '../../parts/number-cell.tsx';
import { useApp, useAppState } from '../../state/index.ts';

export interface LayerTableProps extends FabricAt {
  readonly section: ConstructionSection;
  readonly chosen: number;
  readonly onChoose: (index: number) => void;
  readonly onThickness: (index: number, thicknessM: number) => void;
  readonly onLayers: (layers: readonly LayerForm[], name: string) => void;
  readonly onReplace: (index: number) => void;
}

const fields = [
  ['conductivityWPerMK', 'Conductivity', 'conductivity', 1e-4, 500, 0.01],
  ['densityKgPerM3', 'Density', 'density', 0.1, 25_000, 10],
  ['specificHeatJPerKgK', 'Heat capacity', 'specificHeat', 1, 20_000, 10],
  ['vapourResistanceFactor', 'Vapour factor', 'number', 1, 1e7, 1],
] as const satisfies readonly (readonly [string, string, QuantityName, number, number, number])[];

export function LayerTable(props: LayerTableProps) {
  const { construction, section, chosen, onChoose, onLayers } = props;
  const system = useAppState((state) => state.units);
  const { layers } = construction;
  const inner = section.layers.reduce((sum, layer) => sum + layer.resistanceM2KPerW, 0);
  const whole = inner + section.insideFilmM2KPerW + section.outsideFilmM2KPerW;
  const unit = (name: QuantityName) => shownUnit(name, system).unit;
  const resistance = (value: number) => {
    const { size, decimals } = shownUnit('resistance', system);
    return figure(value / size, decimals);
  };

  function move(index: number, step: number) {
    const to = index + step;
    if (to < 0 || to >= layers.length) return;
    const next = [...layers];
    [next[index], next[to]] = [layers[to], layers[index]];
    onLayers(next, `${section.layers[index]?.name ?? 'Layer'} moved ${step < 0 ? 'out' : 'in'}`);
    onChoose(to);
  }

  function press(event: KeyboardEvent, index: number) {
    const step = { ArrowUp: -1, ArrowDown: 1 }[event.key];
    if (!event.altKey || step === undefined) return;
    event.preventDefault();
    move(index, step);
  }

  const share = (value: number) => (
    <td className="share">
      <svg width="104" height="8" aria-hidden="true">
        <rect width={Math.max(1, (104 * value) / whole)} height="8" />
      </svg>
    </td>
  );
  const film = (name: string, value: number) => (
    <tr className="film">
      <th scope="row">{name}</th>
      <td colSpan={5} />
      <td className="number">{resistance(value)}</td>
      {share(value)}
      <td />
    </tr>
  );

  return (
    <table className="layers" aria-label="Layers, outside to inside">
      <thead>
        <tr>
          <th scope="col">Layer, outside to inside</th>
          <th scope="col">Thickness {unit('thickness')}</th>
          {fields.map(([, name, quantity]) => (
            <th key={name} scope="col">
              {name} {name === 'Vapour factor' ? 'µ' : unit(quantity)}
            </th>
          ))}
          <th scope="col">Resistance {unit('resistance')}</th>
          <th scope="col">Share of resistance</th>
          <th scope="col">
            <span className="unseen">Acts</span>
          </th>
        </tr>
      </thead>
      <tbody>
        {section.outsideFilmM2KPerW > 0 && film('Film, outside', section.outsideFilmM2KPerW)}
        {layers.map((layer, i) => (
          <LayerRow
            // Layers have no ids: a row is its place.
            // biome-ignore lint/suspicious/noArrayIndexKey: see above
            key={i}
            {...props}
            layer={layer}
            index={i}
            isChosen={i === chosen}
            resistance={resistance(section.layers[i]?.resistanceM2KPerW ?? NaN)}
            share={share(section.layers[i]?.resistanceM2KPerW ?? 0)}
            onPress={press}
            onMove={move}
          />
        ))}
        {film('Film, inside', section.insideFilmM2KPerW)}
      </tbody>
      <tfoot>
        <tr>
          <th scope="row">Whole, air to air</th>
          <td className="number">
            {figure(
              section.layers.reduce((sum, layer) => sum + layer.thicknessM, 0) /
                shownUnit('thickness', system).size,
              shownUnit('thickness', system).decimals,
            )}
          </td>
          <td colSpan={4} />
          <td className="number">{resistance(whole)}</td>
          <td colSpan={2} />
        </tr>
      </tfoot>
    </table>
  );
}

interface LayerRowProps extends LayerTableProps {
  readonly layer: LayerForm;
  readonly index: number;
  readonly isChosen: boolean;
  readonly resistance: string;
  readonly share: React.ReactNode;
  readonly onPress: (event: KeyboardEvent, index: number) => void;
  readonly onMove: (index: number, step: number) => void;
}

function LayerRow(props: LayerRowProps) {
  const { form, building, construction, section, layer, index, isChosen } = props;
  const app = useApp();
  const name = section.layers[index]?.name ?? 'Layer';
  const at = (form.constructions ?? []).findIndex(({ id }) => id === construction.id);
  const path = `constructions[${at}].layers[${index}]`;
  const material =
    'material' in layer ? building.materials.find(({ id }) => id === layer.material) : undefined;
  const { length } = construction.layers;
  return (
    <tr
      className={isChosen ? 'is-chosen' : ''}
      onFocus={() => props.onChoose(index)}
      onKeyDown={(event) => props.onPress(event, index)}
    >
      <th scope="row">
        <button
          type="button"
          className="row-name"
          aria-pressed={isChosen}
          title="Alt and an arrow move the layer"
          onClick={() => props.onChoose(index)}
        >
          {name}
        </button>
      </th>
      <td className="number">
        {'material' in layer && (
          <NumberCell
            label={`${name}, thickness`}
            quantity="thickness"
            path={`${path}.thicknessM`}
            value={layer.thicknessM}
            min={0.0001}
            max={10}
            step={5}
            onCommit={(value) => props.onThickness(index, value)}
          />
        )}
      </td>
      {fields.map(([field, label, quantity, min, max, step]) => (
        <td key={field} className="number">
          {material && (
            <NumberCell
              label={`${name}, ${label.toLowerCase()}`}
              quantity={quantity}
              path={`materials[${(form.materials ?? []).findIndex(({ id }) => id === material.id)}].${field}`}
              value={material[field]}
              min={min}
              max={max}
              step={step}
              help={material.source ?? 'own value'}
              onCommit={(value) =>
                app.edit(
                  materialEdit(
                    { form, building, construction },
                    material.id,
                    field,
                    value,
                    `${name}, ${label.toLowerCase()}`,
                  ),
                )
              }
            />
          )}
        </td>
      ))}
      <td className="number">
        {'material' in layer ? (
          props.resistance
        ) : (
          <NumberCell
            label={`${name}, resistance`}
            quantity="resistance"
            path={`${path}.resistanceM2KPerW`}
            value={layer.resistanceM2KPerW}
            min={0.001}
            max={200}
            step={0.05}
            onCommit={(resistanceM2KPerW) =>
              props.onLayers(
                construction.layers.map((one, i) =>
                  i === index ? { ...layer, resistanceM2KPerW } : one,
                ),
                `${name}, resistance`,
              )
            }
          />
        )}
      </td>
      {props.share}
      <td className="row-acts">
        <button type="button" className="text-button" onClick={() => props.onReplace(index)}>
          Replace<span className="unseen"> {name}</span>
        </button>
        <button
          type="button"
          className="text-button"
          disabled={index === 0}
          onClick={() => props.onMove(index, -1)}
        >
          Out<span className="unseen">ward: {name}</span>
        </button>
        <button
          type="button"
          className="text-button"
          disabled={index === length - 1}
          onClick={() => props.onMove(index, 1)}
        >
          In<span className="unseen">ward: {name}</span>
        </button>
        <button
          type="button"
          className="text-button"
          disabled={length === 1}
          onClick={() =>
            props.onLayers(
              construction.layers.filter((_, i) => i !== index),
              `${name} removed`,
            )
          }
        >
          Remove<span className="unseen"> {name}</span>
        </button>
      </td>
    </tr>
  );
}
