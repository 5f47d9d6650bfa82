// Shows an address in an installed browser's app window: a window of its own, without tabs or an
// address bar, in a profile that lives as long as the window does.

import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

export interface AppWindow {
  /** Settles when the window is gone, whoever closed it. */
  readonly closed: Promise<void>;
  close(): Promise<void>;
}

function browserArguments(address: string, profile: string): readonly string[] {
  return [
    `--app=${address}`,
    // Without a profile of its own, a browser that runs already would take the window over.
    `--user-data-dir=${profile}`,
    '--no-first-run',
    '--no-default-browser-check',
    '--disable-background-networking',
    '--disable-component-update',
    '--disable-sync',
    '--disable-quic',
    '--window-size=1440,900',
    // The sandbox cannot be had as root; everyone else keeps it.
    ...(process.getuid?.() === 0 ? ['--no-sandbox'] : []),
  ];
}

/** Whether a window can appear here at all. */
export function hasScreen(
  env: Readonly<Record<string, string | undefined>>,
  platform: NodeJS.Platform,
): boolean {
  return platform !== 'linux' || Boolean(env.DISPLAY || env.WAYLAND_DISPLAY);
}

export async function openAppWindow(browser: string, address: string): Promise<AppWindow> {
  const profile = await mkdtemp(join(tmpdir(), 'inglenook-window-'));
  const child: ChildProcess = spawn(browser, browserArguments(address, profile), {
    stdio: 'ignore',
  });
  const ended = once(child, 'exit').catch(() => {}); // it could not be started: the same as gone
  const closed = ended.then(() =>
    rm(profile, { recursive: true, force: true, maxRetries: 5, retryDelay: 100 }),
  );
  return {
    closed,
    async close() {
      if (child.exitCode === null && child.signalCode === null) child.kill();
      await closed;
    },
  };
}
