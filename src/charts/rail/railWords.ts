import { ampereParts, fixedNumber, joinParts, ohmParts, plainNumber } from '../figure/quantityParts.ts';
import type { InjectedOrder } from './injections.ts';
import type { RailPeak } from './railPeaks.ts';

/** The impedance shown at the handle: Z = re + j·im in ohm per phase. */
export interface Probe {
  re: number;
  im: number;
}

/**
 * "h 7.000 · 350 Hz · 625 mΩ ∠ 27°", and on an injected order "· 36 A injected"; a value read off the scan
 * instead of solved is marked ≈.
 */
export function handleWords(
  order: number,
  frequencyHz: number,
  probe: Probe | null,
  exact = true,
  injected?: InjectedOrder,
): string {
  const place = `h ${fixedNumber(order, 3)} · ${hertz(order * frequencyHz)}`;
  const current = injected && injected.amps > 0 ? ` · ${joinParts(ampereParts(injected.amps))} injected` : '';
  if (!probe) return `${place} · impedance not known${current}`;
  const size = joinParts(ohmParts(Math.hypot(probe.re, probe.im)));
  return `${place} · ${exact ? '' : '≈ '}${size} ∠ ${angle(probe)}°${current}`;
}

/** The same for a screen reader, in whole words. */
export function handleValueText(
  order: number,
  frequencyHz: number,
  probe: Probe | null,
  injected: InjectedOrder | undefined,
): string {
  const place = `order ${plainNumber(order, 4)}, ${plainNumber(order * frequencyHz, 4)} hertz`;
  const current = injected && injected.amps > 0 ? `, ${joinParts(ampereParts(injected.amps))} injected` : '';
  if (!probe) return `${place}, impedance not known${current}`;
  const nature = probe.im > 0 ? 'inductive' : probe.im < 0 ? 'capacitive' : 'resistive';
  const size = joinParts(ohmParts(Math.hypot(probe.re, probe.im)));
  return `${place}, impedance ${size} at ${angle(probe)} degrees, ${nature}${current}`;
}

/** "parallel h 7.18 · ×12 · Q 12"; a part that is not known is left out. */
export function peakWords(peak: RailPeak): string {
  const parts = [`${peak.kind} h ${fixedNumber(peak.order, 2)}`];
  if (peak.amplification !== null) parts.push(`×${plainNumber(peak.amplification, 2)}`);
  if (peak.q !== null) parts.push(`Q ${plainNumber(peak.q, 2)}`);
  return parts.join(' · ');
}

/** Formula and numbers of a peak, for its tooltip. */
export function peakTooltip(peak: RailPeak, frequencyHz: number): string {
  const place = `${peak.kind} resonance at ${hertz(peak.order * frequencyHz)}, |Z| ${joinParts(ohmParts(peak.ohm))}`;
  const times =
    peak.amplification === null
      ? 'no reference without correction here'
      : `|Z with| / |Z without| = ${plainNumber(peak.amplification, 3)}`;
  const quality =
    peak.q === null ? 'half-power points out of reach, no Q' : `Q = h₀/(h₂ − h₁) = ${plainNumber(peak.q, 3)}`;
  return `${place}; ${times}; ${quality}`;
}

/** What is injected at an order, source by source, for the tick's tooltip. */
export function injectionWords(injected: InjectedOrder): string {
  const parts = injected.sources.map((source) =>
    source.backgroundPercent === undefined
      ? `${source.name} ${joinParts(ampereParts(source.amps))}`
      : `${source.name} background ${plainNumber(source.backgroundPercent, 2)} %`,
  );
  const sum =
    injected.sources.length > 1 && injected.amps > 0
      ? `; by magnitude ${joinParts(ampereParts(injected.amps))}`
      : '';
  return `h ${injected.h}: ${parts.join(', ')}${sum}`;
}

function hertz(hz: number): string {
  return `${plainNumber(hz, hz >= 1000 ? 4 : 3)} Hz`;
}

function angle(probe: Probe): string {
  return fixedNumber((Math.atan2(probe.im, probe.re) * 180) / Math.PI, 0);
}
