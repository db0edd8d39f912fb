import { figure, stepSums } from '../../checks/index.ts';
import type { Bank, CaseChange, CaseRole, Study, StudyElement } from '../../study/index.ts';
import { isOn, nameOf } from '../../study/index.ts';
import { MOST_STATES, type StateFamilies } from './StateFamilies.ts';

/** One way a state may stand off its case; without words, as in the case. */
export interface Alternative {
  words: string;
  changes: CaseChange[];
  role?: CaseRole;
  /** The transformer taken out: a state only where its busbars stay fed. */
  out?: string;
}

/** More sums than states may be made: the count then says so, no sum is passed over unsaid. */
const SUMS_CAP = 2 * MOST_STATES;

const asInCase: Alternative = { words: '', changes: [] };

/** The choices of every family on a case's study, one list per independent choice, "as in the case" among them. */
export function alternativesOf(inCase: Study, families: StateFamilies): Alternative[][] {
  const on = inCase.elements.filter(isOn);
  return [
    ...(families.lightLoadPercent === null ? [] : [[asInCase, lightLoad(on, families.lightLoadPercent)]]),
    ...(families.weakSupply ? [weakSupply(on)] : []),
    ...(families.generator ? [onGenerator(inCase)] : []),
    ...(families.couplers ? inCase.elements.flatMap(couplerChoice) : []),
    ...(families.transformerOut ? [oneTransformerOut(on)] : []),
    ...(families.steps ? on.flatMap((part) => (part.kind === 'bank' ? [stepChoice(part)] : [])) : []),
  ].filter((choice) => choice.length > 1);
}

/** Every distinct kvar of a bank, off included; the first subset of steps that gives it stands for all. */
function stepChoice(bank: Bank): Alternative[] {
  const own = kvarOf(bank.steps);
  return [0, ...stepSums(bank.steps, SUMS_CAP).kvar].map((kvar) => {
    if (Math.abs(kvar - own) < 1e-6) return asInCase;
    const on = subsetOf(bank, kvar);
    const steps = bank.steps.map((step, k) => ({ ...step, on: on[k] === true }));
    const words = kvar === 0 ? `${nameOf(bank)} off` : `${nameOf(bank)} at ${figure(kvar)} kvar`;
    return { words, changes: [{ element: bank.id, set: { steps } }] };
  });
}

const kvarOf = (steps: Bank['steps']): number =>
  steps.reduce((sum, step) => (step.on === false ? sum : sum + step.kvar), 0);

/** Which steps are on for a sum: the last step either belongs to it or the steps before make it alone. */
function subsetOf({ steps }: Bank, kvar: number): boolean[] {
  const search = (count: number, rest: number): boolean[] | null => {
    if (Math.abs(rest) < 1e-6) return new Array<boolean>(steps.length).fill(false);
    const step = steps[count - 1];
    if (!step || rest < 0) return null;
    const without = search(count - 1, rest);
    if (without) return without;
    const found = search(count - 1, rest - step.kvar);
    if (found) found[count - 1] = true;
    return found;
  };
  const found = search(steps.length, kvar);
  if (!found) throw new RangeError(`no steps of ${steps.length} give ${kvar} kvar`);
  return found;
}

function weakSupply(on: readonly StudyElement[]): Alternative[] {
  const changes = on.flatMap((part) =>
    part.kind === 'supply' && part.shortCircuitMVAMin !== undefined
      ? [{ element: part.id, set: { shortCircuitMVA: part.shortCircuitMVAMin } }]
      : [],
  );
  return changes.length === 0 ? [asInCase] : [asInCase, { words: 'smallest fault level', changes }];
}

function onGenerator({ elements }: Study): Alternative[] {
  const generators = elements.filter((part) => part.kind === 'generator');
  const supplies = elements.filter((part) => part.kind === 'supply');
  if (generators.length === 0 || !supplies.some(isOn)) return [asInCase];
  const changes = [
    ...supplies.map(({ id }) => ({ element: id, set: { on: false } })),
    ...generators.map(({ id }) => ({ element: id, set: { on: true } })),
  ];
  return [asInCase, { words: 'on the generator', changes, role: 'generator' }];
}

function couplerChoice(part: StudyElement): Alternative[][] {
  if (part.kind !== 'coupler') return [];
  const words = `${nameOf(part)} ${isOn(part) ? 'open' : 'closed'}`;
  return [[asInCase, { words, changes: [{ element: part.id, set: { on: !isOn(part) } }] }]];
}

function oneTransformerOut(on: readonly StudyElement[]): Alternative[] {
  const transformers = on.filter((part) => part.kind === 'transformer');
  return [
    asInCase,
    ...transformers.map((part) => ({
      words: `${nameOf(part)} out`,
      changes: [{ element: part.id, set: { on: false } }],
      out: part.id,
    })),
  ];
}

/** Loads and drives by their kW, motors by their loading. */
function lightLoad(on: readonly StudyElement[], percent: number): Alternative {
  const share = percent / 100;
  const changes = on.flatMap((part): CaseChange[] => {
    if (part.kind === 'load' || part.kind === 'converter')
      return [{ element: part.id, set: { kW: part.kW * share } }];
    if (part.kind === 'motor')
      return [{ element: part.id, set: { loadPercent: (part.loadPercent ?? 100) * share } }];
    return [];
  });
  return { words: `loads at ${figure(percent)} %`, changes, role: 'light' };
}
