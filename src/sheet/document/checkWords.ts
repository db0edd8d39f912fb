import type { Verdict } from '../../checks/index.ts';

/** Heading of a check on the sheet where its verdicts' titles differ, e.g. by order. */
const WORDS: Record<string, string> = {
  'bus-order': 'harmonic voltages by order',
  'pcc-order': 'harmonic currents at the PCC by order',
};

/** What a check is called over the list of its verdicts. */
export function checkWords(check: string, verdicts: readonly Verdict[]): string {
  const titles = [...new Set(verdicts.map(({ title }) => title))];
  const [only] = titles;
  return WORDS[check] ?? (titles.length === 1 && only ? only : check.replaceAll('-', ' '));
}

/** Verdicts by check, in the order of their smallest margin; checks without any margin last. */
export function byCheck(verdicts: readonly Verdict[]): { check: string; verdicts: Verdict[] }[] {
  const groups = new Map<string, Verdict[]>();
  for (const verdict of verdicts) groups.set(verdict.check, [...(groups.get(verdict.check) ?? []), verdict]);
  const least = (list: readonly Verdict[]): number =>
    Math.min(Number.MAX_VALUE, ...list.flatMap(({ margin }) => (margin === null ? [] : [margin])));
  return [...groups]
    .map(([check, list]) => ({ check, verdicts: list }))
    .sort((a, b) => least(a.verdicts) - least(b.verdicts) || (a.check < b.check ? -1 : 1));
}
