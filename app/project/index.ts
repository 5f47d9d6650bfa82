// The open document: its undo, its file's text, and the weather it was made with. No React, no Node.
export { begin, edit, type History, redo, undo } from './history.ts';
export { projectText } from './project-text.ts';
export { checkWeatherDigest, type DigestCheck } from './weather-digest.ts';
