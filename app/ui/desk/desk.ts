// What the window needs from the machine it runs on: files, and a place for recent ones. One
// implementation for a plain browser page stands beside this; a desktop shell brings its own.

export interface OpenedFile {
  /** Name to show and to put into faults; no promise that it is a path. */
  readonly file: string;
  readonly text: string;
  /** Where it lies, where the machine says. */
  readonly path?: string;
  /** Of its bytes, in hexadecimal. */
  readonly sha256?: string;
  /** As a project beside which it was looked up would name it. */
  readonly relativePath?: string;
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
  /** Saving and what keeps work from being lost; absent in a plain page. */
  readonly files?: DeskFiles;
}

export interface SaveRequest {
  /** `null`: the user is asked, starting from `name`. */
  readonly path: string | null;
  readonly name: string;
  readonly text: string;
  /** SHA-256 that the file is expected to have; null for a new one. */
  readonly replaces: string | 'anything' | null;
}

export type SaveAnswer =
  | {
      readonly kind: 'saved';
      readonly path: string;
      readonly name: string;
      readonly sha256: string;
    }
  /** The user closed the dialog. */
  | { readonly kind: 'left' }
  /** The file on disk is not the one that was opened. */
  | { readonly kind: 'changed'; readonly message: string };

export interface DraftNote {
  readonly id: string;
  readonly path: string | null;
  readonly name: string;
  readonly changedAt: number;
}

export interface DeskFiles {
  readonly version: string;
  /** What it runs on, in a line. */
  readonly parts: string;
  /** Whether the shell asks for a name by a dialog of the system's. */
  readonly hasDialogs: boolean;
  /** Folders that may be written to. */
  readonly folders: readonly string[];
  save(request: SaveRequest): Promise<SaveAnswer>;
  /** Says that this window has the file open; tells what it holds now and who else has it open. */
  watch(path: string | null): Promise<{ readonly sha256: string | null; readonly others: number }>;
  versions(path: string): Promise<readonly { readonly id: string; readonly savedAt: number }[]>;
  readVersion(path: string, id: string): Promise<string>;
  /** The weather table's path as a project at `projectPath` should name it. */
  weatherPathFrom(weatherPath: string, projectPath: string): Promise<string | null>;
  keepDraft(draft: Draft): Promise<void>;
  dropDraft(id: string): Promise<void>;
  drafts(): Promise<readonly DraftNote[]>;
  openDraft(id: string): Promise<OpenedDraft | null>;
}

export interface Draft {
  readonly id: string;
  readonly path: string | null;
  readonly name: string;
  readonly weatherPath: string | null;
  readonly replaces: string | null;
  readonly text: string;
}

export interface OpenedDraft extends OpenedProject {
  readonly replaces: string | null;
}
