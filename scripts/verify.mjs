import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { findChromium } from './chromium.mjs';
import { build, install, run } from './steps.mjs';

/**
 * Everything that must hold before a change lands: installs, lint, types, tests, build, browser tests.
 * A step that is no test counts as one. The last line is the count.
 */

const started = Date.now();
const work = mkdtempSync(join(tmpdir(), 'matchmark-verify-'));
let passed = 0;
let failed = 0;

async function step(name, action) {
  const from = Date.now();
  console.log(`\n— ${name}`);
  const ok = await action();
  if (ok) passed++;
  else failed++;
  console.log(`${ok ? 'ok' : 'FAILED'}: ${name}, ${((Date.now() - from) / 1000).toFixed(1)} s`);
}

const command = (name, program, args, options) =>
  step(name, async () => (await run(program, args, options)).code === 0);

/** Runs a test runner that writes a JSON report; adds its counts. A runner that wrote none has failed. */
async function tests(name, program, args, report, count, env = {}) {
  const from = Date.now();
  console.log(`\n— ${name}`);
  const { code } = await run(program, args, { env });
  let counts = { passed: 0, failed: 0 };
  try {
    counts = count(JSON.parse(readFileSync(report, 'utf8')));
  } catch {
    counts.failed = 1;
  }
  if (code !== 0 && counts.failed === 0) counts.failed = 1;
  passed += counts.passed;
  failed += counts.failed;
  console.log(
    `${name}: ${counts.passed} passed, ${counts.failed} failed, ${((Date.now() - from) / 1000).toFixed(1)} s`,
  );
}

await install();
await command('lint', 'npx', ['eslint', '.', '--max-warnings=0']);
await command('format', 'npx', ['prettier', '--check', '.', '--log-level=warn']);
await command('layers', 'npx', [
  'depcruise',
  '--config',
  '.dependency-cruiser.cjs',
  'src',
  'db',
  'scripts',
  '--output-type',
  'err',
]);
await command('content is canonical', 'npx', ['tsx', 'scripts/book-format.ts', '--check']);
await command('types', 'npm', ['run', '--silent', 'types']);

const unitReport = join(work, 'vitest.json');
await tests(
  'unit, integration and reference tests',
  'npx',
  ['vitest', 'run', '--reporter=default', '--reporter=json', `--outputFile.json=${unitReport}`],
  unitReport,
  (report) => ({
    passed: report.numPassedTests,
    failed: report.numFailedTests + (report.numFailedTestSuites > 0 && report.numFailedTests === 0 ? 1 : 0),
  }),
);

await step('build', async () => (await build()) === 0);

const chromium = await findChromium();
if (chromium) {
  const browserReport = join(work, 'playwright.json');
  await tests(
    'browser tests',
    'npx',
    ['playwright', 'test', '--reporter=list,json'],
    browserReport,
    (report) => ({ passed: report.stats.expected, failed: report.stats.unexpected + report.stats.flaky }),
    { CHROMIUM_PATH: chromium, PLAYWRIGHT_JSON_OUTPUT_NAME: browserReport },
  );
} else failed++;

rmSync(work, { recursive: true, force: true });
console.log(`\nTook ${((Date.now() - started) / 60_000).toFixed(1)} minutes.`);
console.log(`${passed} passed, ${failed} failed`);
process.exit(failed === 0 ? 0 : 1);
