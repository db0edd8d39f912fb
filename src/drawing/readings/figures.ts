import type { Verdict, VerdictWord } from '../../checks/index.ts';
import type { CaseSolution } from '../../engine/index.ts';
import { busesOf, nameOf, type Study, type StudyElement, withDefaults } from '../../study/index.ts';
import { nameplate, nominalVoltage } from '../layout/index.ts';
import { type BusReading, busReading, type ImpedanceProbe } from './busReading.ts';
import { lineWidth } from './lineWidth.ts';
import { partReading } from './partReading.ts';
import type { ReadingMode } from './ReadingMode.ts';
import { isDeenergised } from './solutionView.ts';
import { worstVerdicts } from './worstVerdict.ts';

/** Everything about a part that the drawing shows and the layout does not decide. */
export interface PartFigure {
  element: StudyElement;
  name: string;
  plate: string;
  /** Live readings, one figure or two to a line. */
  lines: string[];
  /** Conductor width by busbar id, px. */
  widths: Record<string, number>;
  mark: VerdictWord | undefined;
  /** Out of service. */
  off: boolean;
  /** In service at a busbar without voltage. */
  dead: boolean;
}

export interface BusFigure extends BusReading {
  name: string;
  plate: string;
  mark: VerdictWord | undefined;
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

/** Readings, line widths and marks of a whole drawing. `study` is the study as it stands in the case shown. */
export function figuresOf(
  study: Study,
  solution: CaseSolution | null,
  verdicts: readonly Verdict[],
  mode: ReadingMode,
  handle: number,
  probe: ImpedanceProbe | null = null,
): Figures {
  const worst = worstVerdicts(verdicts);
  const readings = study.elements.map((part) => partReading(part, solution, mode, handle));
  const largest = Math.max(0, ...readings.flatMap((reading) => Object.values(reading.amperes)));
  const parts = new Map<string, PartFigure>();
  study.elements.forEach((part, at) => {
    const reading = readings[at] ?? { lines: [], amperes: {} };
    const ends = busesOf(part);
    parts.set(part.id, {
      element: symbolData(part, study),
      name: nameOf(part),
      plate: nameplate(part, study),
      lines: reading.lines,
      widths: Object.fromEntries(
        busesOf(part).map((bus) => [bus, lineWidth(reading.amperes[bus] ?? null, largest)]),
      ),
      mark: worst.get(`element:${part.id}`),
      off: part.on === false,
      dead: part.on !== false && solution !== null && ends.every((bus) => isDeenergised(solution, bus)),
    });
  });
  const buses = new Map<string, BusFigure>();
  for (const bus of study.buses) {
    buses.set(bus.id, {
      name: nameOf(bus),
      plate: nominalVoltage(bus.nominalV),
      ...busReading(bus, solution, mode, handle, probe),
      mark: worst.get(`bus:${bus.id}`),
    });
  }
  return { parts, buses };
}

/** The readings as they stand in the part's text: three short lines below a symbol, two beside it. */
export function readingLines(figure: PartFigure, align: 'middle' | 'start'): string[] {
  const [first, ...rest] = figure.lines;
  if (align === 'middle' || first === undefined || rest.length < 2) return figure.lines;
  return [first, rest.join(' · ')];
}
