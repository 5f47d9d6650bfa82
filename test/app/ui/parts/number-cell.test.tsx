import { cleanup, render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { NumberCell } from '../../../../app/ui/parts/number-cell.tsx';
import { AppContext, type AppState, createApp } from '../../../../app/ui/state/index.ts';

afterEach(cleanup);

function open(start: Partial<AppState> = {}, value = 0.06) {
  const onCommit = vi.fn();
  const desk = {
    openProject: async () => null,
    openWeather: async () => null,
    recent: async () => [],
    openRecent: async () => null,
    demo: async () => null,
  };
  const app = createApp(desk, async () => ({ ok: false, faults: [] }), start);
  render(
    <AppContext value={app}>
      <NumberCell
        label="Board"
        quantity="thickness"
        value={value}
        min={0.001}
        max={1}
        onCommit={onCommit}
      />
    </AppContext>,
  );
  const field = screen.getByRole('textbox', { name: /^Board/ }) as HTMLInputElement;
  return { field, onCommit, user: userEvent.setup() };
}

test('what is typed with a unit is said in the unit shown, and Enter hands up SI', async () => {
  const { field, onCommit, user } = open();
  expect(field.value).toBe('60');
  await user.clear(field);
  await user.type(field, '12 in');
  expect(screen.getByText('= 304.8 mm')).toBeTruthy();
  expect(onCommit).not.toHaveBeenCalled();
  await user.keyboard('{Enter}');
  expect(onCommit).toHaveBeenCalledExactlyOnceWith(expect.closeTo(0.3048, 12));
});

test('a wrong draft stays, with the reason, and is not handed up; Escape puts the old one back', async () => {
  const { field, onCommit, user } = open();
  await user.clear(field);
  await user.type(field, '5 m{Enter}');
  expect(field.getAttribute('aria-invalid')).toBe('true');
  expect(screen.getByText('1 to 1000 mm')).toBeTruthy();
  expect(field.value).toBe('5 m');
  await user.keyboard('{Escape}');
  expect(field.value).toBe('60');
  expect(onCommit).not.toHaveBeenCalled();
});

test('arrows step in the unit shown, with Shift by ten', async () => {
  const { field, onCommit, user } = open();
  field.focus();
  await user.keyboard('{ArrowUp}{Shift>}{ArrowDown}{/Shift}');
  expect(onCommit.mock.calls).toEqual([[0.061], [0.05]]);
});

test('in inch-pound the field shows and takes inches, and still hands up metres', async () => {
  const { field, onCommit, user } = open({ units: 'IP' }, 0.0254);
  expect(field.value).toBe('1');
  await user.clear(field);
  await user.type(field, '2{Enter}');
  expect(onCommit).toHaveBeenCalledExactlyOnceWith(expect.closeTo(0.0508, 12));
});
