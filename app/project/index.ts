// The open document: its undo, its file's text, and the weather it was made with. No React, no Node.
export { type DifferenceLine, differences } from './difference.ts';
export {
  type BoundaryForm,
  type ConstructionForm,
  freeId,
  type GlazingForm,
  type HeatingForm,
  type LayerForm,
  type MaterialForm,
  type OpeningForm,
  type ProfileForm,
  type ProjectForm,
  projectForm,
  type RoomForm,
  readDocument,
  type ScheduleForm,
  type SurfaceForm,
} from './form.ts';
export { begin, edit, type History, redo, undo } from './history.ts';
export { projectText } from './project-text.ts';
export {
  beginStory,
  type Edit,
  type Edited,
  endGesture,
  type Revision,
  type Story,
  tell,
} from './story.ts';
export { emptyProject } from './template.ts';
export { checkWeatherDigest, type DigestCheck } from './weather-digest.ts';
