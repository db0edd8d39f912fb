import { spawnSync } from 'node:child_process';
import { resolve } from 'node:path';

const root = resolve(import.meta.dirname, '../..');

/** Runs the command as a user does, in its own process. */
export function runStudy(...args: string[]): { status: number | null; stdout: string; stderr: string } {
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    ['--import', 'tsx', resolve(root, 'src/cli/main.ts'), ...args],
    { cwd: root, encoding: 'utf8' },
  );
  return { status, stdout, stderr };
}

export function referenceStudy(name: string): string {
  return resolve(root, 'tests/reference/studies', `${name}.json`);
}
