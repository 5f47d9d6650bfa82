// A number in a table or beside a label: sums, decimal commas and units are understood, Enter takes it,
// Escape puts the old one back, arrows step. A wrong draft stays, with the reason under it.

import { type KeyboardEvent, useId, useState } from 'react';
import {
  type QuantityName,
  shownQuantities,
  shownUnit,
  shownValue,
  typedQuantity,
  type UnitSystem,
} from '../format/index.ts';
import { useAppState } from '../state/index.ts';

export interface NumberCellProps {
  readonly label: string;
  readonly quantity: QuantityName;
  /** In SI; undefined where nothing is given. */
  readonly value: number | undefined;
  /** In SI, both included. */
  readonly min: number;
  readonly max: number;
  readonly onCommit: (value: number) => void;
  /** The field may be emptied: the default holds then. */
  readonly onEmpty?: () => void;
  /** What arrow keys add, in the unit shown; left out: 1. */
  readonly step?: number;
  /** What it means, what is usual, where that comes from. */
  readonly help?: string;
  readonly hasUnit?: boolean;
  /** Where a jump from a problem leads. */
  readonly path?: string;
}

/** What a draft comes to, or why it comes to nothing. */
function readDraft(draft: string, props: NumberCellProps, system: UnitSystem) {
  const { quantity, min, max } = props;
  const { size, unit } = shownUnit(quantity, system);
  const { dimension } = shownQuantities[quantity];
  let typed = typedQuantity(draft, dimension, size);
  if (typed.ok && !typed.hasUnit && quantity === 'temperature' && system === 'IP') {
    typed = typedQuantity(`(${draft}) F`, dimension);
  }
  if (!typed.ok) return typed;
  // A limit typed as shown must pass in spite of the rounding of its unit.
  const slack = 1e-9 * Math.max(1, Math.abs(typed.value));
  if (typed.value < min - slack || typed.value > max + slack) {
    const limit = (value: number) => shownValue(value, quantity, system);
    return { ok: false as const, why: `${limit(min)} to ${limit(max)} ${unit}`.trim() };
  }
  return typed;
}

export function NumberCell(props: NumberCellProps) {
  const { label, quantity, value, onCommit, onEmpty, step = 1, help, hasUnit, path } = props;
  const id = useId();
  const system = useAppState((state) => state.units);
  const [draft, setDraft] = useState<string | null>(null); // null: not being edited
  const { unit, size } = shownUnit(quantity, system);
  const text = value === undefined ? '' : shownValue(value, quantity, system);
  const isEmptied = draft !== null && draft.trim() === '';
  const read = draft === null || isEmptied ? null : readDraft(draft, props, system);
  const isWrong = isEmptied ? !onEmpty && text !== '' : read?.ok === false;
  const isSum = read?.ok && /[^\d.,\s−-]/.test(draft ?? '');

  function commit() {
    if (draft === null) return;
    if (draft === text) return setDraft(null);
    if (isEmptied) {
      if (onEmpty) onEmpty();
      return setDraft(null);
    }
    if (!read?.ok) return;
    setDraft(null);
    if (read.value !== value) onCommit(read.value);
  }

  function press(event: KeyboardEvent) {
    if (event.key === 'Enter') {
      event.preventDefault();
      commit();
    } else if (event.key === 'Escape' && draft !== null) {
      event.stopPropagation();
      setDraft(null);
    } else if (draft !== null && (event.ctrlKey || event.metaKey) && event.key === 'z') {
      event.stopPropagation(); // the field's own undo, while something is typed
    } else if ((event.key === 'ArrowUp' || event.key === 'ArrowDown') && value !== undefined) {
      event.preventDefault();
      const sign = event.key === 'ArrowUp' ? 1 : -1;
      const many = event.shiftKey ? 10 : 1;
      const next = Number((value + sign * many * step * size).toPrecision(12));
      if (next >= props.min && next <= props.max) onCommit(next);
    }
  }

  return (
    <span className={hasUnit ? 'cell has-unit' : 'cell'}>
      <input
        inputMode="decimal"
        autoComplete="off"
        aria-label={unit === '' ? label : `${label}, ${unit}`}
        aria-invalid={isWrong}
        aria-describedby={`${id}-say`}
        title={help}
        data-path={path}
        value={draft ?? text}
        onFocus={(event) => event.target.select()}
        onChange={(event) => setDraft(event.target.value)}
        onBlur={commit}
        onKeyDown={press}
      />
      {hasUnit && unit !== '' && <span className="unit">{unit}</span>}
      <span id={`${id}-say`} className={isWrong ? 'cell-say is-wrong' : 'cell-say'}>
        {isWrong && (isEmptied ? 'Type a number' : read?.ok === false && read.why)}
        {isSum && read.ok && `= ${shownValue(read.value, quantity, system)} ${unit}`}
      </span>
    </span>
  );
}
