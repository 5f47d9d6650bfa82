// What a shell brings to the handlers; all the rest is the same in both.

export interface Shell {
  readonly kind: 'electron' | 'browser';
  readonly version: string;
  /** Folders whose files may be listed, read and written. */
  readonly folders: readonly string[];
  /** Where the demo lies; its files may be read. */
  readonly demoFolder: string;
  /** Where the list of recent files is kept; null to keep none. */
  readonly dataFolder: string | null;
  readonly startWith: string | null;
  /** The system's dialogs, where the shell has them; null when the user closed one. */
  readonly dialogs: Dialogs | null;
}

export interface Dialogs {
  pickOpen(kind: 'project' | 'weather'): Promise<string | null>;
  pickSave(name: string): Promise<string | null>;
}
