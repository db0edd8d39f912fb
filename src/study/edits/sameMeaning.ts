import { busById, homeBusOf } from '../lookup.ts';
import type { Bank, Converter, ElementKind, Filter, Load, Motor, Study, StudyElement } from '../types.ts';
import { withDefaults } from '../withDefaults.ts';
import type { Patch } from './edit.ts';

/** What a field means beyond its kind. Two fields of one meaning carry a value from one kind to the other. */
type Meaning =
  | 'voltage behind the impedance'
  | 'angle of the source'
  | 'earthed neutral'
  | 'active power'
  | 'cos φ at the line'
  | 'cos φ of the machine'
  | 'leading'
  | 'phases'
  | 'loss per kvar'
  | 'star or delta'
  | 'series inductance'
  | 'series resistance';

const meanings: { readonly [K in ElementKind]?: Readonly<Record<string, readonly Meaning[]>> } = {
  supply: {
    setpointPercent: ['voltage behind the impedance'],
    angleDeg: ['angle of the source'],
    neutral: ['earthed neutral'],
  },
  generator: {
    setpointPercent: ['voltage behind the impedance'],
    angleDeg: ['angle of the source'],
    neutral: ['earthed neutral'],
  },
  // A motor's cos φ stays behind when a drive takes its place: the line then sees the bridge's.
  load: {
    kW: ['active power'],
    powerFactor: ['cos φ at the line', 'cos φ of the machine'],
    leading: ['leading'],
    connection: ['phases'],
  },
  converter: {
    kW: ['active power'],
    powerFactor: ['cos φ at the line'],
    leading: ['leading'],
    connection: ['phases'],
  },
  motor: { powerFactor: ['cos φ of the machine'] },
  bank: { lossWPerKvar: ['loss per kvar'], connection: ['star or delta'] },
  filter: { lossWPerKvar: ['loss per kvar'], connection: ['star or delta'] },
  reactor: { inductanceMH: ['series inductance'], resistanceOhm: ['series resistance'] },
  branch: { inductanceMH: ['series inductance'], resistanceOhm: ['series resistance'] },
};

/** The field of another kind that means the same as a field of this one, or undefined. */
export function sameField(from: ElementKind, key: string, to: ElementKind): string | undefined {
  const meant = meanings[from]?.[key] ?? [];
  return Object.entries(meanings[to] ?? {}).find(([, own]) => own.some((item) => meant.includes(item)))?.[0];
}

/**
 * Values another kind gets by calculation because the same quantity is put differently there: a motor's
 * shaft power and the active power it draws, P = P_N·n·(load/100)/η; a bank's rated kvar and the net kvar at
 * the busbar, Q = Q_N·(U/U_N)²/(1 − p). Three digits. Empty where nothing answers.
 */
export function convertedValues(study: Study, element: StudyElement, to: ElementKind, typical: Patch): Patch {
  const nominalV = busById(study, homeBusOf(element))?.nominalV;
  if (element.kind === 'motor' && (to === 'load' || to === 'converter'))
    return { kW: threeDigits(drawnKW(study, element)) };
  if ((element.kind === 'load' || element.kind === 'converter') && to === 'motor')
    return element.kW > 0 ? { ratedKW: threeDigits(shaftKW(study, element)) } : {};
  if (nominalV === undefined) return {};
  if (element.kind === 'bank' && to === 'filter') {
    const net = netKvar(element, nominalV);
    return net > 0 ? { kvar: threeDigits(net) } : {};
  }
  if (element.kind === 'filter' && to === 'bank' && typeof typical.ratedV === 'number')
    return { steps: [{ kvar: threeDigits(ratedKvar(element, nominalV, typical.ratedV)) }] };
  return {};
}

function drawnKW(study: Study, motor: Motor): number {
  const { ratedKW, count, loadPercent, efficiency } = withDefaults(motor, study);
  return (ratedKW * count * loadPercent) / 100 / efficiency;
}

/** Of one motor at the usual load that draws what the load or drive drew. */
function shaftKW(study: Study, { kW, bus }: Load | Converter): number {
  const usual: Motor = { id: '', kind: 'motor', bus, ratedKW: 1 };
  return kW / drawnKW(study, usual);
}

function netKvar(bank: Bank, nominalV: number): number {
  const rated = bank.steps.reduce((sum, step) => sum + (step.on === false ? 0 : step.kvar), 0);
  return (rated * (nominalV / bank.ratedV) ** 2) / (1 - (bank.detuningPercent ?? 0) / 100);
}

function ratedKvar(filter: Filter, nominalV: number, ratedV: number): number {
  return filter.kvar * (ratedV / nominalV) ** 2;
}

function threeDigits(value: number): number {
  return Number(value.toPrecision(3));
}
