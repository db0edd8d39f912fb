import {
  busesOf,
  busName,
  elementById,
  elementName,
  type Pin,
  phaseNamesOf,
  type Study,
} from '../../../study/index.ts';
import { cells, NONE } from '../cells.ts';
import { correctionOf } from '../correctionParts.ts';
import { fixed, significant } from '../formatNumber.ts';
import type { Block, Column, Row, Section } from '../model.ts';
import { readBus, readTerminal } from '../readings.ts';
import { type SheetView, solvedIn } from '../SheetView.ts';

/** The study's pins, or where it has none: the PCC's voltage and the currents of supply and correction. */
export function pinsOf(view: SheetView): { pins: Pin[]; chosenBySheet: boolean } {
  if (view.input.pins.length > 0) return { pins: [...view.input.pins], chosenBySheet: false };
  const { study } = view;
  const pcc = study.buses.find((bus) => bus.pcc) ?? study.buses[0];
  const supply = study.elements.find(({ kind }) => kind === 'supply');
  const parts = [supply, ...correctionOf(study).map(({ part }) => part)].slice(0, 3);
  const currents = parts.flatMap((element): Pin[] => {
    const bus = element ? busesOf(element)[0] : undefined;
    return element && bus !== undefined ? [{ quantity: 'current', element: element.id, bus }] : [];
  });
  return {
    pins: [...(pcc ? [{ quantity: 'voltage' as const, bus: pcc.id }] : []), ...currents],
    chosenBySheet: true,
  };
}

function isSource(study: Study, id: string): boolean {
  const kind = elementById(study, id)?.kind;
  return kind === 'supply' || kind === 'generator';
}

/** "voltage at Main board", "current into Bank C1 at Main board". */
export function pinName(study: Study, pin: Pin): string {
  return pin.quantity === 'voltage'
    ? `voltage at ${busName(study, pin.bus)}`
    : `current ${isSource(study, pin.element) ? 'from' : 'into'} ${elementName(study, pin.element)} at ${busName(study, pin.bus)}`;
}

function pinRow(view: SheetView, pin: Pin): Row {
  const solution = solvedIn(view.shown);
  const name = pinName(view.study, pin);
  const phases = (values: readonly number[]): string[] => values.map((value) => significant(value, 4));
  const thd = (values: readonly (number | null)[]): string[] =>
    values.map((value) => (value === null ? NONE : fixed(value, 1)));
  if (solution && pin.quantity === 'voltage') {
    const reading = readBus(solution, pin.bus);
    if (reading) return cells(name, 'V', ...phases(reading.rmsV), ...thd(reading.thdPercent));
  }
  if (solution && pin.quantity === 'current') {
    const index = solution.terminals.findIndex(
      ({ element, bus }) => element === pin.element && bus === pin.bus,
    );
    if (index >= 0) {
      const reading = readTerminal(solution, index);
      return cells(name, 'A', ...phases(reading.rmsA), ...thd(reading.thdPercent));
    }
  }
  return cells(`${name}: out of service or not solved`, '', NONE, NONE, NONE, NONE, NONE, NONE);
}

const SHARES = [
  { kind: 'waveform', share: 0.46 },
  { kind: 'phasors', share: 0.22 },
  { kind: 'spectrum', share: 0.32 },
] as const;

/** Waveform, phasors and spectrum of a pin side by side; magnitudes without angles give a spectrum alone. */
function picturesOf(view: SheetView, pin: Pin, index: number, angles: boolean): Block[] {
  const name = pinName(view.study, pin);
  const shown = angles ? SHARES : ([{ kind: 'spectrum', share: 1 }] as const);
  const figures = shown.map(({ kind, share }) => ({
    id: `pin-${index + 1}-${kind}`,
    request: { kind, caseId: view.shown.id, pin },
    label: `${kind}, ${name}`,
    share,
  }));
  const heading: Block = { kind: 'heading', text: `${name.charAt(0).toUpperCase()}${name.slice(1)}` };
  return [heading, { kind: 'figureRow', figures, aspect: angles ? 0.25 : 0.2 }];
}

function anglesRemark(view: SheetView): string[] {
  const solution = solvedIn(view.shown);
  const unknown = solution?.judged.anglesUnknown.flatMap((flag, index) => (flag ? [index + 1] : [])) ?? [];
  if (unknown.length === 0) return [];
  return [
    `At the orders ${unknown.join(', ')} sources of unknown mutual phase meet: the waveforms take every unknown angle as 0°, so their shape and peak are one possibility of many. The verdicts add such groups by magnitude.`,
  ];
}

function pictures(view: SheetView, pins: readonly Pin[]): Block[] {
  const solution = solvedIn(view.shown);
  if (!solution) return [{ kind: 'paragraph', text: `No pictures: ${view.shown.name} is not solved.` }];
  const live = pins.filter((pin) =>
    pin.quantity === 'voltage'
      ? solution.buses.includes(pin.bus) && !solution.deenergised.includes(pin.bus)
      : solution.terminals.some(({ element, bus }) => element === pin.element && bus === pin.bus),
  );
  const angles = solution.summation !== 'alpha';
  const rows = live.flatMap((pin, index) => picturesOf(view, pin, index, angles));
  if (!angles) {
    const text =
      'No waveform is drawn: harmonics were combined by the summation law of IEC 61000-3-6, which gives magnitudes without angles.';
    return [...rows, { kind: 'paragraph', text }];
  }
  const remarks = anglesRemark(view).map((text): Block => ({ kind: 'paragraph', text, small: true }));
  return [...rows, ...remarks];
}

/** Waveforms and phasors of the watched quantities in the shown case, with their numbers. */
export function pinsSection(view: SheetView): Section {
  const { pins, chosenBySheet } = pinsOf(view);
  const why = chosenBySheet ? 'nothing is pinned in the study: chosen here' : 'as pinned in the study';
  const section = { id: 'pins', title: 'Waveforms and phasors', aside: `${view.shown.name}; ${why}` };
  if (pins.length === 0) {
    return { ...section, blocks: [{ kind: 'paragraph', text: 'There is nothing to show: no busbar.' }] };
  }
  const names = phaseNamesOf(view.input.study);
  const table: Block = {
    kind: 'table',
    columns: [
      { head: 'quantity', align: 'left', grow: 3 },
      { head: 'unit', align: 'left' },
      ...names.map((name): Column => ({ head: `${name} rms`, align: 'decimal', grow: 1 })),
      ...names.map((name): Column => ({ head: `THD ${name}`, unit: '%', align: 'decimal', grow: 1 })),
    ],
    rows: pins.map((pin) => pinRow(view, pin)),
    notes: [],
  };
  return { ...section, blocks: [table, ...pictures(view, pins)] };
}
