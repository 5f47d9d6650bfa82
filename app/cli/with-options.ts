// A project with some of its options made.

import { optionBuilding } from '../../engine/index.ts';
import type { OpenProject } from './inputs.ts';
import { need, WrongUsage } from './stop.ts';
import { openStudy } from './study-inputs.ts';

/** @param named ids or names of options, parted by commas; null for the base */
export async function withOptions(
  base: OpenProject,
  named: string | null,
): Promise<{ readonly project: OpenProject; readonly notes: readonly string[] }> {
  if (named === null) return { project: base, notes: [] };
  const { file, document } = await openStudy('simulate', base.file);
  const { options } = base.building;
  const chosen = named.split(',').map((part) => {
    const name = part.trim();
    const option = options.find((one) => one.id === name || one.name === name);
    if (option) return option;
    const known = options.map((one) => one.id).join(', ');
    throw new WrongUsage(
      `simulate: --option: found "${name}", expected ${known === '' ? 'none: the project holds no options' : `one of ${known}`}.`,
    );
  });
  const { building } = need(optionBuilding(document, chosen, file));
  const names = chosen.map((one) => one.name).join(' + ');
  return { project: { file, building }, notes: [`With the option: ${names}.`] };
}
