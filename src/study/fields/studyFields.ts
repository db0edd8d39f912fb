import { boolean, choice, group, integer, number, opaque, text } from './build.ts';
import type { Field } from './Field.ts';

/** Fields of a busbar. */
export const busFields: readonly Field[] = [
  text('name', 'name', 'What the busbar is called on the drawing and on the results sheet.'),
  number('nominalV', 'nominal voltage, line to line', 'V', 'U of every part at this busbar.', {
    required: true,
    above: 0,
  }),
  boolean('pcc', 'point of common coupling', 'Limits of the network operator are judged here.', {
    default: false,
  }),
  number(
    'withstandKA',
    'short-time withstand I_cw',
    'kA',
    'The fault level with couplers closed must stay below.',
    { above: 0, rare: true },
  ),
];

/** One row of a spectrum or of a supply's background. */
export const harmonicRowFields: readonly Field[] = [
  integer('h', 'order h', '', 'A whole order from 2 up; 1 and orders above the highest are ignored.', {
    required: true,
    min: 1,
  }),
  number(
    'percent',
    'magnitude',
    '%',
    'Of the fundamental current, or of the nominal voltage for background.',
    { required: true, min: 0 },
  ),
  number('angleDeg', 'angle', '°', 'Absent: 0 in the solution, unknown to the checks.'),
];

export const spectrumFields: readonly Field[] = [
  text('name', 'name', 'What the spectrum is called.'),
  text('origin', 'origin', 'Who measured or stated it, when, and at what load.'),
];

export const caseFields: readonly Field[] = [
  text('name', 'name', 'What the operating state is called.'),
  text('description', 'description', 'What the state is and why it is looked at; printed with the cases.'),
  choice(
    'role',
    'role',
    'Decides which limits apply: the target power factor holds in load cases, the leading limit in light ones.',
    [
      { value: 'load', label: 'load' },
      { value: 'light', label: 'light load' },
      { value: 'export', label: 'export' },
      { value: 'generator', label: 'on the generator' },
    ],
    { default: 'load' },
  ),
  number('hoursPerDay', 'hours a day', 'h', 'Permissible overvoltage depends on its duration.', {
    default: 24,
    above: 0,
    max: 24,
  }),
];

export const scanFields: readonly Field[] = [
  choice(
    'sequence',
    'sequence',
    'Positive or zero sequence of the injected unit current.',
    [
      { value: 'positive', label: 'positive' },
      { value: 'zero', label: 'zero' },
    ],
    { required: true },
  ),
  number('fromHz', 'from', 'Hz', 'First frequency.', { required: true, above: 0 }),
  number('toHz', 'to', 'Hz', 'Last frequency.', { required: true, above: 0 }),
  integer('points', 'points', '', 'Equidistant, both ends included.', {
    required: true,
    min: 2,
    max: 200_000,
  }),
];

export const criteriaFields: readonly Field[] = [
  number('targetPF', 'target power factor', '', 'cos φ1 at the PCC in load cases.', {
    default: 0.95,
    above: 0,
    max: 1,
  }),
  number('leadingKvarLimit', 'leading kvar allowed', 'kvar', 'In light-load and generator cases.', {
    min: 0,
  }),
  number('demandCurrentA', 'maximum demand current I_L', 'A', 'TDD = √ΣI_h²/I_L.', { above: 0 }),
  number(
    'shortCircuitMVAAtPcc',
    'fault level at the PCC',
    'MVA',
    'I_sc/I_L chooses the row of the current limits.',
    { above: 0 },
  ),
  number('rippleControlHz', 'ripple control frequency', 'Hz', 'The signal must not be swallowed.', {
    above: 0,
  }),
  number('agreedKVA', 'agreed power', 'kVA', '|Z_site|/(U²/S_agreed) at the ripple frequency.', { above: 0 }),
  number(
    'maxVoltagePercent',
    'highest supply voltage',
    '%',
    'Of nominal; capacitor voltage is judged there.',
    { min: 50, max: 150 },
  ),
];

export const limitFields: readonly Field[] = [
  text('pcc', 'voltage limits at the PCC', 'Id of a limit set.'),
  text('internal', 'voltage limits inside', 'Id of a limit set.'),
  text('current', 'current limits', 'Id of a limit set.'),
  text('capacitor', 'capacitor limits', 'Id of a limit set.'),
];

/** Fields of the study itself; its lists are described by their own tables. */
export const studyFields: readonly Field[] = [
  text('title', 'title', 'Title of the study, on every page.', { required: true }),
  text('site', 'site', 'Where it is.'),
  text('preparedBy', 'prepared by', 'Originator; stands in the title block.'),
  text('revision', 'revision', 'Letter or number of the revision.'),
  text('revisionDate', 'revision date', 'ISO 8601; printed on the results sheet.'),
  text('notes', 'notes', 'Free text.'),
  choice(
    'frequencyHz',
    'nominal frequency',
    'ω_n = 2π·f_n.',
    [
      { value: 50, label: '50 Hz' },
      { value: 60, label: '60 Hz' },
    ],
    { required: true },
  ),
  integer('maxOrder', 'highest order', '', 'Harmonics are solved from 2 to this order.', {
    default: 50,
    min: 1,
    max: 100,
  }),
  choice(
    'summation',
    'summation of sources',
    'Phasors with their angles, or the law of IEC 61000-3-6: (Σ u_i^α)^(1/α).',
    [
      { value: 'phasor', label: 'by phasors' },
      { value: 'alpha', label: 'by the α law' },
    ],
    { default: 'phasor' },
  ),
  group('limits', 'limit sets', 'Which published limits are judged.', limitFields),
  group('criteria', 'criteria', 'What the site must meet.', criteriaFields),
  opaque('tariff', 'tariff', 'Formula type and prices.'),
  opaque('proposals', 'proposals', 'Corrections kept for comparison.'),
  opaque('interval', 'interval data', 'Reference to imported readings.'),
];
