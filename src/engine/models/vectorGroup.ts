import { parseVectorGroup } from '../../study/index.ts';

/** Where a transformer gives zero-sequence current a path: through, to earth at one side, or nowhere. */
export type ZeroSequencePath = 'through' | 'hv' | 'lv' | 'none';

export interface Winding {
  /** Hours: LV lags HV by clock·30° in positive sequence, leads in negative. */
  clock: number;
  zeroPath: ZeroSequencePath;
}

/** Groups by their connection letters; every other one is open in zero sequence on both sides. */
const pathOfGroup: Readonly<Record<string, ZeroSequencePath>> = {
  YNyn: 'through',
  Dyn: 'lv',
  Dzn: 'lv',
  Yzn: 'lv',
  YNzn: 'lv',
  Yyn: 'lv',
  YNd: 'hv',
};

/**
 * Clock number and zero-sequence path of a vector group such as "Dyn11" (IEC 60076-1 designation).
 * RangeError when the text is none: the study's validation refuses it before.
 */
export function windingOf(text: string): Winding {
  const group = parseVectorGroup(text);
  if (typeof group === 'string') throw new RangeError(`vector group "${text}" ${group}`);
  return { clock: group.clock, zeroPath: pathOfGroup[group.hv + group.lv] ?? 'none' };
}
