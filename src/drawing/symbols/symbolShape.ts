import type { ElementKind, StudyElement, SymbolSet } from '../../study/index.ts';
import { bankShape, filterShape } from './capacitors.ts';
import { iecElements, ieeeElements } from './elementary.ts';
import { freeRlcBranch, freeRlcShunt } from './freeRlc.ts';
import { iecCoupler, iecShapes } from './iec60617.ts';
import { ieeeCoupler, ieeeShapes } from './ieee315.ts';
import type { SymbolShape } from './primitives.ts';

export type { SymbolShape } from './primitives.ts';

/** What a symbol shows of a part: its kind and the few data that change the shape. */
export type SymbolSubject = Pick<StudyElement, 'kind'> & Partial<StudyElement>;

const SETS = {
  iec60617: { elements: iecElements, shapes: iecShapes, coupler: iecCoupler },
  ieee315: { elements: ieeeElements, shapes: ieeeShapes, coupler: ieeeCoupler },
};

/**
 * The symbol of a part after the shapes of IEC 60617 or IEEE Std 315: a plain list of paths, circles and
 * letters, for the screen and the results sheet alike. Conductors meet it at (0, ±reach); a supply's conductor
 * leaves at the bottom. A coupler is drawn closed unless out of service; an earth stands only where a star
 * point or a neutral is connected.
 */
export function symbolShape(subject: SymbolSubject, symbols: SymbolSet = 'iec60617'): SymbolShape {
  const { elements, shapes, coupler } = SETS[symbols];
  switch (subject.kind) {
    case 'coupler':
      return coupler(subject.on !== false);
    case 'bank':
      return bankShape(elements, subject.connection ?? 'delta', (subject.detuningPercent ?? 0) > 0);
    case 'filter':
      return filterShape(elements, subject.type ?? 'single-tuned', subject.connection ?? 'delta');
    case 'branch':
      return freeRlcBranch(elements, subject);
    case 'shunt':
      return freeRlcShunt(elements, subject);
    default:
      return shapes[subject.kind];
  }
}

/** The same by kind, with the part's data where there is a part. */
export function symbolPaths(kind: ElementKind, element?: StudyElement, symbols?: SymbolSet): SymbolShape {
  return symbolShape(element?.kind === kind ? element : ({ kind } as SymbolSubject), symbols);
}
