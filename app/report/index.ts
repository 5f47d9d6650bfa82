// The front door: a page from a run. Pure: text out, no file, no clock.

import { answers } from './chapters/answers.ts';
import { balance, load, months, worstWeek, year } from './chapters/drawings.ts';
import { methods } from './chapters/methods.ts';
import { assumptions, cautions, weather } from './chapters/notes.ts';
import { quality } from './chapters/quality.ts';
import { rooms } from './chapters/rooms.ts';
import type { ChapterMaker } from './report.ts';

export type { Markup } from './markup.ts';
export { reportPage } from './page.ts';
export type { Chapter, ChapterMaker, ReportInput } from './report.ts';
export type { Font } from './style.ts';

/** The chapters of the one-page summary, in their order. */
export const summaryChapters: readonly ChapterMaker[] = [
  answers,
  rooms,
  worstWeek,
  months,
  year,
  load,
  balance,
  cautions,
  assumptions,
  weather,
  methods,
  quality,
];
