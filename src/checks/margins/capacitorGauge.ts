import type { Bank, Bus, Filter, StarDelta, Study, StudyElement } from '../../study/index.ts';
import { busById, isOn, withDefaults } from '../../study/index.ts';
import type { CheckContext } from '../CheckContext.ts';
import { bankAdmittance, bankXc, filterAdmittance, filterXc, kvarOn } from '../correctionBranch.ts';
import { supplyRaise } from '../highestSupply.ts';
import {
  capacitorCurrentLimit,
  capacitorKvarLimit,
  capacitorPeakLimit,
  capacitorVoltageLimit,
} from '../limits/capacitorLimit.ts';
import { capacitorSetFor } from '../limits/choice.ts';
import type { SolvedCase } from '../SolvedCase.ts';
import { type Gauge, type GaugedState, type Measure, NOT_FORMED } from './Gauge.ts';

/** Duty of the capacitors of one bank or filter: current, voltage, crest and kvar. */
export function capacitorGauges(context: CheckContext, part: Bank | Filter): Gauge[] {
  const bus = busById(context.study, part.bus);
  const choice = capacitorSetFor(context.study, part);
  const alive = bus && isOn(part) && context.solved.terminal(part.id, part.bus) !== undefined;
  if (!alive || !('set' in choice) || !context.solved.energised(bus.id)) return [];
  const ratedKvar = part.kind === 'bank' ? kvarOn(part) : part.ratedV ** 2 / filterXc(part, bus) / 1000;
  if (!(ratedKvar > 0)) return [];
  const limits = [
    capacitorCurrentLimit(choice.set),
    capacitorVoltageLimit(choice.set, context.hoursPerDay),
    capacitorPeakLimit(choice.set),
    capacitorKvarLimit(choice.set),
  ].map((limit) => limit?.value ?? Number.POSITIVE_INFINITY);
  const connection = withDefaults(part, context.study).connection;
  const place = { part, bus, connection, ratedKvar };
  return [
    {
      measures: measuresOf(part),
      read(state, out, at) {
        const duty = worstDuty(state, place);
        for (let k = 0; k < 4; k++)
          out[at + k] =
            duty === null || limits[k] === Number.POSITIVE_INFINITY ? NOT_FORMED : 1 - duty[k]! / limits[k]!;
      },
    },
  ];
}

function measuresOf(part: Bank | Filter): Measure[] {
  const subject = { kind: 'element' as const, id: part.id };
  const keys =
    part.kind === 'bank'
      ? ['bank-current', 'bank-voltage', 'bank-voltage', 'bank-kvar']
      : ['filter-duty', 'filter-duty', 'filter-duty', 'filter-duty'];
  const parts = part.kind === 'bank' ? ['', '', '|peak', ''] : ['|current', '|voltage', '|peak', '|kvar'];
  return keys.map((check, k) => ({ key: `${check}|${part.id}${parts[k]}`, check, subject }));
}

interface Place {
  part: Bank | Filter;
  bus: Bus;
  connection: StarDelta;
  ratedKvar: number;
}

const duty = new Float64Array(4);

/** I_rms/I_N, U_C/U_N, Σ U_C,h/U_N and Σ √3·U_C,h·I_h/Q_N, each of its worst unit; see capacitorDuty. */
function worstDuty(state: GaugedState, { part, bus, connection, ratedKvar }: Place): Float64Array | null {
  const { solved, frequencyFactor } = state;
  const terminal = solved.terminal(part.id, part.bus);
  const real = partIn(state.actual, part.id);
  if (terminal === undefined || !real) return null;
  const laws = lawsOf(real, bus, frequencyFactor);
  if (!laws) return null;
  const ratedA = (ratedKvar * 1000) / (Math.sqrt(3) * part.ratedV);
  const index = solved.bus(bus.id);
  // The fundamental is raised to the highest supply voltage.
  const raised = supplyRaise(state.actual);
  duty.fill(0);
  for (let unit = 0; unit < 3; unit++) {
    let [squaresA, squaresV, peakV, kvar] = [0, 0, 0, 0];
    for (let h = 1; h <= solved.maxOrder; h++) {
      const a =
        connection === 'delta'
          ? (solved.lineVolts(index, h, unit) * laws.admittance(h)) / Math.sqrt(3)
          : solved.amperes(terminal, h, unit);
      const v = (Math.sqrt(3) * a * laws.xcOhm) / h;
      const highV = h === 1 ? v * raised : v;
      squaresA += a * a;
      squaresV += highV * highV;
      peakV += highV;
      kvar += (Math.sqrt(3) * v * a) / 1000;
    }
    duty[0] = Math.max(duty[0]!, Math.sqrt(squaresA) / ratedA);
    duty[1] = Math.max(duty[1]!, Math.sqrt(squaresV) / part.ratedV);
    duty[2] = Math.max(duty[2]!, peakV / part.ratedV);
    duty[3] = Math.max(duty[3]!, kvar / ratedKvar);
  }
  return duty;
}

interface Laws {
  /** At the actual fundamental. */
  xcOhm: number;
  /** |Y| at order h of the actual fundamental, siemens per star-equivalent phase. */
  admittance: (h: number) => number;
}

function lawsOf(real: Bank | Filter, bus: Bus, factor: number): Laws | null {
  if (real.kind === 'filter') {
    const size = filterAdmittance(real, bus);
    return { xcOhm: filterXc(real, bus) / factor, admittance: (h) => size(h * factor) };
  }
  const xc = bankXc(real);
  if (xc === null) return null;
  const branch = bankAdmittance(real, bus, kvarOn(real));
  return {
    xcOhm: xc / factor,
    admittance(h) {
      const { re, im } = branch(h * factor);
      return Math.sqrt(re * re + im * im);
    },
  };
}

/** A bank or filter of a study by id. */
export function partIn(study: Study, id: string): Bank | Filter | undefined {
  const isCorrection = (part: StudyElement): part is Bank | Filter =>
    part.kind === 'bank' || part.kind === 'filter';
  return study.elements.filter(isCorrection).find((part) => part.id === id);
}

/** √Σ I_h² of the heaviest phase of a terminal, amperes. */
export function heaviestRms(solved: SolvedCase, terminal: number): number {
  let worst = 0;
  for (let phase = 0; phase < 3; phase++) worst = Math.max(worst, solved.rmsAmperes(terminal, phase));
  return worst;
}
