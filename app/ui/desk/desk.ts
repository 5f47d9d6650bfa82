// What the window needs from the machine it runs on: files, and a place for recent ones. One
// implementation for a plain browser page stands beside this; a desktop shell brings its own.

export interface OpenedFile {
  /** Name to show and to put into faults; no promise that it is a path. */
  readonly file: string;
  readonly text: string;
}

export interface OpenedProject extends OpenedFile {
  /** The weather table the project names, where the machine may read it. */
  readonly weather: OpenedFile | null;
  /** Why the table that the project names was not read. */
  readonly trouble?: string;
}

export interface RecentProject {
  readonly file: string;
  /** Path or folder, to tell two of the same name apart. */
  readonly note: string;
}

export interface Desk {
  /** Asks the user for a project file; `null` when they changed their mind. */
  openProject(): Promise<OpenedProject | null>;
  openWeather(): Promise<OpenedFile | null>;
  recent(): Promise<readonly RecentProject[]>;
  openRecent(project: RecentProject): Promise<OpenedProject | null>;
  /** The example house, or `null` where none came with the program. */
  demo(): Promise<OpenedProject | null>;
}
