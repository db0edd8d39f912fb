import type { Verdict, VerdictWord } from '../../checks/index.ts';
import type { CaseSolution } from '../../engine/index.ts';
import {
  busesOf,
  type CaseDifference,
  drawnOf,
  fedBuses,
  nameOf,
  type Study,
  type StudyElement,
  type SymbolSet,
  symbolSetOf,
  withDefaults,
} from '../../study/index.ts';
import { nominalVoltage, plateInCase } from '../layout/index.ts';
import { type BusReading, busReading, type ImpedanceProbe } from './busReading.ts';
import { lineWidth } from './lineWidth.ts';
import { partReading, type ReadingCell } from './partReading.ts';
import type { ReadingMode } from './ReadingMode.ts';
import { isDeenergised } from './solutionView.ts';
import { worstVerdicts } from './worstVerdict.ts';

/** Everything about a part that the drawing shows and the layout does not decide. */
export interface PartFigure {
  element: StudyElement;
  name: string;
  plate: string;
  /** What the case shown has otherwise than the base study. */
  differences: readonly CaseDifference[];
  /** Live figures, each with its own place in the part's text. */
  cells: ReadingCell[];
  /** Said instead of figures: off, no step on. */
  words: string;
  /** Active power flows from its (first) busbar into the part, out of it, or not to speak of. */
  flow: -1 | 0 | 1;
  /** Conductor width by busbar id, px. */
  widths: Record<string, number>;
  mark: VerdictWord | undefined;
  /** The standard its symbol follows. */
  symbols: SymbolSet;
  /** Out of service. */
  off: boolean;
  /** In service at a busbar without voltage. */
  dead: boolean;
}

export interface BusFigure extends BusReading {
  name: string;
  plate: string;
  mark: VerdictWord | undefined;
  /** Without voltage in the case shown, and fed in the base study. */
  darkened: boolean;
}

export interface Figures {
  parts: Map<string, PartFigure>;
  buses: Map<string, BusFigure>;
}

/** The part with what its symbol depends on filled in: whether the neutral is connected. */
function symbolData(part: StudyElement, study: Study): StudyElement {
  if (part.kind !== 'shunt' || part.neutral !== undefined) return part;
  const bus = study.buses.find((b) => b.id === part.bus);
  return bus ? { ...part, neutral: withDefaults(part, bus).neutral } : part;
}

const NO_DIFFERENCES: readonly CaseDifference[] = [];

/** The base study beside a case, for what the case has otherwise. */
export interface BesideBase {
  base: Study;
  differences: ReadonlyMap<string, readonly CaseDifference[]>;
}

/** Readings, line widths and marks of a whole drawing. `study` is the study as it stands in the case shown. */
export function figuresOf(
  study: Study,
  solution: CaseSolution | null,
  verdicts: readonly Verdict[],
  mode: ReadingMode,
  handle: number,
  probe: ImpedanceProbe | null = null,
  beside: BesideBase = { base: study, differences: new Map() },
): Figures {
  const worst = worstVerdicts(verdicts);
  const drawn = drawnOf(study);
  const symbols = symbolSetOf(study);
  const readings = study.elements.map((part) => partReading(part, solution, mode, handle, drawn));
  const largest = Math.max(0, ...readings.flatMap((reading) => Object.values(reading.amperes)));
  const parts = new Map<string, PartFigure>();
  study.elements.forEach((part, at) => {
    const reading = readings[at] ?? { cells: [], words: '', amperes: {}, flow: 0 as const };
    const ends = busesOf(part);
    const differences = beside.differences.get(part.id) ?? NO_DIFFERENCES;
    const ampere = (bus: string) => (drawn.has('widths') ? (reading.amperes[bus] ?? null) : null);
    parts.set(part.id, {
      element: symbolData(part, study),
      name: nameOf(part),
      plate: drawn.has('nameplates') ? plateInCase(part, study, differences) : '',
      differences,
      cells: reading.cells,
      words: reading.words,
      flow: drawn.has('direction') ? reading.flow : 0,
      widths: Object.fromEntries(ends.map((bus) => [bus, lineWidth(ampere(bus), largest)])),
      mark: worst.get(`element:${part.id}`),
      symbols,
      off: part.on === false,
      dead: part.on !== false && solution !== null && ends.every((bus) => isDeenergised(solution, bus)),
    });
  });
  const buses = new Map<string, BusFigure>();
  const fed = solution?.deenergised.length ? fedBuses(beside.base) : null;
  for (const bus of study.buses) {
    const reading = busReading(bus, solution, mode, handle, probe);
    buses.set(bus.id, {
      name: nameOf(bus),
      plate: nominalVoltage(bus.nominalV),
      ...reading,
      // A busbar without voltage says so whatever is shown.
      ...(drawn.has('voltages') || reading.deenergised ? {} : { text: '', more: '' }),
      mark: worst.get(`bus:${bus.id}`),
      darkened: reading.deenergised && (fed?.has(bus.id) ?? false),
    });
  }
  return { parts, buses };
}
