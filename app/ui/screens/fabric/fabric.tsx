// Constructions and glazings: the one that is chosen in the side bar, or the first.

import { useAppState, useEditedProject } from '../../state/index.ts';
import { ConstructionSheet } from './construction-sheet.tsx';
import { GlazingSheet } from './glazing-sheet.tsx';

export function Fabric() {
  const project = useEditedProject();
  const chosen = useAppState((state) => state.chosen.fabric);
  if (!project) return null;
  const { building } = project;
  const glazing = building.glazings.find(({ id }) => chosen === `glazing:${id}`);
  if (glazing) return <GlazingSheet key={glazing.id} {...project} glazing={glazing} />;
  const construction =
    building.constructions.find(({ id }) => chosen === `construction:${id}`) ??
    building.constructions[0];
  if (!construction) return <p className="quiet">The project has no constructions yet.</p>;
  return <ConstructionSheet key={construction.id} {...project} construction={construction} />;
}
