// Openings, glazings and coverings: references that lead nowhere, and values that cannot be.
import type { Fault } from '../../weather/index.ts';
import { windowParts } from '../physics/index.ts';
import { nearest } from './check-references.ts';
import { glazingOf } from './find.ts';
import type { Building } from './schema-project.ts';
import type { Opening } from './schema-room.ts';
import type { Covering, CoveringControl, Frame } from './schema-window.ts';

type Add = (path: string, found: string, expected: string, mend: string) => void;

const collect = (file: string) => {
  const faults: Fault[] = [];
  const add: Add = (path, found, expected, mend) =>
    faults.push({ file, place: { path }, found, expected, mend });
  return { faults, add };
};

function forOpenings(
  building: Building,
  visit: (opening: Opening, path: string, room: Building['rooms'][number]) => void,
): void {
  building.rooms.forEach((room, i) => {
    room.surfaces.forEach((surface, j) => {
      surface.openings.forEach((opening, k) => {
        visit(opening, `rooms[${i}].surfaces[${j}].openings[${k}]`, room);
      });
    });
  });
}

/** Coverings and schedules that openings name and the file does not hold. */
export function windowReferenceFaults(building: Building, file: string): Fault[] {
  const { faults, add } = collect(file);
  const { coverings } = building;
  coverings.forEach((one, i) => {
    const first = coverings.findIndex((other) => other.id === one.id);
    if (first < i)
      add(
        `coverings[${i}].id`,
        `"${one.id}"`,
        'an id used once',
        `It is also the id of coverings[${first}]; rename one of them.`,
      );
  });
  const schedules = new Set(building.schedules.map((one) => one.id));
  const refer = (id: string, known: ReadonlySet<string>, what: string, path: string) => {
    if (known.has(id)) return;
    const near = nearest(id, known);
    const hint = near ? `Did you mean "${near}"?` : 'Define it, or correct the name.';
    add(path, `"${id}"`, `the id of a ${what} in this file`, hint);
  };
  const ofKind = (kind: Covering['kind']) =>
    new Set(coverings.filter((one) => one.kind === kind).map((one) => one.id));
  forOpenings(building, ({ blind, nightInsulation }, path) => {
    for (const [what, field, held] of [
      ['blind', 'blind', blind],
      ['shutter', 'nightInsulation', nightInsulation],
    ] as const) {
      if (!held) continue;
      refer(held.covering, ofKind(what), `covering of kind "${what}"`, `${path}.${field}.covering`);
      const { schedule } = held.control;
      if (schedule !== undefined)
        refer(schedule, schedules, 'schedule', `${path}.${field}.control.schedule`);
    }
  });
  return faults;
}

/** Everything at windows that physics does not allow. References must be sound already. */
export function windowFaults(building: Building, file: string): Fault[] {
  const { faults, add } = collect(file);
  building.glazings.forEach((glazing, i) => {
    if (glazing.kind === 'simple') simpleFaults(glazing, `glazings[${i}]`, add);
    else
      glazing.panes.forEach((pane, j) => {
        if (pane.frontSolarReflectance !== undefined || pane.backSolarReflectance !== undefined)
          return;
        const face = ((pane.refractiveIndex - 1) / (pane.refractiveIndex + 1)) ** 2;
        const most = (1 - face) / (1 + face);
        if (pane.solarTransmittance > most)
          add(
            `glazings[${i}].panes[${j}].solarTransmittance`,
            `${pane.solarTransmittance}`,
            `at most ${most.toFixed(3)}, glass of index ${pane.refractiveIndex} that absorbs nothing`,
            'Its two faces reflect the rest. Correct the value, or give the reflectances of a treated pane.',
          );
      });
  });
  building.coverings.forEach((covering, i) => {
    coveringFaults(covering, `coverings[${i}]`, add);
  });
  forOpenings(building, (opening, path) => {
    if (opening.frame) frameFaults(opening, opening.frame, `${path}.frame`, add);
    const { blind, nightInsulation } = opening;
    if (blind) controlFaults(blind.control, `${path}.blind.control`, add);
    if (nightInsulation)
      controlFaults(nightInsulation.control, `${path}.nightInsulation.control`, add);
    if (blind?.position === 'between') {
      const glazing = glazingOf(building, opening.glazing);
      const gaps = glazing.kind === 'panes' ? glazing.gaps.length : 0;
      if (blind.gap >= gaps)
        add(
          `${path}.blind.gap`,
          gaps === 0 ? `a blind between panes in glazing "${glazing.id}"` : `${blind.gap}`,
          gaps === 0 ? 'a glazing given by two panes or more' : `0 to ${gaps - 1}`,
          'Choose a gap that the glazing has, or another position.',
        );
    }
    if (blind && nightInsulation && blind.position === nightInsulation.position)
      add(
        `${path}.nightInsulation.position`,
        `"${nightInsulation.position}", where the blind hangs too`,
        'one covering on each side of the glass',
        'Move one of them to the other side.',
      );
  });
  return faults;
}

