import type { BankStep } from '../types.ts';
import { parseQuantity } from './parseQuantity.ts';

export type ParsedSteps = { ok: true; steps: BankStep[] } | { ok: false; error: string };

const mostSteps = 60;

/**
 * Steps as they are spoken of: "6x25", "2 × 12.5 + 5 × 25", "25; 25; 50 off". Kvar at the rated voltage; a
 * step is switched in unless "off" stands behind it. An error is a sentence.
 */
export function parseSteps(text: string): ParsedSteps {
  const groups = text
    .split(/[+;]| {2,}/)
    .map((group) => group.trim())
    .filter((group) => group !== '');
  if (groups.length === 0) return { ok: false, error: 'Give the steps, such as 6x25 or 2x12.5 + 4x25.' };
  const steps: BankStep[] = [];
  for (const group of groups) {
    const [, size = group, off] = /^(.*?)\s*(\boff)?$/i.exec(group) ?? [];
    const match = /^(\d+)\s*[x×*]\s*(.+)$/i.exec(size);
    const count = match ? Number(match[1]) : 1;
    const kvar = parseQuantity(match?.[2] ?? size, 'kvar');
    if (!kvar.ok) return { ok: false, error: `"${group}" is no group of steps: ${kvar.error}` };
    if (kvar.value <= 0)
      return { ok: false, error: `A step of ${kvar.value} kvar is not possible; give more than 0 kvar.` };
    if (count < 1 || steps.length + count > mostSteps)
      return { ok: false, error: `Give between 1 and ${mostSteps} steps in all.` };
    const step: BankStep = off ? { kvar: kvar.value, on: false } : { kvar: kvar.value };
    for (let index = 0; index < count; index += 1) steps.push(step);
  }
  return { ok: true, steps };
}

/** Steps in the same words: "6 × 25", "2 × 12.5 + 4 × 25 off"; equal neighbours are gathered. */
export function stepsText(steps: readonly BankStep[]): string {
  const groups: { kvar: number; off: boolean; count: number }[] = [];
  for (const { kvar, on } of steps) {
    const off = on === false;
    const last = groups.at(-1);
    if (last?.kvar === kvar && last.off === off) last.count += 1;
    else groups.push({ kvar, off, count: 1 });
  }
  return groups
    .map(({ kvar, off, count }) => `${count === 1 ? kvar : `${count} × ${kvar}`}${off ? ' off' : ''}`)
    .join(' + ');
}

/**
 * A list of steps copied from a sheet, as it is typed: one kvar a line, or number and kvar of equal steps.
 * Lines without digits are heads. A single line comes back as it is.
 */
export function stepsFromLines(text: string): string {
  const lines = text.split(/\r?\n/).filter((line) => /\d/.test(line));
  if (lines.length < 2 && !text.trim().includes('\t')) return text.trim();
  const groups = lines.map((line) =>
    line
      .split('\t')
      .map((cell) => cell.trim())
      .filter((cell) => cell !== ''),
  );
  return groups
    .map(([first = '', second]) => (second === undefined ? first : `${first} × ${second}`))
    .join('; ');
}
