import { execFileSync } from 'node:child_process';
import { existsSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { StampedEntries } from '../../src/engine/kernel/index.ts';

/** Medians of the native solver on one matrix, microseconds, and its normalised residual. */
export interface YardstickTimes {
  refactor: number;
  oneSolve: number;
  threeSolves: number;
  residual: number;
}

/** The native sparse solver used as yardstick, or why it cannot be had here. */
export type Yardstick =
  | { measure(matrix: StampedEntries, milliseconds: number): YardstickTimes; close(): void }
  | { missing: string };

const headers = [
  '/usr/include/suitesparse',
  '/usr/include',
  '/usr/local/include/suitesparse',
  '/usr/local/include',
];

/** Builds the yardstick from kluYardstick.c with the system's C compiler and SuiteSparse. */
export function buildYardstick(): Yardstick {
  const include = headers.find((folder) => existsSync(join(folder, 'klu.h')));
  if (!include) return { missing: 'klu.h is not installed (Debian: libsuitesparse-dev)' };
  const folder = mkdtempSync(join(tmpdir(), 'klu-yardstick-'));
  const program = join(folder, 'kluYardstick');
  const source = join(import.meta.dirname, 'kluYardstick.c');
  try {
    execFileSync('cc', ['-O3', '-march=native', `-I${include}`, source, '-o', program, '-lklu', '-lm'], {
      stdio: 'pipe',
    });
  } catch (error) {
    rmSync(folder, { recursive: true });
    return {
      missing: `the C compiler failed: ${error instanceof Error ? error.message.split('\n')[0] : String(error)}`,
    };
  }
  return {
    measure(matrix, milliseconds) {
      const file = join(folder, 'matrix.txt');
      writeFileSync(file, matrixText(matrix));
      const printed = execFileSync(program, [file, String(milliseconds)], { encoding: 'utf8' });
      const [refactor = 0, oneSolve = 0, threeSolves = 0, residual = 0] = printed
        .trim()
        .split(' ')
        .map(Number);
      return { refactor, oneSolve, threeSolves, residual };
    },
    close: () => rmSync(folder, { recursive: true }),
  };
}

/** Size and count, column pointers, row indices, values. */
function matrixText(matrix: StampedEntries): string {
  const columns = Array.from({ length: matrix.size }, () => new Map<number, [number, number]>());
  matrix.forEachEntry((row, column, re, im) => columns[column]?.set(row, [re, im]));
  const sorted = columns.map((column) => [...column].sort(([a], [b]) => a - b));
  const pointers = [0];
  for (const column of sorted) pointers.push((pointers.at(-1) ?? 0) + column.length);
  const entries = sorted.flat();
  return [
    matrix.size,
    entries.length,
    ...pointers,
    ...entries.map(([row]) => row),
    ...entries.flatMap(([, value]) => value),
  ].join('\n');
}
