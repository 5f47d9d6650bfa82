import { assemble, type Building, type Problem } from '../../engine/index.ts';
import type { WeatherYear } from '../../weather/index.ts';
import { textOf } from './arguments.ts';
import type { Command, Given } from './command.ts';
import { type OpenProject, openModel, weatherFor } from './inputs.ts';
import {
  type LinkEntry,
  type NetworkDocument,
  type NodeEntry,
  networkDocument,
  type TimeConstants,
} from './network-document.ts';
import { nodalResults, nodalText, type OpenNodal, refuseForNodal, runNodal } from './nodal.ts';
import { table } from './table.ts';
import type { Terminal } from './terminal.ts';
import { mostNodesForModes, timeConstantsH, timeConstantsText } from './time-constants.ts';

const inputText = (inputs: LinkEntry['inputs']) =>
  Object.entries(inputs)
    .map(
      ([name, value]) =>
        `${name} ${typeof value === 'number' ? Number(value.toPrecision(4)) : value}`,
    )
    .join(', ');

function networkText(document: NetworkDocument): string {
  const nodes = table<NodeEntry>(
    [
      { head: 'Node', of: (node) => node.name },
      { head: 'Capacity', unit: 'kJ/K', digits: 2, of: (node) => node.capacityJPerK / 1000 },
      {
        head: 'Own time constant',
        unit: 'h',
        of: (node) =>
          node.isBoundary
            ? 'given'
            : node.ownTimeConstantH === null
              ? '–'
              : node.ownTimeConstantH.toPrecision(3),
      },
      { head: 'Stands for', of: (node) => node.what },
      { head: 'Method', of: (node) => node.method },
    ],
    document.nodes,
  );
  const linkTable = (links: readonly LinkEntry[]) =>
    table<LinkEntry>(
      [
        { head: 'From', of: (link) => link.from },
        { head: 'To', of: (link) => link.to },
        { head: 'Size', unit: 'W/K', digits: 3, of: (link) => link.sizeWPerK },
        { head: 'Law', of: (link) => link.law },
        { head: 'Stands for', of: (link) => link.what },
        { head: 'Method', of: (link) => link.method },
        { head: 'Inputs', of: (link) => inputText(link.inputs) },
      ],
      links,
    );
  const parts = [
    `${document.project}: ${document.nodes.length} nodes, ${document.links.length} links, ${document.directed.length} directed links, ${document.sources.length} sources, heaters and chillers: ${document.plants.length}`,
    nodes,
    "Links. Where the law depends on temperature or weather, the size is the one at 20 °C, 1 K apart and the\nyear's mean weather.\n" +
      linkTable(document.links),
  ];
  if (document.directed.length > 0) parts.push(`Directed links\n${linkTable(document.directed)}`);
  for (const one of document.enclosures)
    parts.push(`Enclosure ${one.name}: ${one.nodes.join(', ')}`);
  parts.push(timeConstantsText(document.timeConstants.constantsH, document.timeConstants.basis));
  return parts.join('\n\n');
}

async function ofProject(project: OpenProject, given: Given): Promise<NetworkDocument> {
  const { year } = await weatherFor(project, textOf(given, 'weather'));
  const { building } = project;
  const { problem, provenance } = assemble(building, year, { stepMinutes: 15, refine: 1 });
  return networkDocument(building.name, problem, provenance, modesOf(building, year, problem));
}

/** Time constants of the network shown, or of one with a node a layer where that is too large. */
function modesOf(building: Building, year: WeatherYear, problem: Problem): TimeConstants {
  const nodes = problem.network.nodeNames.length;
  if (nodes <= mostNodesForModes)
    return { basis: 'films as at the year’s mean weather', constantsH: timeConstantsH(problem) };
  const physics = { ...building.physics, conduction: 'coarse' as const };
  const coarse = assemble({ ...building, physics }, year, { stepMinutes: 60, refine: 1 });
  return {
    basis: 'of the network with one cell a layer; films as at the year’s mean weather',
    constantsH: timeConstantsH(coarse.problem),
  };
}

/** A nodal model is also solved: it has everything it needs. */
async function showNodal(nodal: OpenNodal, given: Given, terminal: Terminal): Promise<void> {
  refuseForNodal('network', given, ['weather']);
  const results = nodalResults(nodal, runNodal(nodal, terminal));
  const modes = {
    basis: 'at the steady state of the mean drivers',
    constantsH: results.timeConstantsH,
  };
  const document = networkDocument(nodal.model.name, nodal.problem, null, modes);
  if (given.json)
    return terminal.print(JSON.stringify({ ...document, solution: results }, null, 2));
  terminal.print(`${networkText(document)}\n\nSolved\n${nodalText(results)}`);
}

export const networkCommand: Command = {
  name: 'network',
  operand: 'PROJECT',
  summary:
    'Shows the nodes and links that a project becomes, each with its source; solves nodal models.',
  options: {
    weather: { value: 'FILE', help: "a weather table instead of the project's" },
    json: { help: 'one JSON document on standard output' },
  },
  examples: [
    'inglenook network house.inglenook.json',
    'inglenook network house.inglenook.json --json > network.json',
    'inglenook network demo/loft-tank.network.json',
  ],
  async run(operand, given, terminal) {
    const model = await openModel(operand);
    if ('model' in model) return showNodal(model, given, terminal);
    const document = await ofProject(model, given);
    terminal.print(given.json ? JSON.stringify(document, null, 2) : networkText(document));
  },
};
