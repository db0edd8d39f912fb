/**
 * Runs everything that must hold before a change lands: types, lint, boundaries and unit tests, build,
 * browser tests. Installs Debian's Chromium and poppler when they are missing and that is possible.
 * Ends with "N passed, N failed" alone on a line.
 */
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

const scratch = mkdtempSync(join(tmpdir(), 'varwright-verify-'));
const chromium = process.env.CHROMIUM_PATH ?? '/usr/bin/chromium';
let passed = 0;
let failed = 0;

function run(command, args, env = {}) {
  return spawnSync(command, args, { stdio: 'inherit', env: { ...process.env, ...env } }).status === 0;
}

function step(name, work) {
  const start = Date.now();
  console.log(`\n── ${name}`);
  const good = work();
  console.log(`── ${name}: ${good ? 'good' : 'FAILED'} (${((Date.now() - start) / 1000).toFixed(1)} s)`);
  if (!good) failed += 1;
}

/** Debian packages the browser tests need, by a file each one brings. */
function installMissing() {
  const missing = [
    [chromium, 'chromium'],
    ['/usr/bin/pdftotext', 'poppler-utils'],
  ].filter(([file]) => !existsSync(file));
  if (missing.length === 0) return true;
  const names = missing.map(([, name]) => name);
  const apt = (...args) => run('apt-get', args, { DEBIAN_FRONTEND: 'noninteractive' });
  if (existsSync('/usr/bin/apt-get') && apt('update', '-qq') && apt('install', '-y', '-qq', ...names))
    return true;
  console.log(`The browser tests need Debian's ${names.join(' and ')}: install them, or set CHROMIUM_PATH.`);
  return false;
}

function unitTests() {
  const report = join(scratch, 'unit.json');
  const good = run('npx', [
    'vitest',
    'run',
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${report}`,
  ]);
  if (!existsSync(report)) return false;
  const counts = JSON.parse(readFileSync(report, 'utf8'));
  passed += counts.numPassedTests;
  failed += counts.numFailedTests;
  return good;
}

function browserTests() {
  const report = join(scratch, 'browser.json');
  const good = run('npx', ['playwright', 'test', '-c', 'e2e/playwright.config.ts', '--reporter=list,json'], {
    PLAYWRIGHT_JSON_OUTPUT_NAME: report,
    CHROMIUM_PATH: chromium,
  });
  if (!existsSync(report)) return false;
  const { stats } = JSON.parse(readFileSync(report, 'utf8'));
  passed += stats.expected;
  failed += stats.unexpected;
  return good;
}

step('types', () => run('npx', ['tsc', '--noEmit']));
step('types of the pure folders, without the DOM', () => run('npx', ['tsc', '-p', 'src/pure.tsconfig.json']));
step('format and lint', () => run('npx', ['biome', 'check']));
step('lint with types', () =>
  run('npx', ['oxlint', '--type-aware', '--deny-warnings', 'src', 'tests', 'e2e']),
);
step('unit, law, reference and boundary tests', unitTests);
step('build', () => run('npx', ['vite', 'build', '--logLevel', 'warn']));
step('browser', () => installMissing() && browserTests());

rmSync(scratch, { recursive: true, force: true });
console.log(`\n${passed} passed, ${failed} failed`);
process.exit(failed === 0 ? 0 : 1);
