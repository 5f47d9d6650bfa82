// Turns vitest's JSON report into the one plain line CI reads. Counts a file that failed to load, and an
// unhandled error, as failures; never prints a passing line for a run that did not finish.
import { readFile } from 'node:fs/promises';

const [file, rcText] = process.argv.slice(2);
const rc = Number(rcText);
let report;
try {
  report = JSON.parse(await readFile(file, 'utf8'));
} catch {
  console.log(`no test report (${file}); the step before the tests failed or they never ran`);
  console.log('0 passed, 1 failed');
  process.exit(rc || 1);
}
const tests = report.testResults.flatMap((f) => f.assertionResults);
const count = (s) => tests.filter((t) => t.status === s).length;
const passed = count('passed');
const skipped = tests.length - passed - count('failed');
const brokenFiles = report.testResults.filter(
  (f) => f.status === 'failed' && !f.assertionResults.some((t) => t.status === 'failed'),
).length;
let failed = count('failed') + brokenFiles;
if (failed === 0 && (rc !== 0 || !report.success)) failed = 1; // unhandled error, lint, coverage threshold, ...
console.log(`${passed} passed, ${failed} failed${skipped ? `, ${skipped} skipped` : ''}`);
process.exit(rc || (failed || passed === 0 ? 1 : 0));