/** Films of EN 673 alone: no glazing can pass more heat. */
const filmsM2KPerW = 1 / 25 + 1 / 7.7;
/** Bare glass reflects some 8 %. */
const mostG = 0.92;

function simpleFaults(
  glazing: Extract<Building['glazings'][number], { kind: 'simple' }>,
  path: string,
  add: Add,
) {
  if (glazing.uValueWPerM2K * filmsM2KPerW >= 1)
    add(
      `${path}.uValueWPerM2K`,
      `${glazing.uValueWPerM2K}`,
      `less than ${(1 / filmsM2KPerW).toFixed(2)} W/(m²·K), the films alone`,
      'Even without glass no more heat would pass; correct the value.',
    );
  if (glazing.gValue > mostG)
    add(
      `${path}.gValue`,
      `${glazing.gValue}`,
      `at most ${mostG}`,
      'Bare glass throws back some 8 %; correct the value.',
    );
}

function coveringFaults(covering: Covering, path: string, add: Add) {
  if (covering.kind !== 'blind') return;
  const { solarTransmittance: tau, openness } = covering;
  if (openness > tau)
    add(
      `${path}.openness`,
      `${openness}`,
      `at most solarTransmittance, ${tau}`,
      'The holes are part of what the blind lets through.',
    );
  for (const side of ['solarReflectance', 'backSolarReflectance'] as const) {
    const rho = covering[side];
    if (rho !== undefined && tau + rho > 1)
      add(
        path,
        `solarTransmittance ${tau} and ${side} ${rho}`,
        'a sum of at most 1',
        'What is let through and what is thrown back cannot exceed what comes in.',
      );
  }
}

function controlFaults(control: CoveringControl, path: string, add: Add) {
  const { sunAboveWPerM2: above, sunBelowWPerM2: below } = control;
  if (below !== undefined && (above === undefined || below > above))
    add(
      `${path}.sunBelowWPerM2`,
      `${below}`,
      above === undefined ? 'sunAboveWPerM2 beside it' : `at most sunAboveWPerM2, ${above}`,
      'It is drawn above the one and goes up again below the other.',
    );
}

/** Films of ISO 6946 at a frame. */
const frameFilmsM2KPerW = 0.13 + 0.04;

function frameFaults(opening: Opening, frame: Frame, path: string, add: Add) {
  const { rectangle, areaM2 } = opening;
  if ((frame.share === undefined) === (frame.widthM === undefined))
    return add(
      path,
      frame.share === undefined ? 'neither share nor widthM' : 'both share and widthM',
      'exactly one of share and widthM',
      'Give the frame by its share of the opening or by its visible width.',
    );
  let frameM2 = (frame.share ?? 0) * areaM2;
  if (frame.widthM !== undefined) {
    if (!rectangle)
      return add(
        `${path}.widthM`,
        'a frame by width in an opening without rectangle',
        'the opening’s rectangle, or share in place of widthM',
        'Add the rectangle or give the frame’s share.',
      );
    const spare = Math.min(
      rectangle.widthM - (frame.panes + 1) * frame.widthM,
      rectangle.heightM - 2 * frame.widthM,
    );
    if (!(spare > 0))
      return add(
        `${path}.widthM`,
        `${frame.widthM} m with ${frame.panes} panes in ${rectangle.widthM} m × ${rectangle.heightM} m`,
        'a frame that leaves glass',
        'Correct the width, the number of panes or the rectangle.',
      );
    frameM2 = windowParts(
      rectangle.widthM,
      rectangle.heightM,
      frame.widthM,
      frame.panes,
    ).frameAreaM2;
  }
  if (frame.uValueWPerM2K * frameFilmsM2KPerW >= 1 && frameM2 > 0)
    add(
      `${path}.uValueWPerM2K`,
      `${frame.uValueWPerM2K}`,
      `less than ${(1 / frameFilmsM2KPerW).toFixed(2)} W/(m²·K), the films alone (ISO 6946)`,
      'No frame of this visible area passes more heat; correct the value.',
    );
}
