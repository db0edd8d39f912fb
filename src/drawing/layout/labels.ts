import { type Bus, nameOf, type Study, type StudyElement } from '../../study/index.ts';
import { BUS_READING, LEAF_READING, SIDE_READING } from './measures.ts';
import { nameplate, nominalVoltage } from './nameplate.ts';
import { textWidth } from './textWidth.ts';

const ONE_LINE_LIMIT = 200;
const GAP = 8;

export interface SideLabel {
  width: number;
  oneLine: boolean;
}

/** Text beside a part that leads on or feeds: name and plate on one line where that stays short. */
export function sideLabel(part: StudyElement, study: Study): SideLabel {
  const name = textWidth(nameOf(part), undefined, true);
  const plate = textWidth(nameplate(part, study));
  const oneLine = part.kind !== 'supply' && part.kind !== 'generator' && name + GAP + plate <= ONE_LINE_LIMIT;
  return { oneLine, width: Math.max(SIDE_READING, oneLine ? name + GAP + plate : Math.max(name, plate)) };
}

/** Width of the text under a hanging part. */
export function leafLabelWidth(part: StudyElement, study: Study): number {
  return Math.max(LEAF_READING, textWidth(nameOf(part), undefined, true), textWidth(nameplate(part, study)));
}

/** Width of a busbar's line: name, nominal voltage, live volts. */
export function busLabelWidth(bus: Bus): number {
  const name = textWidth(nameOf(bus), undefined, true);
  return name + GAP + textWidth(nominalVoltage(bus.nominalV)) + GAP + BUS_READING;
}
