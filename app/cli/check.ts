import { type Building, type BuildingExplained, explainBuilding } from '../../engine/index.ts';
import type { Fault } from '../../weather/index.ts';
import type { Command } from './command.ts';
import { explainedText } from './explained-text.ts';
import { openModel, weatherFor } from './inputs.ts';
import { InputFaults } from './stop.ts';

/** What `check --json` prints. */
interface CheckDocument {
  readonly ok: boolean;
  readonly faults: readonly Fault[];
  readonly notes: readonly string[];
  /** Derived values; only where there are no faults. */
  readonly explained?: BuildingExplained;
}

const counted = (count: number, one: string, many = `${one}s`) =>
  `${count} ${count === 1 ? one : many}`;

function contents({ rooms, constructions, glazings, schedules }: Building): string {
  const surfaces = rooms.reduce((sum, room) => sum + room.surfaces.length, 0);
  return [
    counted(rooms.length, 'room'),
    counted(surfaces, 'surface'),
    counted(constructions.length, 'construction'),
    counted(glazings.length, 'glazing'),
    counted(schedules.length, 'schedule'),
  ].join(', ');
}

/** What was found, good or bad; the weather is looked at only where the project itself is sound. */
async function look(file: string) {
  try {
    const project = await openModel(file);
    if ('model' in project) {
      const { name, nodes, links } = project.model;
      const lines = [
        `${name}: ${counted(nodes.length, 'node')}, ${counted(links.length, 'link')}.`,
      ];
      return { faults: [], notes: [], lines, explained: null };
    }
    const explained = explainBuilding(project.building);
    const lines = [`${project.building.name}: ${contents(project.building)}.`];
    if (!project.building.weather) {
      const notes = ['The project names no weather table yet.'];
      return { faults: [], notes, lines, explained };
    }
    const weather = await weatherFor(project, null);
    const { site, form, hours, notes } = weather.year;
    lines.push(`Weather: ${site.name} (${form}), ${hours} hours.`);
    const said = [...weather.notes, ...notes.map((note) => note.text)];
    return { faults: [], notes: said, lines, explained };
  } catch (error) {
    if (!(error instanceof InputFaults)) throw error;
    return { faults: error.faults, notes: [], lines: [], explained: null };
  }
}

export const checkCommand: Command = {
  name: 'check',
  operand: 'PROJECT',
  summary:
    'Looks for everything wrong in a project and its weather, and explains constructions, glazings and windows.',
  options: { json: { help: 'one JSON document on standard output' } },
  examples: ['inglenook check house.inglenook.json', 'inglenook check house.inglenook.json --json'],
  async run(operand, given, terminal) {
    const { faults, notes, lines, explained } = await look(operand);
    if (given.json) {
      const document: CheckDocument = {
        ok: faults.length === 0,
        faults,
        notes,
        ...(explained ? { explained } : {}),
      };
      terminal.print(JSON.stringify(document, null, 2));
      if (faults.length > 0) throw new InputFaults([]); // told on standard output already
      return;
    }
    if (faults.length > 0) throw new InputFaults(faults);
    const head = [...lines, ...notes.map((note) => `Note: ${note}`), 'No faults.'].join('\n');
    terminal.print(explained ? `${head}\n\n${explainedText(explained)}` : head);
  },
};
