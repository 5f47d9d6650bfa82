// The desk of a plain browser page: file inputs, and the example read from beside the page. A page
// has no paths, so recent projects cannot be opened again and none are listed.

import type { Desk, OpenedFile, OpenedProject } from './desk.ts';

async function readDropped(file: File): Promise<OpenedFile> {
  return { file: file.name, text: await file.text() };
}

function isProject(file: string): boolean {
  return file.toLowerCase().endsWith('.json');
}

/** Sorts dropped or chosen files into a project and a weather table. */
export async function sortFiles(files: readonly File[]): Promise<{
  readonly project: OpenedFile | null;
  readonly weather: OpenedFile | null;
}> {
  const project = files.find((file) => isProject(file.name));
  const weather = files.find((file) => !isProject(file.name));
  return {
    project: project ? await readDropped(project) : null,
    weather: weather ? await readDropped(weather) : null,
  };
}

function pick(accept: string, isMultiple: boolean): Promise<readonly File[]> {
  return new Promise((resolve) => {
    const input = document.createElement('input');
    input.type = 'file';
    input.accept = accept;
    input.multiple = isMultiple;
    input.addEventListener('change', () => resolve(Array.from(input.files ?? [])));
    input.addEventListener('cancel', () => resolve([]));
    input.click();
  });
}

async function fetchText(url: string, file: string): Promise<OpenedFile | null> {
  const answer = await fetch(url);
  const isPage = (answer.headers.get('content-type') ?? '').includes('text/html');
  return answer.ok && !isPage ? { file, text: await answer.text() } : null;
}

/** `demoUrls` are the example's project and weather table, where they are served with the page. */
export function browserDesk(demoUrls: { project: string; weather: string } | null): Desk {
  return {
    async openProject() {
      const { project, weather } = await sortFiles(await pick('.json,.csv,.txt', true));
      return project && { ...project, weather };
    },
    async openWeather() {
      const [file] = await pick('.csv,.txt,.tsv,.dat', false);
      return file ? readDropped(file) : null;
    },
    recent: () => Promise.resolve([]),
    openRecent: () => Promise.resolve(null),
    async demo(): Promise<OpenedProject | null> {
      if (!demoUrls) return null;
      const nameOf = (url: string) => url.slice(url.lastIndexOf('/') + 1);
      const project = await fetchText(demoUrls.project, nameOf(demoUrls.project));
      const weather = await fetchText(demoUrls.weather, nameOf(demoUrls.weather));
      return project && { ...project, weather };
    },
  };
}
