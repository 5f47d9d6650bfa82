// The one thing that the page gets from Electron: a way to send a named question. It never sees ipc.

import { contextBridge, ipcRenderer } from 'electron';

contextBridge.exposeInMainWorld('inglenookSend', (name: unknown, input: unknown) =>
  ipcRenderer.invoke('inglenook', name, input),
);
