import {
  type Bus,
  type DrawnItem,
  drawnOf,
  nameOf,
  type Study,
  type StudyElement,
} from '../../study/index.ts';
import {
  BUS_LETTERS,
  BUS_MARK_ROOM,
  BUS_NAME_LIMIT,
  BUS_READING,
  CELL_GAP,
  CELL_WIDTH,
  DIAL_ROOM,
  LEAF_LIMIT,
  LINE_PX,
  SIDE_LIMIT,
} from './measures.ts';
import { nominalVoltage, widestNameplate } from './nameplate.ts';
import { platesInCases } from './plateInCase.ts';
import { readingRoom } from './readingRoom.ts';
import { textWidth } from './textWidth.ts';
import type { PartText } from './types.ts';
import { twoLineWidth, wrapWords } from './wrapWords.ts';

const GAP = 6;
/** Columns of hanging parts grow by this step, so that their pitch stays regular. */
const WIDTH_STEP = 4;

/** A part's lines of text and the room they take. */
export interface TextPlan extends PartText {
  width: number;
  height: number;
}

/** A busbar's name and the room of its plate, the dial's included. */
export interface PlatePlan {
  name: string;
  nameWidth: number;
  width: number;
}

/** Text plans of a study, each part measured once. */
export interface TextPlans {
  drawn: ReadonlySet<DrawnItem>;
  /** Centred under a hanging part or a tie. */
  under(part: StudyElement): TextPlan;
  /** Beside a part that leads on or feeds. */
  beside(part: StudyElement): TextPlan;
  plate(bus: Bus): PlatePlan;
}

/** `tall`: parts that lead on from a busbar with hanging parts; their text stands in one column beside those. */
export function textPlans(study: Study, tall: ReadonlySet<StudyElement>): TextPlans {
  const drawn = drawnOf(study);
  const under = new Map<StudyElement, TextPlan>();
  const beside = new Map<StudyElement, TextPlan>();
  const plates = new Map<Bus, PlatePlan>();
  return {
    drawn,
    under: (part) => remembered(under, part, () => leafText(part, study, drawn)),
    beside: (part) => remembered(beside, part, () => sideText(part, study, drawn, tall.has(part))),
    plate: (bus) => remembered(plates, bus, () => platePlan(bus, drawn)),
  };
}

function remembered<K, V>(known: Map<K, V>, key: K, find: () => V): V {
  const standing = known.get(key);
  if (standing !== undefined) return standing;
  const found = find();
  known.set(key, found);
  return found;
}

/** Every nameplate the part has, in the base study and in the cases that change it; none where none are drawn. */
function platesOf(part: StudyElement, study: Study, drawn: ReadonlySet<DrawnItem>): readonly string[] {
  if (!drawn.has('nameplates')) return [];
  return [widestNameplate(part, study), ...(platesInCases(study).get(part.id) ?? [])];
}

function leafText(part: StudyElement, study: Study, drawn: ReadonlySet<DrawnItem>): TextPlan {
  const plates = platesOf(part, study, drawn);
  const wished = Math.max(
    CELL_WIDTH,
    twoLineWidth(nameOf(part), true),
    ...plates.map((plate) => twoLineWidth(plate)),
  );
  const width = Math.min(LEAF_LIMIT, Math.ceil(wished / WIDTH_STEP) * WIDTH_STEP);
  return planned(part, plates, width, 1, 'middle', drawn);
}

function sideText(part: StudyElement, study: Study, drawn: ReadonlySet<DrawnItem>, tall: boolean): TextPlan {
  const plates = platesOf(part, study, drawn);
  const columns = !tall && readingRoom(part, drawn) > 1 ? 2 : 1;
  const cells = columns * CELL_WIDTH + (columns - 1) * CELL_GAP;
  const name = columns === 1 ? twoLineWidth(nameOf(part), true) : textWidth(nameOf(part), undefined, true);
  const wished = Math.max(name, ...plates.map((plate) => twoLineWidth(plate)));
  const width = Math.max(cells, Math.min(SIDE_LIMIT, Math.ceil(wished)));
  return planned(part, plates, width, columns, 'start', drawn);
}

function planned(
  part: StudyElement,
  plates: readonly string[],
  width: number,
  columns: 1 | 2,
  align: PartText['align'],
  drawn: ReadonlySet<DrawnItem>,
): TextPlan {
  const name = wrapWords(nameOf(part), width, 2, true);
  const plateLines = Math.max(0, ...plates.map((plate) => wrapWords(plate, width, 2).length));
  const readings = readingRoom(part, drawn);
  const lines = name.length + plateLines + Math.ceil(readings / columns);
  return {
    align,
    name,
    plateLines,
    readings,
    columns,
    width,
    height: lines * LINE_PX,
  };
}

function platePlan(bus: Bus, drawn: ReadonlySet<DrawnItem>): PlatePlan {
  const [name = ''] = wrapWords(nameOf(bus), BUS_NAME_LIMIT, 1, true);
  const nameWidth = textWidth(name, undefined, true);
  const live = drawn.has('voltages') ? GAP + BUS_READING : 0;
  const text = Math.max(
    nameWidth + GAP + BUS_MARK_ROOM + BUS_LETTERS,
    textWidth(nominalVoltage(bus.nominalV)) + live,
  );
  return { name, nameWidth, width: Math.ceil(text + (drawn.has('dials') ? DIAL_ROOM : 0)) };
}
