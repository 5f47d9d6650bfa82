// Everything that the window may ask of the desktop: name → what goes in, what comes out. Both shells
// answer exactly this, and both sides check what they receive, because the window is a stranger to the
// host and a reply may come from an older host.
//
// A call is a question with one answer. Text goes over as the user's file holds it: parsing belongs to
// the engine, in the window's worker.

import { z } from 'zod';

// A page with a strict content security policy must not compile code; zod would try.
z.config({ jitless: true });

const path = z.string().min(1).max(4096);
const text = z.string().max(32_000_000);

const listedFile = z.strictObject({
  path,
  name: z.string(),
  /** The folder below which it was found. */
  folder: z.string(),
  bytes: z.number().int().nonnegative(),
  /** Milliseconds since 1970, UTC. */
  changedAt: z.number(),
});

const projectFile = z.strictObject({ path, name: z.string(), text, sha256: z.string() });

const weatherFile = z.strictObject({
  path,
  name: z.string(),
  /** As a project saved at `projectPath` should name it; the same as `path` where none was given. */
  relativePath: z.string(),
  text: z.string().max(64_000_000),
  sha256: z.string(),
  notes: z.array(z.string()),
});

const nothing = z.strictObject({});
/** Names a window or a draft; becomes part of a file's name. */
const mark = z.string().regex(/^[a-z0-9-]{8,64}$/);
const sha256 = z.string().regex(/^[0-9a-f]{64}$/);

export const contract = {
  /** Who answers, and what it can do. */
  appInfo: {
    in: nothing,
    out: z.strictObject({
      version: z.string(),
      shell: z.enum(['electron', 'browser']),
      /** Whether openProject, readWeather and saveProject with a null path show the system's dialog. */
      hasDialogs: z.boolean(),
      /** Folders whose files may be listed, read and written. */
      folders: z.array(z.string()),
      versions: z.record(z.string(), z.string()),
      /** A project named when the program was started. */
      startWith: path.nullable(),
    }),
  },
  /** Files of a kind in the folders of `appInfo`, newest first. */
  listFiles: {
    in: z.strictObject({ kind: z.enum(['project', 'weather']) }),
    out: z.array(listedFile),
  },
  /** Reads a project; with null the user picks one, and null comes back when they did not. */
  openProject: { in: z.strictObject({ path: path.nullable() }), out: projectFile.nullable() },
  /** The demo project that comes with the program; null where it is not there. */
  readDemo: { in: nothing, out: projectFile.nullable() },
  /**
   * Reads a weather table: a path relative to the project's, or absolute. With null the user picks one,
   * and null comes back when they did not.
   */
  readWeather: {
    in: z.strictObject({ path: path.nullable(), projectPath: path.nullable() }),
    out: weatherFile.nullable(),
  },
  /**
   * Writes the whole file or leaves the old one. With a null path the user picks one, starting from
   * `name`; null comes back when they did not. `replaces` is the SHA-256 that the file had when it was
   * last read or written here: when another program has changed it since, the save is refused. Null
   * for a new file: refused when there is one. 'anything' after the user has agreed to lose it.
   */
  saveProject: {
    in: z.strictObject({
      path: path.nullable(),
      name: z.string().max(255),
      text,
      replaces: z.union([z.literal('anything'), sha256]).nullable(),
    }),
    out: z.strictObject({ path, name: z.string(), sha256: z.string() }).nullable(),
  },
  /** Projects opened or saved before and still there, latest first. */
  recentFiles: {
    in: nothing,
    out: z.array(z.strictObject({ path, name: z.string(), usedAt: z.number() })),
  },
  /**
   * To be called every few seconds: this window is there, with this file open. Answers what the file
   * holds now (null when it is gone or there is none) and how many other windows have it open.
   */
  watchProject: {
    in: z.strictObject({ window: mark, path: path.nullable() }),
    out: z.strictObject({ sha256: z.string().nullable(), others: z.number().int() }),
  },
  /** What stood in a file before each of the last saves, latest first. */
  listVersions: {
    in: z.strictObject({ path }),
    out: z.array(z.strictObject({ id: z.string(), savedAt: z.number(), bytes: z.number().int() })),
  },
  readVersion: {
    in: z.strictObject({ path, id: z.string() }),
    out: z.strictObject({ text }),
  },
  /** Writes unsaved work aside, whole; `replaces` as for a save. */
  keepDraft: {
    in: z.strictObject({
      id: mark,
      window: mark,
      path: path.nullable(),
      name: z.string().max(255),
      weatherPath: path.nullable(),
      replaces: sha256.nullable(),
      text,
    }),
    out: nothing,
  },
  dropDraft: { in: z.strictObject({ id: mark }), out: nothing },
  /** Unsaved work of this window and of windows that are gone, latest first. */
  listDrafts: {
    in: z.strictObject({ window: mark }),
    out: z.array(
      z.strictObject({
        id: z.string(),
        path: path.nullable(),
        name: z.string(),
        changedAt: z.number(),
      }),
    ),
  },
  readDraft: {
    in: z.strictObject({ id: mark }),
    out: z
      .strictObject({
        path: path.nullable(),
        name: z.string(),
        weatherPath: path.nullable(),
        replaces: sha256.nullable(),
        text,
      })
      .nullable(),
  },
} as const;

export type Contract = typeof contract;
export type CallName = keyof Contract;
export type CallIn<Name extends CallName> = z.infer<Contract[Name]['in']>;
export type CallOut<Name extends CallName> = z.infer<Contract[Name]['out']>;

/** What the host brings: an answer to every call. */
export type Handlers = {
  readonly [Name in CallName]: (input: CallIn<Name>) => Promise<CallOut<Name>>;
};

/** What the window holds: the same calls, typed. */
export type Bridge = Handlers;

const fault = z.strictObject({
  file: z.string(),
  place: z.union([
    z.strictObject({ row: z.number(), column: z.string() }),
    z.strictObject({ path: z.string() }),
  ]),
  found: z.string(),
  expected: z.string(),
  mend: z.string(),
});

/** The answer on the wire. */
export const reply = z.discriminatedUnion('ok', [
  z.strictObject({ ok: z.literal(true), value: z.unknown() }),
  z.strictObject({
    ok: z.literal(false),
    error: z.strictObject({
      /**
       * `input`: a file or path of the user's, `faults` say what; `changed`: the file on disk is not the
       * one that was opened; `call`: the window asked wrongly; `program`: the host failed.
       */
      kind: z.enum(['input', 'changed', 'call', 'program']),
      message: z.string(),
      faults: z.array(fault),
    }),
  }),
]);
export type Reply = z.infer<typeof reply>;
export type ReplyError = Extract<Reply, { ok: false }>['error'];
