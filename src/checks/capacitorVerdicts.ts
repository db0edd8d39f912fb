import type { Study } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { type CapacitorDuty, capacitorDuty } from './capacitorDuty.ts';
import { angleRemarks } from './distortion.ts';
import { figure } from './figure.ts';
import { highestSupply } from './highestSupply.ts';
import {
  capacitorCurrentLimit,
  capacitorKvarLimit,
  capacitorPeakLimit,
  capacitorVoltageLimit,
} from './limits/capacitorLimit.ts';
import { capacitorSetFor } from './limits/choice.ts';
import type { LimitSet } from './limits/types.ts';
import { noLimitSet } from './source.ts';
import type { Verdict } from './types.ts';
import { judged, type LazyRow, type Row, unknown } from './verdict.ts';

/** A set of three equal capacitors and the current through each unit, by order. */
export interface CapacitorUnits {
  id: string;
  /** "bank" or "filter capacitor": begins the titles. */
  words: string;
  /** Check ids; a filter's rows all belong to filter-duty. */
  checks: { current: string; voltage: string; kvar: string };
  /** As it really is in the state judged. */
  xcOhm: number;
  ratedV: number;
  /** Of the nameplate, three-phase. */
  ratedKvar: number;
  amperes: readonly (readonly number[])[];
  orderCount: number;
}

function unitWith(duties: readonly CapacitorDuty[], of: (duty: CapacitorDuty) => number): CapacitorDuty {
  const worst = [...duties].sort((a, b) => of(b) - of(a))[0];
  if (!worst) throw new RangeError('no capacitor units: three are needed');
  return worst;
}

/** Orders of unknown mutual phase at which the units carry current worth naming (0.1 % of rated). */
function unknownOrders(context: CheckContext, units: CapacitorUnits, ratedA: number): number[] {
  const orders: number[] = [];
  for (let h = 2; h <= units.orderCount; h++) {
    const carries = units.amperes.some((unit) => (unit[h - 1] ?? 0) > 1e-3 * ratedA);
    if (carries && context.solved.anglesUnknown(h)) orders.push(h);
  }
  return orders;
}

interface Prepared {
  set: LimitSet;
  row: (check: string, title: string, part?: string) => LazyRow;
  duties: CapacitorDuty[];
  raised: CapacitorDuty[];
  remarks: () => string[];
  supplyRemark: string;
}

function prepare(context: CheckContext, units: CapacitorUnits, set: LimitSet): Prepared {
  const duties = units.amperes.map((unit) => capacitorDuty(unit, units.xcOhm, units.ratedV, units.ratedKvar));
  const highest = highestSupply(context.actualStudy);
  const raised = units.amperes.map((unit) => {
    const scaled = [...unit];
    scaled[0] = (scaled[0] ?? 0) * highest.factor;
    return capacitorDuty(scaled, units.xcOhm, units.ratedV, units.ratedKvar);
  });
  const ratedA = duties[0]?.ratedA ?? 0;
  const remarks = (): string[] => [
    ...angleRemarks(context.solved, unknownOrders(context, units, ratedA)),
    ...(set.capacitor?.remark ? [set.capacitor.remark] : []),
  ];
  return {
    set,
    duties,
    raised,
    remarks,
    supplyRemark: highest.remark,
    row: (check, title, part) => ({
      check,
      title,
      subject: { kind: 'element', id: units.id },
      caseId: context.caseId,
      unit: 'p.u.',
      source: noLimitSet,
      working: [],
      remarks,
      ...(part === undefined ? {} : { part }),
    }),
  };
}

function mendDuty(units: CapacitorUnits): string {
  return units.checks.current === 'filter-duty'
    ? 'Choose a filter of more kvar or capacitors of a higher rated voltage, and see which other sources and how much supply distortion it takes up.'
    : 'Detune the bank below the lowest present order, move its steps away from the resonance, or choose capacitors of a higher rated voltage.';
}

/** Continuous duty is designed to U_N; a watched value is given room of a tenth. */
function mendVoltage(rmsV: number, ratedV: number, limit: number): string {
  const neededV = rmsV > limit * ratedV ? rmsV : rmsV / (0.9 * limit);
  return `Choose capacitors rated for at least ${figure(Math.max(neededV, rmsV), 3)} V, with the kvar they give at the busbar's voltage kept; a reactor in series raises the capacitor's voltage.`;
}

/** I_rms/I_N, U_C,rms/U_N, crest and kvar of a set of capacitors against the study's capacitor limits. */
export function capacitorVerdicts(context: CheckContext, study: Study, units: CapacitorUnits): Verdict[] {
  const choice = capacitorSetFor(study, units);
  if (!('set' in choice)) return withoutSet(context, units, choice.missing);
  const prepared = prepare(context, units, choice.set);
  return [
    currentVerdict(units, prepared),
    voltageVerdict(context, units, prepared),
    peakVerdict(units, prepared),
    kvarVerdict(units, prepared),
  ];
}

