import { commands } from '../commands/index.ts';
import { useApp } from '../state/index.ts';
import { SheetDialog } from './sheet-dialog.tsx';

const inDrawings: readonly (readonly [string, string])[] = [
  ['Left, Right', 'An hour back, on'],
  ['Shift+Left, Shift+Right', 'A day back, on'],
  ['Page up, Page down', 'A week back, on'],
  ['Home, End', 'First, last hour'],
  ['Escape', 'Let go of the hour'],
];

const anywhere: readonly (readonly [string, string])[] = [
  ['F6', 'Next region: side bar, sheet, findings'],
  ['Shift+F6', 'Region before'],
  ['Tab', 'Next control'],
];

export function ShortcutList() {
  const app = useApp();
  const close = () => app.set({ dialog: null });
  const ofCommands = commands
    .filter((command) => command.keys)
    .map((command) => [command.keys, command.label.replace('…', '')] as const);
  return (
    <SheetDialog label="Shortcuts" className="shortcuts" onClose={close}>
      <div className="dialog-head">
        <h2>Shortcuts</h2>
        <button type="button" className="button" onClick={close}>
          Close
        </button>
      </div>
      <div className="shortcut-groups">
        <Keys title="Commands" rows={ofCommands} />
        <div>
          <Keys title="In a drawing with time" rows={inDrawings} />
          <Keys title="Anywhere" rows={anywhere} />
        </div>
      </div>
    </SheetDialog>
  );
}

function Keys({ title, rows }: { title: string; rows: readonly (readonly [string, string])[] }) {
  return (
    <table>
      <caption>{title}</caption>
      <tbody>
        {rows.map(([keys, label]) => (
          <tr key={keys}>
            <th scope="row">{label}</th>
            <td>
              <kbd>{keys}</kbd>
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
