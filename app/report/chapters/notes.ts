// Cautions, assumptions, weather: what the figures rest on and where they must not be trusted alone.

import { standingCaution } from '../../../engine/index.ts';
import { figure } from '../figures.ts';
import { type Markup, markup, nothing } from '../markup.ts';
import type { ChapterMaker } from '../report.ts';

/** A caution's bold phrase is what stands before its colon. */
function caution(text: string): Markup {
  const [, name, rest] = /^([^:]{1,40}): (.*)$/s.exec(text) ?? [];
  const words =
    name === undefined || rest === undefined
      ? text
      : markup`<b>${name}.</b> ${rest.charAt(0).toUpperCase() + rest.slice(1)}`;
  return markup`<p class="caution"><svg viewBox="0 0 14 13" aria-hidden="true"><path d="M7 1 13.2 12H.8Z M7 5v3.4 M7 9.8v1"/></svg>${words}</p>\n`;
}

export const cautions: ChapterMaker = ({ simulation }) => ({
  id: 'cautions',
  title: 'Cautions',
  html: markup`${simulation.findings.cautions.map(caution)}<p>${standingCaution}</p>\n`,
});

const list = (items: readonly string[]): Markup =>
  markup`<ul>\n${items.map((item) => markup`<li>${item}</li>\n`)}</ul>\n`;

export const assumptions: ChapterMaker = ({ simulation: { findings } }) => {
  const all = [
    ...findings.assumptions,
    ...findings.weather.repairs.filter(({ kind }) => kind === 'assumption').map(({ text }) => text),
  ];
  return {
    id: 'assumptions',
    title: 'Assumptions',
    html: all.length === 0 ? markup`<p>None beyond the methods below.</p>\n` : list(all),
  };
};

export const weather: ChapterMaker = ({ simulation: { findings, outdoorC } }) => {
  const { place, form, hours, repairs } = findings.weather;
  const mended = repairs.filter(({ kind }) => kind === 'repair').map(({ text }) => text);
  const mean = outdoorC.reduce((a, b) => a + b, 0) / outdoorC.length;
  const low = outdoorC.reduce((a, b) => Math.min(a, b));
  const high = outdoorC.reduce((a, b) => Math.max(a, b));
  return {
    id: 'weather',
    title: 'Weather',
    html: markup`<p>${place === '' ? 'Place not named' : place}; ${form}, ${figure(hours)} hours. Outside air ${figure(low, 1)} to ${figure(high, 1)} °C, mean ${figure(mean, 1)} °C.${mended.length === 0 ? ' Nothing had to be repaired.' : ' Repaired:'}</p>\n${mended.length === 0 ? nothing : list(mended)}`,
  };
};
