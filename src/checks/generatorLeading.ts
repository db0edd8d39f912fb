import type { Generator } from '../study/index.ts';
import { isOn } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { figure } from './figure.ts';
import { partRow } from './partRow.ts';
import type { Verdict } from './types.ts';
import { judged } from './verdict.ts';

const LIMIT = 0.1;

/**
 * Kvar pushed into a generator (generator-leading): Q/S_N ≤ 0.10, common practice where the machine's
 * capability curve is not at hand. One row for each generator in service, in each case.
 */
export function generatorLeading(context: CheckContext): Verdict[] {
  return context.study.elements.flatMap((part) =>
    part.kind === 'generator' && isOn(part) ? atGenerator(context, part) : [],
  );
}

/** Q into the machine at the fundamental, kvar: above zero it runs under-excited. */
function kvarInto(context: CheckContext, generator: Generator, terminal: number): number {
  const { voltage, current, maxOrder } = context.solved.solution;
  const at = context.solved.bus(generator.bus) * maxOrder * 3;
  const from = terminal * maxOrder * 3;
  let vars = 0;
  for (let k = 0; k < 3; k++)
    vars +=
      (voltage.im[at + k] ?? 0) * (current.re[from + k] ?? 0) -
      (voltage.re[at + k] ?? 0) * (current.im[from + k] ?? 0);
  return vars / 1000;
}

function atGenerator(context: CheckContext, generator: Generator): Verdict[] {
  const terminal = context.solved.terminal(generator.id, generator.bus);
  if (terminal === undefined || !context.solved.energised(generator.bus)) return [];
  const kvar = Math.max(0, kvarInto(context, generator, terminal));
  const value = kvar / generator.ratedKVA;
  const row = partRow(context, generator.id, {
    check: 'generator-leading',
    title: 'leading kvar into the generator',
    unit: 'p.u.',
  });
  return [
    judged({
      ...row,
      value,
      limit: LIMIT,
      working: [
        {
          equation: 'Q / S_N into the machine',
          numbers: `${figure(kvar)} kvar / ${figure(generator.ratedKVA)} kVA = ${figure(value)}`,
        },
      ],
      remarks: [
        "The maker's capability curve prevails; judge the smallest load the machine may run at.",
        ...(context.correction.size > 0
          ? ['An interlock that takes the banks off on generator supply is customary.']
          : []),
      ],
      mend: 'Interlock the banks off on generator supply, or leave in fewer steps than the load draws.',
    }),
  ];
}
