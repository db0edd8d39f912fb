import type { CapacitorVoltageRow, LimitSet } from './types.ts';

const MINUTE = 1 / 60;

const shortTime: CapacitorVoltageRow[] = [
  { upToHours: MINUTE, ratio: 1.3, words: '1 min, at most 200 times in the life' },
  { upToHours: 5 * MINUTE, ratio: 1.2, words: '5 min, at most 200 times in the life' },
  { upToHours: 0.5, ratio: 1.15, words: '30 min in 24 h' },
];

const continuous: CapacitorVoltageRow = { upToHours: 24, ratio: 1, words: 'continuous, design basis' };

/** Power capacitors up to 1 kV. From memory. */
export const iec60831x1: LimitSet = {
  id: 'iec-60831-1',
  label: 'IEC 60831-1 (capacitors up to 1 kV)',
  document: 'IEC 60831-1',
  edition: '2014',
  capacitor: {
    voltage: {
      clause: 'long-duration voltages',
      provenance: 'memory',
      rows: [...shortTime, { upToHours: 8, ratio: 1.1, words: '8 h in 24 h' }, continuous],
    },
    discharge: {
      clause: 'discharge devices, 75 V in 3 min',
      provenance: 'memory',
      rows: [{ residualV: 75, seconds: 180 }],
    },
    inrushRatio: { value: 100, clause: 'switching, guide value of the peak', provenance: 'memory' },
    currentRatio: {
      value: 1.3,
      clause: 'maximum permissible current',
      provenance: 'memory',
      note: 'With the capacitance tolerance the current may reach 1.5 times the rated one.',
    },
  },
};

/** Power capacitors above 1 kV. From memory. */
export const iec60871x1: LimitSet = {
  id: 'iec-60871-1',
  label: 'IEC 60871-1 (capacitors above 1 kV)',
  document: 'IEC 60871-1',
  edition: '2014',
  capacitor: {
    voltage: {
      clause: 'long-duration voltages',
      provenance: 'memory',
      rows: [...shortTime, { upToHours: 12, ratio: 1.1, words: '12 h in 24 h' }, continuous],
    },
    discharge: {
      clause: 'discharge devices, 75 V in 10 min',
      provenance: 'memory',
      rows: [{ residualV: 75, seconds: 600 }],
    },
    inrushRatio: { value: 100, clause: 'switching, guide value of the peak', provenance: 'memory' },
    currentRatio: { value: 1.3, clause: 'maximum permissible current', provenance: 'memory' },
  },
};

/** Shunt power capacitors, 60 Hz practice: contingency ratings, not a basis for design. From memory. */
export const ieee18: LimitSet = {
  id: 'ieee-18',
  label: 'IEEE 18 (shunt power capacitors)',
  document: 'IEEE 18',
  edition: '2012',
  capacitor: {
    voltage: {
      clause: 'continuous overload capability',
      provenance: 'memory',
      rows: [{ upToHours: 24, ratio: 1.1, words: '110 % of rated rms voltage, contingency' }],
    },
    discharge: {
      clause: 'discharge, 50 V in 1 min up to 600 V, in 5 min above',
      provenance: 'memory',
      note: 'NEC 460 asks the same up to 600 V (second-hand).',
      rows: [
        { upToV: 600, residualV: 50, seconds: 60 },
        { residualV: 50, seconds: 300 },
      ],
    },
    currentRatio: {
      value: 1.35,
      clause: 'continuous overload capability',
      provenance: 'memory',
      note: '135 % of rated rms current, contingency',
    },
    peakRatio: {
      value: 1.2,
      clause: 'continuous overload capability',
      provenance: 'memory',
      note: '120 % of the crest of rated rms voltage',
    },
    kvarRatio: {
      value: 1.35,
      clause: 'continuous overload capability',
      provenance: 'memory',
      note: '135 % of rated kvar',
    },
    remark: 'IEEE 18 states what a capacitor bears in a contingency; it is not a basis for design.',
  },
};
