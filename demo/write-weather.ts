// The end of a build: the demo's weather, so that its project runs in the window and on the command
// line without the demo having been run. Built to dist/demo-weather.js.
import { fileURLToPath } from 'node:url';
import { explain } from '../app/cli/run-cli.ts';
import { placesIn } from './places.ts';
import { writeDemoWeather } from './weather-file.ts';

try {
  await writeDemoWeather(placesIn(fileURLToPath(new URL('../demo/', import.meta.url))));
} catch (error) {
  const streams = { out: process.stdout, err: process.stderr, env: process.env };
  process.exitCode = explain(error, streams);
}
