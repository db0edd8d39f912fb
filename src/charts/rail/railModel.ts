import { area, curveMonotoneX, line } from 'd3';
import type { VerdictWord } from '../../checks/index.ts';
import type { ImpedanceScan } from '../../engine/index.ts';
import type { Box } from '../figure/box.ts';
import type { CurveHeight } from '../figure/curveCrossings.ts';
import { textWidth } from '../figure/textWidth.ts';
import { type CurvePoint, type ImpedanceCurve, impedanceCurve, ohmAt, ohmExtent } from './impedanceCurve.ts';
import type { Injection } from './injections.ts';
import { type OhmAxis, ohmAxis } from './ohmAxis.ts';
import { type OrderAxis, type OrderDomain, orderAxis } from './orderAxis.ts';
import { type OrderTick, orderTicks } from './orderTicks.ts';
import { placeFlags } from './peakFlags.ts';
import { type PlacedInjection, placedInjections, withCurrents } from './placedInjections.ts';
import type { RailLayout } from './railLayout.ts';
import { type RailPeak, railPeaks } from './railPeaks.ts';
import { peakWords } from './railWords.ts';

/** The impedance seen at one busbar with the correction in place and without it. */
export interface RailScan {
  with: ImpedanceScan;
  without: ImpedanceScan;
}

/** Smallest and largest |Z| over all cases and tolerance points, by frequency. */
export interface RailBand {
  frequencyHz: ArrayLike<number>;
  lowOhm: ArrayLike<number>;
  highOhm: ArrayLike<number>;
}

/** A verdict on a peak, by the peak's order. */
export interface PeakVerdict {
  order: number;
  verdict: VerdictWord;
}

export interface PlacedPeak {
  peak: RailPeak;
  x: number;
  y: number;
  words: string;
  /** null where no room was left: the peak then shows as a mark alone. */
  box: Box | null;
  verdict: VerdictWord | null;
}

/** Everything the rail draws but the handle, placed in figure units. */
export interface RailModel {
  layout: RailLayout;
  axis: OrderAxis;
  ticks: OrderTick[];
  ohm: OhmAxis | null;
  withCurve: ImpedanceCurve | null;
  withPath: string | null;
  withoutPath: string | null;
  bandPath: string | null;
  /** Every resonance of the scan, also those outside the view. */
  allPeaks: RailPeak[];
  peaks: PlacedPeak[];
  injected: PlacedInjection[];
  /** Heights of the drawn curves, for words that keep clear of them. */
  curveHeights: readonly CurveHeight[];
}

export interface RailInputs {
  scan: RailScan | null;
  frequencyHz: number;
  injected: readonly Injection[];
  band?: RailBand | undefined;
  peakVerdicts?: readonly PeakVerdict[] | undefined;
}

const FLAG_PADDING = 4;

/** The whole range of the rail: from the scan's start (or 0.8) to the scan's end or the highest order. */
export function fullDomain(scan: RailScan | null, frequencyHz: number, maxOrder: number): OrderDomain {
  const first = scan?.with.frequencyHz[0];
  const low = first === undefined ? 0.8 : Math.min(1, Math.max(0.1, first / frequencyHz));
  return { low: low === 1 ? 0.9 : low, high: maxOrder * 1.03 };
}

/** Scales, paths and placed words of a rail of a given size and view. */
export function railModel(
  inputs: RailInputs,
  view: OrderDomain,
  layout: RailLayout,
  sizes: { textSize: number; smallSize: number },
): RailModel {
  const { scan, frequencyHz } = inputs;
  const axis = orderAxis(view, layout.left, layout.right);
  const withCurve = scan ? impedanceCurve(scan.with, frequencyHz) : null;
  const withoutCurve = scan ? impedanceCurve(scan.without, frequencyHz) : null;
  const drawn = [withCurve, withoutCurve].filter((curve) => curve !== null);
  const extent = ohmExtent(drawn, 0.5, Number.POSITIVE_INFINITY);
  const ohm = extent ? ohmAxis(extent, layout.curveTop, layout.curveBottom) : null;
  const heights = { axis, ohm };
  const curveHeights = ohm ? drawn.map((curve) => curveHeight(curve, axis, ohm)) : [];
  const injected = placedInjections(inputs.injected, axis, layout);
  const bars = injected.map(({ x, height }) => ({ x: x - 4, y: layout.axisY - height, width: 8, height }));
  const room = { axis, layout, curves: curveHeights, bars, textSize: sizes.textSize };
  const allPeaks = scan ? railPeaks(scan.with, scan.without, frequencyHz) : [];
  const peaks = ohm ? placedPeaks(allPeaks, inputs, { ...room, ohm }) : [];
  const flags = peaks.flatMap(({ box }) => box ?? []);
  const tickRoom = { bounds: layout.words, curves: curveHeights, flags, letterSize: sizes.smallSize };
  return {
    layout,
    axis,
    ticks: orderTicks(
      axis,
      frequencyHz,
      sizes.smallSize,
      injected.map((one) => one.h),
    ),
    ohm,
    withCurve,
    withPath: curvePath(withCurve, heights),
    withoutPath: curvePath(withoutCurve, heights),
    bandPath: inputs.band && ohm ? bandPath(inputs.band, frequencyHz, axis, ohm) : null,
    allPeaks,
    peaks,
    injected: withCurrents(injected, layout.axisY, tickRoom),
    curveHeights,
  };
}

