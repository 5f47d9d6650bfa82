// From a fault's place in the document to the field on the screen that edits it.

import type { Fault } from '../../../weather/index.ts';
import type { ProjectForm } from '../../project/index.ts';
import type { App, Screen } from '../state/index.ts';

interface Target {
  readonly screen: Screen;
  /** Which of the screen's things. */
  readonly id: string | null;
}

/** Where a path of the document is edited; null where the window has no field for it. */
export function targetOf(path: string, form: ProjectForm): Target | null {
  const entry = /^([a-zA-Z]+)\[(\d+)\]/.exec(path);
  const list = entry?.[1] ?? /^[a-zA-Z]+/.exec(path)?.[0] ?? '';
  const index = Number(entry?.[2] ?? NaN);
  if (list === 'rooms') {
    const room = form.rooms[index];
    if (!room) return null;
    const part = /^rooms\[\d+\]\.([a-zA-Z]+)/.exec(path)?.[1] ?? '';
    if (['heating', 'cooling', 'ventilation', 'infiltration'].includes(part)) {
      return { screen: 'plant', id: null };
    }
    if (['gains', 'comfort', 'usage'].includes(part)) return { screen: 'use', id: 'gains' };
    return { screen: 'rooms', id: room.id };
  }
  if (list === 'constructions') return withId('construction', form.constructions?.[index]?.id);
  if (list === 'glazings') return withId('glazing', form.glazings?.[index]?.id);
  if (list === 'materials') {
    const id = form.materials?.[index]?.id;
    const user = form.constructions?.find(({ layers }) =>
      layers.some((layer) => 'material' in layer && layer.material === id),
    );
    return withId('construction', user?.id);
  }
  if (list === 'schedules') return { screen: 'use', id: form.schedules?.[index]?.id ?? null };
  if (list === 'profiles' || list === 'calendar') return { screen: 'use', id: null };
  if (list === 'energy') return { screen: 'plant', id: null };
  if (list === 'physics' || list === 'site') return { screen: 'methods', id: null };
  if (list === 'weather') return { screen: 'site', id: null };
  return null;
}

function withId(kind: 'construction' | 'glazing', id: string | undefined): Target | null {
  return id === undefined ? null : { screen: 'fabric', id: `${kind}:${id}` };
}

/** Focuses the field of the path, or the nearest one that holds it. */
function focusField(path: string) {
  let at = path;
  while (at !== '') {
    const fields = [...document.querySelectorAll<HTMLElement>('[data-path]')];
    const field =
      fields.find((one) => one.dataset.path === at) ??
      fields.find((one) => one.dataset.path?.startsWith(`${at}.`));
    if (field) {
      field.scrollIntoView({ block: 'center' });
      return field.focus();
    }
    at = at.replace(/(\.[^.[]+|\[[^\]]*\])$/, '');
    if (!/[.[]/.test(at)) return;
  }
}

export function jumpTo(app: App, form: ProjectForm | null, fault: Fault): (() => void) | null {
  if (!form || !('path' in fault.place)) return null;
  const { path } = fault.place;
  const target = targetOf(path, form);
  if (!target) return null;
  return () => {
    if (target.id === null) app.go(target.screen);
    else app.choose(target.screen, target.id);
    requestAnimationFrame(() => requestAnimationFrame(() => focusField(path)));
  };
}
