export interface VectorGroup {
  hv: 'D' | 'Y' | 'YN';
  lv: 'd' | 'y' | 'yn' | 'z' | 'zn';
  /** Clock number 0…11: the low voltage lags by clock·30° in positive sequence. */
  clock: number;
  hvEarthed: boolean;
  lvEarthed: boolean;
}

const pattern = /^(D|YN?)(d|yn?|zn?)(\d{1,2})$/;

/**
 * Reads a vector group such as "Dyn11". The clock is odd for Dy, Yd and Yz and even for Yy, Dd and Dz.
 * Returns what is wrong, as a sentence, where the text is no vector group.
 */
export function parseVectorGroup(text: string): VectorGroup | string {
  const match = pattern.exec(text);
  if (!match)
    return 'is no vector group; write D, Y or YN, then d, y, yn, z or zn, then the clock number, as in Dyn11';
  const hv = match[1] as VectorGroup['hv'];
  const lv = match[2] as VectorGroup['lv'];
  const clock = Number(match[3]);
  if (clock > 11) return 'has no such clock number; 0 to 11 are possible';
  const high = hv.startsWith('Y') ? 'y' : 'd';
  const low = lv.charAt(0);
  const even = high === low || (high === 'd' && low === 'z');
  if (clock % 2 !== (even ? 0 : 1)) {
    return `cannot have the clock number ${clock}; it is ${even ? 'even' : 'odd'} for ${high.toUpperCase()}${low}`;
  }
  return { hv, lv, clock, hvEarthed: hv === 'YN', lvEarthed: lv.endsWith('n') };
}
