import type { BankStep } from '../types.ts';
import { parseQuantity } from './parseQuantity.ts';

export type ParsedSteps = { ok: true; steps: BankStep[] } | { ok: false; error: string };

const mostSteps = 60;

/**
 * Steps as they are spoken of: "6x25", "2 × 12.5 + 5 × 25", "25; 25; 50". Kvar at the rated voltage; every
 * step is on. An error is a sentence.
 */
export function parseSteps(text: string): ParsedSteps {
  const groups = text
    .split(/[+;]| {2,}/)
    .map((group) => group.trim())
    .filter((group) => group !== '');
  if (groups.length === 0) return { ok: false, error: 'Give the steps, such as 6x25 or 2x12.5 + 4x25.' };
  const steps: BankStep[] = [];
  for (const group of groups) {
    const match = /^(\d+)\s*[x×*]\s*(.+)$/i.exec(group);
    const count = match ? Number(match[1]) : 1;
    const kvar = parseQuantity(match?.[2] ?? group, 'kvar');
    if (!kvar.ok) return { ok: false, error: `"${group}" is no group of steps: ${kvar.error}` };
    if (kvar.value <= 0)
      return { ok: false, error: `A step of ${kvar.value} kvar is not possible; give more than 0 kvar.` };
    if (count < 1 || steps.length + count > mostSteps)
      return { ok: false, error: `Give between 1 and ${mostSteps} steps in all.` };
    for (let index = 0; index < count; index += 1) steps.push({ kvar: kvar.value });
  }
  return { ok: true, steps };
}

/** Steps in the same words: "6 × 25", "2 × 12.5 + 4 × 25"; equal neighbours are gathered. */
export function stepsText(steps: readonly BankStep[]): string {
  const groups: { kvar: number; count: number }[] = [];
  for (const { kvar } of steps) {
    const last = groups.at(-1);
    if (last?.kvar === kvar) last.count += 1;
    else groups.push({ kvar, count: 1 });
  }
  return groups.map(({ kvar, count }) => (count === 1 ? String(kvar) : `${count} × ${kvar}`)).join(' + ');
}