/** The rows that a known set would judge, each without a verdict. */
function withoutSet(context: CheckContext, units: CapacitorUnits, missing: string): Verdict[] {
  return (['current', 'voltage', 'kvar'] as const).map((quantity) => {
    const check = units.checks[quantity];
    const part = partOf(check, quantity);
    const row: Row = {
      check,
      title: `${units.words} ${quantity}`,
      subject: { kind: 'element', id: units.id },
      caseId: context.caseId,
      unit: 'p.u.',
      source: noLimitSet,
      working: [],
      ...(part === undefined ? {} : { part }),
    };
    return unknown(row, missing);
  });
}

const partOf = (check: string, part: string): string | undefined =>
  check === 'filter-duty' ? part : undefined;

function currentVerdict(units: CapacitorUnits, { set, row, duties }: Prepared): Verdict {
  const check = units.checks.current;
  const base = row(check, `${units.words} current`, partOf(check, 'current'));
  const duty = unitWith(duties, (unit) => unit.rmsA);
  const limit = capacitorCurrentLimit(set);
  const value = duty.rmsA / duty.ratedA;
  if (!limit) return unknown(base, `${set.label} holds no capacitor limits; choose another set`, value);
  return judged({
    ...base,
    value,
    limit: limit.value,
    source: limit.source,
    working: () => [
      {
        equation: 'I_N = Q_N / (√3 · U_N)',
        numbers: `${figure(duty.ratedKvar)} kvar / (√3 · ${figure(duty.ratedV)} V) = ${figure(duty.ratedA)} A`,
      },
      {
        equation: 'I_rms / I_N = √(Σ I_h²) / I_N, worst unit',
        numbers: `${figure(duty.rmsA)} A / ${figure(duty.ratedA)} A = ${figure(value)}`,
      },
    ],
    mend: () => mendDuty(units),
  });
}

function voltageVerdict(
  context: CheckContext,
  units: CapacitorUnits,
  { set, row, raised, remarks, supplyRemark }: Prepared,
): Verdict {
  const check = units.checks.voltage;
  const base = row(check, `${units.words} voltage`, partOf(check, 'voltage'));
  const duty = unitWith(raised, (unit) => unit.rmsV);
  const limit = capacitorVoltageLimit(set, context.hoursPerDay);
  const value = duty.rmsV / duty.ratedV;
  if (!limit) return unknown(base, `${set.label} holds no capacitor limits; choose another set`, value);
  return judged({
    ...base,
    value,
    limit: limit.value,
    source: limit.source,
    working: () => [
      {
        equation: 'U_C,1 = √3 · I_1 · Xc',
        numbers: `${figure(duty.fundamentalV)} V across the capacitor itself (line-to-line equivalent)`,
      },
      {
        equation: 'U_C,rms / U_N = √(Σ (√3 · I_h · Xc/h)²) / U_N',
        numbers: `${figure(duty.rmsV)} V / ${figure(duty.ratedV)} V = ${figure(value)}, allowed ${figure(limit.value)} for ${limit.row.words} (this case: ${figure(context.hoursPerDay)} h a day)`,
      },
    ],
    remarks: () => [...remarks(), supplyRemark],
    mend: () => mendVoltage(duty.rmsV, duty.ratedV, limit.value),
  });
}

function peakVerdict(units: CapacitorUnits, { set, row, raised, remarks, supplyRemark }: Prepared): Verdict {
  const base = row(units.checks.voltage, `${units.words} peak voltage`, 'peak');
  const duty = unitWith(raised, (unit) => unit.peakV);
  const limit = capacitorPeakLimit(set);
  const value = duty.peakV / duty.ratedV;
  if (!limit) return unknown(base, `${set.label} holds no limit of the crest; choose another set`, value);
  return judged({
    ...base,
    value,
    limit: limit.value,
    source: limit.source,
    working: () => [
      {
        equation: 'Û_C / (√2 · U_N) = Σ U_C,h / U_N',
        numbers: `${figure(duty.peakV)} V / ${figure(duty.ratedV)} V = ${figure(value)}`,
      },
    ],
    remarks: () => [
      ...remarks(),
      supplyRemark,
      'The crests of all orders are taken to coincide, the safe side.',
    ],
    mend: () => mendDuty(units),
  });
}

function kvarVerdict(units: CapacitorUnits, { set, row, duties }: Prepared): Verdict {
  const check = units.checks.kvar;
  const base = row(check, `${units.words} kvar`, partOf(check, 'kvar'));
  const duty = unitWith(duties, (unit) => unit.kvarSum);
  const limit = capacitorKvarLimit(set);
  const value = duty.kvarSum / duty.ratedKvar;
  if (!limit) return unknown(base, `${set.label} holds no limit of the kvar; choose another set`, value);
  return judged({
    ...base,
    value,
    limit: limit.value,
    source: limit.source,
    working: () => [
      {
        equation: 'Σ √3 · U_C,h · I_h / Q_N',
        numbers: `${figure(duty.kvarSum)} kvar / ${figure(duty.ratedKvar)} kvar = ${figure(value)}`,
      },
      {
        equation: '√3 · U_C,rms · I_rms / Q_N, the conservative convention',
        numbers: `${figure(duty.kvarProduct)} kvar / ${figure(duty.ratedKvar)} kvar = ${figure(duty.kvarProduct / duty.ratedKvar)}`,
      },
    ],
    mend: () => mendDuty(units),
  });
}
