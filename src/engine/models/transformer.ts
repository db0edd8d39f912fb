import type { Skin } from '../../study/index.ts';
import { type PartLaw, writeInverse } from './PartLaw.ts';
import { skinFactor } from './skinFactor.ts';
import { windingOf } from './vectorGroup.ts';

export interface TransformerData {
  ratedKVA: number;
  hvV: number;
  lvV: number;
  ukPercent: number;
  loadLossKW: number;
  vectorGroup: string;
  tapPercent: number;
  z0OverZ1: number;
  neutralOhm: number;
  noLoadLossKW: number;
  noLoadCurrentPercent: number;
  skin: Skin;
}

/**
 * Two-winding transformer, from = HV, to = LV. Referred to LV: |Z| = uk/100·U²/S, R = Pk·U²/S²,
 * Z(h) = R(h) + jhX, n = hvV·(1 + tap/100)/lvV. Positive sequence [[y/n², −y/n], [−y/n, y + ym]] before
 * the clock's rotation; ym the magnetising shunt G − jB/h at LV. Zero sequence by vector group, y0 =
 * 1/(z0OverZ1·Z(h)), with three times the star point resistor at the earthed side. Siemens.
 * RangeError when the losses exceed uk or the no-load current.
 */
export function transformerLaw(data: TransformerData): PartLaw {
  const volts = data.lvV;
  const va = data.ratedKVA * 1e3;
  const absZ = ((data.ukPercent / 100) * volts * volts) / va;
  const resistance = (data.loadLossKW * 1e3 * volts * volts) / (va * va);
  if (resistance > absZ)
    throw new RangeError(`load loss gives ${resistance} Ω, more than uk's ${absZ} Ω at LV`);
  const reactance = Math.sqrt(absZ * absZ - resistance * resistance);
  const ratio = (data.hvV * (1 + data.tapPercent / 100)) / volts;
  const magnetising = magnetisingShunt(data);
  const { clock, zeroPath } = windingOf(data.vectorGroup);
  const zeroSign = clock === 2 || clock === 6 || clock === 10 ? 1 : -1;
  const { skin, z0OverZ1 } = data;
  const earthing = 3 * data.neutralOhm;
  const square = ratio * ratio;

  return (h, out, at) => {
    const r = resistance * skinFactor(h, skin);
    const x = h * reactance;
    for (let k = 0; k < 10; k++) out[at + k] = 0;
    writeInverse(r, x, out, at + 6);
    const re = out[at + 6] as number;
    const im = out[at + 7] as number;
    out[at + 2] = re / square;
    out[at + 3] = im / square;
    out[at + 10] = -re / ratio;
    out[at + 11] = -im / ratio;
    out[at + 6] = re + magnetising.conductance;
    out[at + 7] = im - magnetising.susceptance / h;
    if (zeroPath === 'hv') {
      writeInverse(z0OverZ1 * r * square + earthing, z0OverZ1 * x * square, out, at);
    } else if (zeroPath === 'lv') {
      writeInverse(z0OverZ1 * r + earthing, z0OverZ1 * x, out, at + 4);
    } else if (zeroPath === 'through') {
      writeInverse(z0OverZ1 * r, z0OverZ1 * x, out, at + 4);
      const re0 = out[at + 4] as number;
      const im0 = out[at + 5] as number;
      out[at] = re0 / square;
      out[at + 1] = im0 / square;
      out[at + 8] = (zeroSign * re0) / ratio;
      out[at + 9] = (zeroSign * im0) / ratio;
    }
  };
}

/** G and the fundamental's B of the magnetising branch at LV, siemens; zero without a no-load current. */
function magnetisingShunt(data: TransformerData): { conductance: number; susceptance: number } {
  if (!(data.noLoadCurrentPercent > 0)) return { conductance: 0, susceptance: 0 };
  const square = data.lvV * data.lvV;
  const conductance = (data.noLoadLossKW * 1e3) / square;
  const size = ((data.noLoadCurrentPercent / 100) * data.ratedKVA * 1e3) / square;
  if (conductance > size)
    throw new RangeError(`no-load loss gives ${conductance} S, more than the no-load current's ${size} S`);
  return { conductance, susceptance: Math.sqrt(size * size - conductance * conductance) };
}
