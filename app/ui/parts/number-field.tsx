import { type ReactNode, useId } from 'react';
import { figure } from '../format/index.ts';

export interface NumberFieldProps {
  readonly label: string;
  readonly unit: string;
  readonly min: number;
  readonly max: number;
  /** What is typed, as typed. */
  readonly draft: string;
  readonly onDraft: (draft: string) => void;
  readonly note?: ReactNode;
}

/** A decimal comma and an exponent are understood; an empty or wrong draft is NaN. */
export function typedNumber(draft: string, min: number, max: number): number {
  const text = draft.trim().replace(',', '.').replace('\u2212', '-');
  const value = text === '' ? NaN : Number(text);
  return value >= min && value <= max ? value : NaN;
}

/** A number with its unit; a wrong draft stays, with the reason. */
export function NumberField(props: NumberFieldProps) {
  const { label, unit, min, max, draft, onDraft, note } = props;
  const id = useId();
  const isWrong = draft.trim() !== '' && Number.isNaN(typedNumber(draft, min, max));
  return (
    <div className="field">
      <label htmlFor={id}>{label}</label>
      <input
        id={id}
        inputMode="decimal"
        value={draft}
        aria-invalid={isWrong}
        aria-describedby={`${id}-note`}
        onChange={(event) => onDraft(event.target.value)}
      />
      <span className="unit">{unit}</span>
      <span id={`${id}-note`} className={isWrong ? 'field-wrong' : 'note'}>
        {isWrong ? `Enter ${figure(min)} to ${figure(max)} ${unit}` : note}
      </span>
    </div>
  );
}
