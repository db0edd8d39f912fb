import type { Bank } from '../study/index.ts';
import { isOn, nameOf } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { kvarOn } from './correctionBranch.ts';
import { figure } from './figure.ts';
import { stepSums } from './stepSums.ts';

/** What the banks other than the one searched are set to. */
export interface BankSettings {
  /** Kvar on by bank id; banks in `out` have none. */
  kvar: ReadonlyMap<string, number>;
  out: ReadonlySet<string>;
  /** "" or ", C2 at 100 kvar": appended to a sentence. */
  words: string;
  asInCase: boolean;
}

/** Each setting costs one scan of the network, so their number is held to this. */
const SETTING_CAP = 36;

/** Every combination of the other banks in service, off included; thinned above the cap, and said so. */
export function otherBankSettings(
  context: CheckContext,
  bankId: string,
): { settings: BankSettings[]; remarks: string[] } {
  const others = context.study.elements.filter(
    (part): part is Bank => part.kind === 'bank' && isOn(part) && part.id !== bankId,
  );
  const whole = others.map((bank) => [0, ...stepSums(bank.steps).kvar]);
  const count = whole.reduce((product, values) => product * values.length, 1);
  if (count <= SETTING_CAP) return { settings: combinations(others, whole), remarks: [] };
  const few = others.map((bank) => unique([kvarOn(bank), 0, total(bank)]));
  const fewCount = few.reduce((product, values) => product * values.length, 1);
  const settings = fewCount <= SETTING_CAP ? combinations(others, few) : together(others);
  const how =
    fewCount <= SETTING_CAP
      ? 'each off, as in this case and fully on'
      : 'all off, all as in this case, all fully on';
  return {
    settings,
    remarks: [
      `The other banks have ${count} step combinations together; searched were ${settings.length} of them (${how}).`,
    ],
  };
}

const total = (bank: Bank): number => bank.steps.reduce((sum, step) => sum + step.kvar, 0);
const unique = (values: number[]): number[] => [...new Set(values)];

function combinations(banks: readonly Bank[], values: readonly number[][]): BankSettings[] {
  let rows: number[][] = [[]];
  for (const list of values) rows = rows.flatMap((row) => list.map((value) => [...row, value]));
  return rows.map((row) => setting(banks, row));
}

function together(banks: readonly Bank[]): BankSettings[] {
  return [banks.map(kvarOn), banks.map(() => 0), banks.map(total)].map((row) => setting(banks, row));
}

function setting(banks: readonly Bank[], row: readonly number[]): BankSettings {
  const kvar = new Map<string, number>();
  const out = new Set<string>();
  const words: string[] = [];
  let asInCase = true;
  banks.forEach((bank, index) => {
    const value = row[index] ?? 0;
    if (value > 0) kvar.set(bank.id, value);
    else out.add(bank.id);
    words.push(`, ${nameOf(bank)} at ${figure(value)} kvar`);
    if (Math.abs(value - kvarOn(bank)) > 1e-6) asInCase = false;
  });
  return { kvar, out, words: words.join(''), asInCase };
}
