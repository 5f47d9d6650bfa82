// A native dialog that opens with its component and tells when it was closed.

import { type ReactNode, useEffect, useRef } from 'react';

export interface SheetDialogProps {
  readonly label: string;
  readonly className?: string;
  readonly onClose: () => void;
  readonly children: ReactNode;
}

export function SheetDialog({ label, className = '', onClose, children }: SheetDialogProps) {
  const ref = useRef<HTMLDialogElement>(null);
  useEffect(() => {
    const dialog = ref.current;
    const before = document.activeElement;
    if (dialog && !dialog.open) dialog.showModal();
    return () => {
      if (before instanceof HTMLElement && before.isConnected) before.focus();
    };
  }, []);
  return (
    <dialog
      ref={ref}
      aria-label={label}
      className={className}
      onClose={onClose}
      onKeyDown={(event) => {
        // At once: the close event of the browser comes a moment later, when the next key may be down.
        if (event.key !== 'Escape') return;
        event.preventDefault();
        event.stopPropagation();
        onClose();
      }}
      onClick={(event) => event.target === ref.current && onClose()}
    >
      <div className="dialog-body">{children}</div>
    </dialog>
  );
}
