// What a report is made from and what it is made of.

import type { Building, Simulation } from '../../engine/index.ts';
import type { Markup } from './markup.ts';

export interface ReportInput {
  readonly simulation: Simulation;
  /** The project that was run: its physics says which methods were used. */
  readonly building: Building;
  /** Of the program. */
  readonly version: string;
  /** Day on which the report is made, YYYY-MM-DD; the report has no clock of its own. */
  readonly madeOn: string;
}

/** A part of a report that stands by itself; a longer report is a longer list of them. */
export interface Chapter {
  /** Unique in the report, for links. */
  readonly id: string;
  readonly title: string;
  readonly html: Markup;
}

/** Makes a chapter, or none where the run has nothing to say on it. */
export type ChapterMaker = (input: ReportInput) => Chapter | null;
