// Cells that edit one field of the document by its path.

import type { Json } from '../../../engine/index.ts';
import { useApp } from '../state/index.ts';
import { Choice, type ChoiceProps } from './choice.tsx';
import { NumberCell, type NumberCellProps } from './number-cell.tsx';

export interface FormCellProps extends Omit<NumberCellProps, 'onCommit' | 'onEmpty' | 'path'> {
  readonly path: string;
  /** The field may be left out. */
  readonly isOptional?: boolean;
}

export function FormCell({ path, isOptional, ...cell }: FormCellProps) {
  const app = useApp();
  const set = (value: number | undefined) =>
    app.edit({ name: cell.label, changes: [{ path, value }] });
  return (
    <NumberCell
      {...cell}
      path={path}
      onCommit={set}
      {...(isOptional ? { onEmpty: () => set(undefined) } : {})}
    />
  );
}

export interface FormChoiceProps<Value extends string>
  extends Omit<ChoiceProps<Value>, 'onChoose' | 'path'> {
  readonly path: string;
  /** What the document gets for a choice; left out: the choice itself. */
  readonly toField?: (value: Value) => Json | undefined;
}

export function FormChoice<Value extends string>(props: FormChoiceProps<Value>) {
  const { path, toField, ...choice } = props;
  const app = useApp();
  return (
    <Choice
      {...choice}
      path={path}
      onChoose={(value) =>
        app.edit({
          name: choice.label,
          changes: [{ path, value: toField ? toField(value) : value }],
        })
      }
    />
  );
}
