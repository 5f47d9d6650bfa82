import { assemble } from '../../engine/index.ts';
import { textOf } from './arguments.ts';
import type { Command, Given } from './command.ts';
import { type OpenProject, openModel, weatherFor } from './inputs.ts';
import {
  type LinkEntry,
  type NetworkDocument,
  type NodeEntry,
  networkDocument,
} from './network-document.ts';
import { type OpenNodal, refuseForNodal } from './nodal.ts';
import { table } from './table.ts';

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
  return parts.join('\n\n');
}

async function ofProject(project: OpenProject, given: Given): Promise<NetworkDocument> {
  const { year } = await weatherFor(project, textOf(given, 'weather'));
  const { building } = project;
  const { problem, provenance } = assemble(building, year, { stepMinutes: 15, refine: 1 });
  return networkDocument(building.name, problem, provenance);
}

function ofNodal({ model, problem }: OpenNodal, given: Given): NetworkDocument {
  refuseForNodal('network', given, ['weather']);
  return networkDocument(model.name, problem, null);
}

export const networkCommand: Command = {
  name: 'network',
  operand: 'PROJECT',
  summary: 'Shows the nodes and links that a project becomes, each with its source and inputs.',
  options: {
    weather: { value: 'FILE', help: "a weather table instead of the project's" },
    json: { help: 'one JSON document on standard output' },
  },
  examples: [
    'inglenook network house.inglenook.json',
    'inglenook network house.inglenook.json --json > network.json',
  ],
  async run(operand, given, terminal) {
    const model = await openModel(operand);
    const document = 'building' in model ? await ofProject(model, given) : ofNodal(model, given);
    terminal.print(given.json ? JSON.stringify(document, null, 2) : networkText(document));
  },
};
