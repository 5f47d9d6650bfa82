// The open document: its undo, its file's text, and the weather it was made with. No React, no Node.
export { type DifferenceLine, differences } from './difference.ts';
export {
  constructionEdit,
  copyEdit,
  type FabricAt,
  layersEdit,
  materialEdit,
  swapEdit,
} from './fabric-edits.ts';
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
export { copyGlazingEdit, glazingEdit, swapGlazingEdit } from './glazing-edits.ts';
export { begin, edit, type History, redo, undo } from './history.ts';
export { rowsOfText, textOfRows } from './pasted-rows.ts';
export {
  addPlanRoom,
  addStorey,
  addWindow,
  movedSide,
  moveWindow,
  placeEdit,
  planOf,
  removePlanRoom,
  startPlan,
  storeyHeightEdit,
  turnEdit,
} from './plan-edits.ts';
export {
  floorLevelM,
  overlaps,
  type Piece,
  type Plan,
  type PlanRoom,
  piecesOf,
  type Side,
  type Storey,
  sideAzimuthDeg,
  sideLengthM,
  sides,
} from './plan-geometry.ts';
export { compassWord, type Drawn, type PlanFabric, roomsOfPlan } from './plan-to-rooms.ts';
export { projectText } from './project-text.ts';
export {
  addOpening,
  addSurface,
  boundaryEdit,
  copyRoom,
  nameOf,
  openingAreaEdit,
  openingSizeEdit,
  removeOpening,
  removeRoom,
  removeSurface,
  surfaceEdit,
} from './room-edits.ts';
export {
  beginStory,
  type Edit,
  type Edited,
  endGesture,
  type Revision,
  type Story,
  tell,
} from './story.ts';
export { type SurfaceRow, surfaceRowsEdit } from './surface-rows.ts';
export { emptyProject } from './template.ts';
export {
  addGain,
  amountOf,
  type DayKind,
  dayEdit,
  type GainAmount,
  gainAmountEdit,
  newSchedule,
  ownDayProfile,
  profileEdit,
  scheduleFieldEdit,
  usualAmount,
} from './use-edits.ts';
export { checkWeatherDigest, type DigestCheck } from './weather-digest.ts';
