// The page's entry: finds out what holds the page, and starts the window on it.

import { connectBridge } from '../bridge/index.ts';
import { bridgeDesk, browserDesk } from './desk/index.ts';
import { workerRun } from './run-year.ts';
import { startWindow } from './start.tsx';

async function start() {
  const bridge = connectBridge();
  try {
    const info = await bridge.appInfo({});
    const app = startWindow(bridgeDesk(bridge, info), workerRun());
    if (info.startWith !== null) {
      await app.openRecent({ file: info.startWith, note: info.startWith });
    }
  } catch {
    // No host answers: a plain page, with files by its own inputs and no example.
    startWindow(browserDesk(null), workerRun());
  }
}

void start();
