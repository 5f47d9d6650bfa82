import { useId, useState } from 'react';

export interface DayCellProps {
  readonly label: string;
  /** `MM-DD`. */
  readonly value: string;
  readonly onCommit: (value: string) => void;
}

const months = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];
const lengths = [31, 29, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

/** `14 Jul` → `07-14`; null where it is no day. */
export function typedDay(text: string): string | null {
  const found =
    /^(\d{1,2})\.?\s*([a-z]{3})[a-z]*$/i.exec(text.trim()) ??
    /^(\d{1,2})\.(\d{1,2})\.?$/.exec(text.trim());
  const swapped = /^(\d{2})-(\d{2})$/.exec(text.trim());
  const day = Number(swapped?.[2] ?? found?.[1] ?? NaN);
  const word = swapped?.[1] ?? found?.[2] ?? '';
  const month = /^\d+$/.test(word) ? Number(word) : months.indexOf(word.toLowerCase()) + 1;
  if (!(month >= 1 && month <= 12 && day >= 1 && day <= (lengths[month - 1] ?? 0))) return null;
  return `${String(month).padStart(2, '0')}-${String(day).padStart(2, '0')}`;
}

export function dayWords(value: string): string {
  const [month = '', day = ''] = value.split('-');
  const name = months[Number(month) - 1] ?? '';
  return `${Number(day)} ${name.charAt(0).toUpperCase()}${name.slice(1)}`;
}

/** A day of the year. */
export function DayCell({ label, value, onCommit }: DayCellProps) {
  const id = useId();
  const [draft, setDraft] = useState<string | null>(null);
  const typed = draft === null ? value : typedDay(draft);
  function commit() {
    if (typed === null) return;
    setDraft(null);
    if (typed !== value) onCommit(typed);
  }
  return (
    <span className="cell">
      <input
        aria-label={label}
        aria-invalid={typed === null}
        aria-describedby={`${id}-say`}
        value={draft ?? dayWords(value)}
        onChange={(event) => setDraft(event.target.value)}
        onBlur={commit}
        onKeyDown={(event) => {
          if (event.key === 'Enter') commit();
          if (event.key === 'Escape') setDraft(null);
        }}
      />
      <span id={`${id}-say`} className="cell-say is-wrong">
        {typed === null && 'A day such as 14 Jul'}
      </span>
    </span>
  );
}
