import { useState } from 'react';

export interface TextCellProps {
  readonly label: string;
  readonly value: string;
  readonly onCommit: (value: string) => void;
  readonly className?: string;
}

/** A name: Enter or leaving takes it, Escape puts the old one back; it is never empty. */
export function TextCell({ label, value, onCommit, className = '' }: TextCellProps) {
  const [draft, setDraft] = useState<string | null>(null);
  function commit() {
    const typed = draft?.trim() ?? '';
    setDraft(null);
    if (typed !== '' && typed !== value) onCommit(typed);
  }
  return (
    <input
      className={`text-cell ${className}`}
      aria-label={label}
      maxLength={200}
      value={draft ?? value}
      onChange={(event) => setDraft(event.target.value)}
      onBlur={commit}
      onKeyDown={(event) => {
        if (event.key === 'Enter') commit();
        if (event.key === 'Escape') setDraft(null);
        if (draft !== null && event.ctrlKey && event.key === 'z') event.stopPropagation();
      }}
    />
  );
}
