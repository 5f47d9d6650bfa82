// The demo's entry, built to dist/demo.js: npm run demo.
import { fileURLToPath } from 'node:url';
import { runDemo } from './demo.ts';
import { placesIn } from './places.ts';

const places = placesIn(fileURLToPath(new URL('../demo/', import.meta.url)));
const today = new Date().toISOString().slice(0, 10);
const streams = { out: process.stdout, err: process.stderr, env: process.env };
process.exitCode = await runDemo(places, today, streams);
