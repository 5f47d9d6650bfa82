import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { ink } from '../../../app/report/ink.ts';

test('the report is printed in the window’s light colours', () => {
  const css = readFileSync('app/ui/look/tokens.css', 'utf8');
  const light = css.slice(0, css.indexOf('[data-scheme'));
  const token = (name: string) =>
    new RegExp(`--${name}:\\s*(#[0-9a-fA-F]{6})`).exec(light)?.[1]?.toLowerCase();
  expect(Object.fromEntries(Object.keys(ink).map((name) => [name, token(name)]))).toEqual(ink);
});
