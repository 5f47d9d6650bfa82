// The parts of the building in the side bar; the children of the part that is shown stand below it.

import { figure } from '../format/index.ts';
import { explainedOf, type Screen, useApp, useAppState, useEditedProject } from '../state/index.ts';
import { Row } from './side-row.tsx';

interface Child {
  readonly id: string;
  readonly label: string;
  readonly aside?: string;
}

export function BuildingRows() {
  const app = useApp();
  const project = useEditedProject();
  const screen = useAppState((state) => state.screen);
  const chosen = useAppState((state) => state.chosen);
  if (!project) return null;
  const { form, building } = project;
  const explained = explainedOf(building);
  const largest = (id: string) => {
    const uses = explained.constructions.find((one) => one.id === id)?.uses ?? [];
    return uses.reduce((a, b) => (b.areaM2 > a.areaM2 ? b : a), uses[0])?.uValueWPerM2K ?? NaN;
  };
  const fabric: readonly Child[] = [
    ...building.constructions.map(({ id, name }) => ({
      id: `construction:${id}`,
      label: name,
      aside: figure(largest(id), 2),
    })),
    ...explained.glazings.map(({ id, name, uValueWPerM2K }) => ({
      id: `glazing:${id}`,
      label: name,
      aside: figure(uValueWPerM2K, 2),
    })),
  ];
  const rooms = form.rooms.map(({ id, name }) => ({ id, label: name }));
  const use: readonly Child[] = [
    { id: 'gains', label: 'Gains and comfort' },
    ...building.schedules.map(({ id, name }) => ({ id, label: name ?? id.replace(/-/g, ' ') })),
  ];
  const parts: readonly (readonly [Screen, string, readonly Child[], string])[] = [
    ['plan', 'Plan', [], ''],
    ['rooms', 'Rooms', rooms, figure(rooms.length)],
    ['fabric', 'Fabric', fabric, figure(fabric.length)],
    ['use', 'Use', use, figure(building.schedules.length)],
    ['plant', 'Plant', [], ''],
    ['methods', 'Methods', [], ''],
  ];
  return parts.map(([name, label, children, aside]) => {
    const isHere = screen === name;
    const at = chosen[name] ?? children[0]?.id;
    return [
      <Row
        key={name}
        label={label}
        {...(aside === '' ? {} : { aside })}
        isOn={isHere && children.length === 0}
        onGo={() => app.go(name)}
      />,
      ...(isHere
        ? children.map((child) => (
            <Row
              key={`${name} ${child.id}`}
              label={child.label}
              {...(child.aside === undefined ? {} : { aside: child.aside })}
              isChild
              isOn={at === child.id}
              onGo={() => app.choose(name, child.id)}
            />
          ))
        : []),
    ];
  });
}
