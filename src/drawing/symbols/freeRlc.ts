import type { Elementary } from './elementary.ts';
import { earth, type Primitive, path, type SymbolShape } from './primitives.ts';

export interface FreeRlcData {
  resistanceOhm?: number | undefined;
  inductanceMH?: number | undefined;
  capacitanceUF?: number | undefined;
  arrangement?: 'series' | 'parallel' | undefined;
  neutral?: boolean | undefined;
}

type Member = 'R' | 'L' | 'C';
const LENGTH: Record<Member, number> = { R: 14, L: 14, C: 4.5 };
const LEAD = 3;

/** Members that carry a value; without any (a tray entry) all three are shown. */
function members(data: FreeRlcData): Member[] {
  const present: Member[] = [];
  if (data.resistanceOhm !== undefined) present.push('R');
  if (data.inductanceMH !== undefined) present.push('L');
  if (data.capacitanceUF !== undefined) present.push('C');
  return present.length > 0 ? present : ['R', 'L', 'C'];
}

function drawMember(elements: Elementary, member: Member, x: number, y: number): Primitive {
  if (member === 'R') return elements.resistor(x, y, LENGTH.R);
  if (member === 'L') return elements.winding(x, y, 2, LENGTH.L / 4);
  return elements.capacitor(x, y, 8, LENGTH.C);
}

function inSeries(elements: Elementary, list: Member[], top: number, bottom: number): Primitive[] {
  const length = list.reduce((sum, member) => sum + LENGTH[member] + LEAD, -LEAD);
  let y = (top + bottom - length) / 2;
  const drawn: Primitive[] = [path(`M0,${top} V${y}`)];
  list.forEach((member, at) => {
    drawn.push(drawMember(elements, member, 0, y));
    y += LENGTH[member];
    if (at < list.length - 1) drawn.push(path(`M0,${y} v${LEAD}`));
    y += LEAD;
  });
  drawn.push(path(`M0,${y - LEAD} V${bottom}`));
  return drawn;
}

function inParallel(elements: Elementary, list: Member[], top: number, bottom: number): Primitive[] {
  const [upper, lower] = [top + 5, bottom - 5];
  const pitch = 18;
  const left = (-(list.length - 1) * pitch) / 2;
  const drawn: Primitive[] = [
    path(
      `M0,${top} V${upper} M${left},${upper} H${-left} M${left},${lower} H${-left} M0,${lower} V${bottom}`,
    ),
  ];
  list.forEach((member, at) => {
    const x = left + at * pitch;
    const y = (upper + lower - LENGTH[member]) / 2;
    drawn.push(path(`M${x},${upper} V${y} M${x},${y + LENGTH[member]} V${lower}`));
    drawn.push(drawMember(elements, member, x, y));
  });
  return drawn;
}

function free(elements: Elementary, data: FreeRlcData, top: number, bottom: number): Primitive[] {
  const draw = data.arrangement === 'parallel' ? inParallel : inSeries;
  return draw(elements, members(data), top, bottom);
}

/** R-L-C between two busbars. */
export function freeRlcBranch(elements: Elementary, data: FreeRlcData): SymbolShape {
  return { reach: 24, width: 44, primitives: free(elements, data, -24, 24) };
}

/** R-L-C to neutral: earthed at the foot, or ending in a star point that is not connected. */
export function freeRlcShunt(elements: Elementary, data: FreeRlcData): SymbolShape {
  const end: Primitive = data.neutral === false ? path('M0,20 l-6,6 M0,20 l6,6') : earth(0, 21);
  return { reach: 24, width: 44, primitives: [...free(elements, data, -24, 21), end] };
}