function curveHeight(curve: ImpedanceCurve, axis: OrderAxis, ohm: OhmAxis): CurveHeight {
  return (x) => {
    const value = ohmAt(curve, axis.order(x));
    return value === null ? null : ohm.y(value);
  };
}

function curvePath(
  curve: ImpedanceCurve | null,
  scales: { axis: OrderAxis; ohm: OhmAxis | null },
): string | null {
  const { axis, ohm } = scales;
  if (!curve || !ohm) return null;
  const path = line<CurvePoint>()
    .x((point) => axis.x(point.order))
    .y((point) => ohm.y(point.ohm))
    .curve(curveMonotoneX)
    .digits(2);
  return path(thinned(curve.points, axis));
}

const CLOSEST = 0.8;

/** Points in and a little beyond the view, no closer than the eye can tell apart; resonances all stay. */
function thinned(points: readonly CurvePoint[], axis: OrderAxis): CurvePoint[] {
  const kept: CurvePoint[] = [];
  let lastX = Number.NEGATIVE_INFINITY;
  for (const point of points) {
    if (!nearView(point.order, axis.domain)) continue;
    const x = axis.x(point.order);
    if (!point.turning && x - lastX < CLOSEST) continue;
    kept.push(point);
    lastX = x;
  }
  return kept;
}

/** Points a little beyond the view keep the line running to the edge of the clip. */
function nearView(order: number, view: OrderDomain): boolean {
  return order > view.low * 0.9 && order < view.high * 1.1;
}

function bandPath(band: RailBand, frequencyHz: number, axis: OrderAxis, ohm: OhmAxis): string | null {
  const rows = Array.from(band.frequencyHz, (hz, i) => ({
    order: hz / frequencyHz,
    low: band.lowOhm[i] ?? Number.NaN,
    high: band.highOhm[i] ?? Number.NaN,
  })).filter((row) => row.low > 0 && row.high >= row.low && Number.isFinite(row.high));
  return area<(typeof rows)[number]>()
    .x((row) => axis.x(row.order))
    .y0((row) => ohm.y(row.low))
    .y1((row) => ohm.y(row.high))
    .digits(2)(rows.filter((row) => nearView(row.order, axis.domain)));
}

interface PeakRoom {
  axis: OrderAxis;
  ohm: OhmAxis;
  layout: RailLayout;
  curves: readonly CurveHeight[];
  bars: readonly Box[];
  textSize: number;
}

function placedPeaks(allPeaks: readonly RailPeak[], inputs: RailInputs, room: PeakRoom): PlacedPeak[] {
  const { axis, ohm, layout } = room;
  const { low, high } = axis.domain;
  const peaks = allPeaks
    .filter((peak) => peak.order >= low && peak.order <= high)
    .map((peak) => ({ peak, x: axis.x(peak.order), y: ohm.y(peak.ohm), words: peakWords(peak) }));
  const requests = peaks.map(({ peak, x, y, words }) => ({
    x,
    y,
    width: textWidth(words, room.textSize) + 2 * FLAG_PADDING,
    height: room.textSize * 1.35,
    weight: peakWeight(peak),
  }));
  const boxes = placeFlags(requests, { bounds: layout.words, curves: room.curves, bars: room.bars });
  return peaks.map((placed, i) => ({
    ...placed,
    box: boxes[i] ?? null,
    verdict: verdictOf(placed.peak, inputs.peakVerdicts ?? []),
  }));
}

/** Parallel peaks speak before series ones; within a kind the stronger change speaks first. */
function peakWeight(peak: RailPeak): number {
  const change = peak.amplification ? Math.abs(Math.log(peak.amplification)) : 0;
  return (peak.kind === 'parallel' ? 10 : 0) + change + Math.min(1, (peak.q ?? 0) / 100);
}

const SAME_PEAK = 0.01;

function verdictOf(peak: RailPeak, verdicts: readonly PeakVerdict[]): VerdictWord | null {
  const match = verdicts.find((one) => Math.abs(one.order - peak.order) <= SAME_PEAK * peak.order);
  return match?.verdict ?? null;
}
