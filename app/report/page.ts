// A report as one HTML page that needs nothing beside it: no script, no file, no network.

import { type Markup, markup } from './markup.ts';
import type { Chapter, ChapterMaker, ReportInput } from './report.ts';
import { type Font, style } from './style.ts';

const policy = "default-src 'none'; style-src 'unsafe-inline'; font-src data:";

const section = ({ id, title, html }: Chapter): Markup =>
  markup`<section id="${id}">\n<h2>${title}</h2>\n${html}</section>\n`;

function heading({ simulation: { findings }, building, version, madeOn }: ReportInput): Markup {
  const { place } = findings.weather;
  const notes = building.notes === '' ? '' : markup`<p>${building.notes}</p>\n`;
  return markup`<header>
<h1>${findings.project}</h1>
<p>One year, hour by hour${place === '' ? '' : `, in the weather of ${place}`}. Made on ${madeOn} with Inglenook ${version}.</p>
${notes}</header>\n`;
}

/** The page; the same input gives the same bytes. */
export function reportPage(
  input: ReportInput,
  makers: readonly ChapterMaker[],
  fonts: readonly Font[] = [],
): string {
  const chapters = makers.flatMap((make) => make(input) ?? []);
  const page = markup`<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width">
<meta http-equiv="Content-Security-Policy" content="${policy}">
<title>${input.simulation.findings.project}</title>
${style(fonts)}</head>
<body>
<main>
${heading(input)}${chapters.map(section)}</main>
</body>
</html>
`;
  return page.markup;
}
