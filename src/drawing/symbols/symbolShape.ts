import type { ElementKind, StarDelta, StudyElement } from '../../study/index.ts';
import { freeRlcBranch, freeRlcShunt } from './freeRlc.ts';
import { box, earth, type Primitive, path, plates, type SymbolShape, winding } from './primitives.ts';

/** What a symbol shows of a part: its kind and the few data that change the shape. */
export type SymbolSubject = Pick<StudyElement, 'kind'> & Partial<StudyElement>;

const shape = (reach: number, width: number, ...primitives: Primitive[]): SymbolShape => ({
  reach,
  width,
  primitives,
});

/** Delta triangle, star, or star with its point earthed, hanging from (0, y). */
function connectionMark(connection: StarDelta, y: number): Primitive[] {
  if (connection === 'delta') return [path(`M0,${y} L6.5,${y + 11} H-6.5 Z`)];
  const star = path(`M0,${y} v6 M0,${y + 6} l-6,5.5 M0,${y + 6} l6,5.5`);
  if (connection === 'star') return [star];
  return [star, path(`M0,${y + 6} h13 v3`), path(`M9,${y + 9} h8 M10.5,${y + 11.5} h5 M12,${y + 14} h2`)];
}

function bank(connection: StarDelta, detuned: boolean): SymbolShape {
  const marks = detuned
    ? [winding(0, -24, 3, 3), path('M0,-6 v2'), plates(0, -4, 13, 5.5), path('M0,1.5 v6')]
    : [path('M0,-24 V-9'), plates(0, -9, 14), path('M0,-3 V7.5')];
  return shape(24, 30, ...marks, ...connectionMark(connection, 7.5));
}

function filter(type: 'single-tuned' | 'high-pass' | 'c-type', connection: StarDelta): SymbolShape {
  const capacitor = [path('M0,-24 v5'), plates(0, -19, 11, 4.5)];
  const resistor = [path('M0,-12 H11 v3 M11,6 v3 H0'), box(8, -9, 6, 15)];
  const mark = connectionMark(connection, 9);
  if (type === 'single-tuned')
    return shape(24, 26, ...capacitor, path('M0,-14.5 v2.5'), winding(0, -12, 3, 3.5), ...mark);
  if (type === 'high-pass')
    return shape(
      24,
      30,
      ...capacitor,
      path('M0,-14.5 v5.5 M0,6 v3'),
      winding(0, -9, 3, 2.5),
      ...resistor,
      ...mark,
    );
  return shape(
    24,
    30,
    ...capacitor,
    path('M0,-14.5 v3.5 M0,-1 v2 M0,4.5 v4.5'),
    winding(0, -11, 2, 2.5),
    plates(0, 1, 5, 3.5),
    ...resistor,
    ...mark,
  );
}

const SINE = 'q2.5,-7 5,0 t5,0';

const FIXED: Record<
  'supply' | 'generator' | 'transformer' | 'cable' | 'reactor' | 'motor' | 'converter' | 'load',
  SymbolShape
> = {
  supply: shape(14, 28, path('M0,-20 V9 M-6,0 L0,9 L6,0'), {
    shape: 'path',
    d: 'M-14,14 H14',
    weight: 'bold',
  }),
  generator: shape(
    16,
    32,
    { shape: 'circle', cx: 0, cy: 0, r: 16 },
    { shape: 'letter', x: 0, y: 2, text: 'G', sizePx: 13 },
    path(`M-5,8 ${SINE}`),
  ),
  transformer: shape(
    21.5,
    28,
    { shape: 'circle', cx: 0, cy: -8, r: 13.5 },
    { shape: 'circle', cx: 0, cy: 8, r: 13.5 },
  ),
  cable: shape(16, 16, path('M0,-16 V16 M-7,4.5 L7,-8.5 M-7,9 L7,-4')),
  reactor: shape(20, 14, winding(0, -20, 4, 5)),
  motor: shape(
    16,
    32,
    { shape: 'circle', cx: 0, cy: 0, r: 16 },
    { shape: 'letter', x: 0, y: 5, text: 'M', sizePx: 14 },
  ),
  converter: shape(
    15,
    30,
    box(-15, -15, 30, 30),
    path('M-15,15 L15,-15'),
    path(`M-11,-5 ${SINE}`),
    path('M3,6 h8 M3,10 h8'),
  ),
  load: shape(17, 16, box(-8, -17, 16, 34)),
};

function coupler(closed: boolean): SymbolShape {
  const contacts: Primitive[] = [
    path('M0,-16 V-11 M0,11 V16'),
    { shape: 'circle', cx: 0, cy: -9, r: 2, fill: 'ink' },
    { shape: 'circle', cx: 0, cy: 9, r: 2, fill: 'ink' },
  ];
  return shape(16, 20, ...contacts, path(closed ? 'M0,9 V-9' : 'M0,9 L10,-9'));
}

/**
 * The symbol of a part after the shapes of IEC 60617, drawn by ourselves: a plain list of paths, circles
 * and letters, for the screen and the results sheet alike. Conductors meet it at (0, ±reach); a supply's
 * conductor leaves at the bottom. A coupler is drawn closed unless out of service; an earth stands only
 * where a star point or a neutral is connected.
 */
export function symbolShape(subject: SymbolSubject): SymbolShape {
  switch (subject.kind) {
    case 'coupler':
      return coupler(subject.on !== false);
    case 'bank':
      return bank(subject.connection ?? 'delta', (subject.detuningPercent ?? 0) > 0);
    case 'filter':
      return filter(subject.type ?? 'single-tuned', subject.connection ?? 'delta');
    case 'branch':
      return freeRlcBranch(subject);
    case 'shunt':
      return freeRlcShunt(subject, earth);
    default:
      return FIXED[subject.kind];
  }
}

/** The same by kind, with the part's data where there is a part. */
export function symbolPaths(kind: ElementKind, element?: StudyElement): SymbolShape {
  return symbolShape(element?.kind === kind ? element : ({ kind } as SymbolSubject));
}
