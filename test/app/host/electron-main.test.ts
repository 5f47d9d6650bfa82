import { fileURLToPath } from 'node:url';
import { beforeAll, describe, expect, test, vi } from 'vitest';

// Electron's own program is not needed: its main process is driven through stand-ins that record what
// was asked of them. What is checked is that the window is shut off before the first page is loaded.

type Listener = (...args: never[]) => unknown;

const seen = vi.hoisted(() => ({
  order: [] as string[],
  schemes: [] as { scheme: string; privileges: Record<string, boolean> }[],
  page: null as ((request: Request) => Promise<Response>) | null,
  windows: [] as { webPreferences: Record<string, unknown> }[],
  loaded: [] as string[],
  call: null as ((event: unknown, name: unknown, input: unknown) => Promise<unknown>) | null,
  onApp: new Map<string, (...args: never[]) => unknown>(),
  onWindow: new Map<string, (...args: never[]) => unknown>(),
  choice: 0,
  permission: null as ((...args: never[]) => unknown) | null,
  permissionCheck: null as ((...args: never[]) => unknown) | null,
  ready: null as (() => void) | null,
}));

vi.mock('electron', () => ({
  app: {
    whenReady: () =>
      new Promise<void>((ready) => {
        seen.ready = ready;
      }),
    on: (name: string, listen: Listener) => seen.onApp.set(name, listen),
    getPath: () => '/nowhere/inglenook-test',
    quit: () => {},
    exit: () => {},
  },
  protocol: {
    registerSchemesAsPrivileged: (schemes: typeof seen.schemes) => seen.schemes.push(...schemes),
    handle: (_scheme: string, answer: (request: Request) => Promise<Response>) => {
      seen.order.push('page');
      seen.page = answer;
    },
  },
  session: {
    defaultSession: {
      setPermissionRequestHandler: (answer: Listener) => {
        seen.order.push('permissions');
        seen.permission = answer;
      },
      setPermissionCheckHandler: (answer: Listener) => {
        seen.permissionCheck = answer;
      },
    },
  },
  ipcMain: {
    handle: (_channel: string, answer: NonNullable<typeof seen.call>) => {
      seen.order.push('calls');
      seen.call = answer;
    },
  },
  dialog: { showMessageBoxSync: () => seen.choice },
  BrowserWindow: class {
    constructor(options: { webPreferences: Record<string, unknown> }) {
      seen.order.push('window');
      seen.windows.push(options);
    }
    readonly webContents = {
      on: (name: string, hear: Listener) => {
        seen.onWindow.set(name, hear);
      },
    };
    once() {}
    show() {}
    async loadURL(url: string) {
      seen.order.push('load');
      seen.loaded.push(url);
    }
  },
}));

beforeAll(async () => {
  // The module must be read to its end while Electron is not ready yet: awaiting readiness at its top
  // level would wait for ever.
  await import('../../../app/host/electron/main.ts');
  expect(seen.loaded).toEqual([]);
  seen.ready?.();
  await vi.waitFor(() => expect(seen.loaded).toHaveLength(1));
});

test('the page has an origin of its own, secure, told before Electron is ready', () => {
  expect(seen.schemes).toEqual([
    {
      scheme: 'inglenook',
      privileges: { standard: true, secure: true, supportFetchAPI: true },
    },
  ]);
  expect(seen.loaded).toEqual(['inglenook://window/']);
});

test('the window is isolated from Node, sandboxed, and has the preload alone', () => {
  expect(seen.windows[0]?.webPreferences).toMatchObject({
    contextIsolation: true,
    sandbox: true,
    nodeIntegration: false,
    webSecurity: true,
    webviewTag: false,
  });
  expect(seen.windows[0]?.webPreferences.preload).toMatch(/preload\.cjs$/);
});

test('calls, page and permissions are in place before the page is loaded', () => {
  expect(seen.order.at(-1)).toBe('load');
  expect(seen.order).toEqual(expect.arrayContaining(['page', 'permissions', 'window', 'calls']));
});

test('every permission is refused', () => {
  const answer = vi.fn();
  seen.permission?.(...([null, 'geolocation', answer] as never[]));
  expect(answer).toHaveBeenCalledExactlyOnceWith(false);
  expect(seen.permissionCheck?.()).toBe(false);
});

describe('navigation', () => {
  const handlers = new Map<string, (event: { preventDefault: () => void }) => void>();
  let openWindow: (() => unknown) | null = null;
  beforeAll(() => {
    const contents = {
      on: (name: string, listen: (event: { preventDefault: () => void }) => void) =>
        handlers.set(name, listen),
      setWindowOpenHandler: (answer: () => unknown) => {
        openWindow = answer;
      },
    };
    seen.onApp.get('web-contents-created')?.(...([{}, contents] as never[]));
  });

  test('no page opens a second window', () => {
    expect(openWindow?.()).toEqual({ action: 'deny' });
  });

  test.each(['will-navigate', 'will-redirect', 'will-attach-webview'])('%s is stopped', (name) => {
    const preventDefault = vi.fn();
    handlers.get(name)?.({ preventDefault });
    expect(preventDefault).toHaveBeenCalledOnce();
  });
});

test('a window with unsaved work closes only when the user says so', () => {
  const preventDefault = vi.fn();
  const ask = () =>
    seen.onWindow.get('will-prevent-unload')?.(...([{ preventDefault }] as never[]));
  ask(); // stay here
  expect(preventDefault).not.toHaveBeenCalled();
  seen.choice = 1;
  ask(); // Electron lets the window go when the event is prevented
  expect(preventDefault).toHaveBeenCalledOnce();
});

describe('calls', () => {
  test('are answered for our own page', async () => {
    const event = { senderFrame: { origin: 'inglenook://window' } };
    expect(await seen.call?.(event, 'appInfo', {})).toMatchObject({
      ok: true,
      value: { shell: 'electron', hasDialogs: true },
    });
    expect(await seen.call?.(event, 'nothing', {})).toMatchObject({ ok: false });
  });

  test.each([{ senderFrame: { origin: 'https://example.org' } }, { senderFrame: null }, {}])(
    'are refused to any other: %j',
    async (event) => {
      await expect((async () => seen.call?.(event, 'appInfo', {}))()).rejects.toThrow('A stranger');
    },
  );
});

describe('the page', () => {
  test('has the same closed policy as in a browser, also where there is nothing', async () => {
    for (const path of ['none.js', '..%2fpackage.json', 'main.ts']) {
      const response = await seen.page?.(new Request(`inglenook://window/${path}`));
      expect(response?.status).toBe(404);
      expect(response?.headers.get('content-security-policy')).toContain("default-src 'none'");
    }
  });

  test('is not served to another host of the scheme', async () => {
    const { answerPage } = await import('../../../app/host/electron/page-scheme.ts');
    const folder = fileURLToPath(new URL('.', import.meta.url));
    const other = new Request('inglenook://elsewhere/index.html');
    expect((await answerPage(folder, other)).status).toBe(404);
  });
});
