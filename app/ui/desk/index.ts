export { bridgeDesk, weatherNamed } from './bridge-desk.ts';
export { browserDesk, sortFiles } from './browser-desk.ts';
export type { Desk, OpenedFile, OpenedProject, RecentProject } from './desk.ts';
