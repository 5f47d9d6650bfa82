import type { ReactNode } from 'react';

interface RowProps {
  readonly label: string;
  readonly aside?: string;
  readonly isOn: boolean;
  readonly isChild?: boolean;
  readonly isOff?: boolean;
  readonly onGo: () => void;
}

export function Row({ label, aside, isOn, isChild, isOff, onGo }: RowProps) {
  return (
    <li>
      <button
        type="button"
        className={isChild ? 'child' : ''}
        aria-current={isOn ? 'page' : undefined}
        disabled={isOff}
        onClick={onGo}
      >
        <span>{label}</span>
        {aside && <i>{aside}</i>}
      </button>
    </li>
  );
}

export function Group({ title, children }: { title: string; children: ReactNode }) {
  return (
    <>
      <h2>{title}</h2>
      <ul>{children}</ul>
    </>
  );
}
