import {
  PAPER_INK,
  PhasorFigure,
  phaseInk,
  phasorsAt,
  phasorValues,
  type Reading,
  type ReadingPicture,
  reversedSpectrum,
  SpectrumFigure,
  spectrumBars,
  spectrumValues,
  WaveformFigure,
  waveValues,
} from '../../charts/index.ts';
import { phaseColoursOf, type Study } from '../../study/index.ts';
import type { HandedOn } from './handOn.ts';
import { FONTS } from './standaloneSvg.ts';

const words: Record<ReadingPicture, string> = {
  phasors: 'phasors',
  waveform: 'waveform',
  spectrum: 'spectrum',
};

/** One picture of a reading on paper, with its numbers; `order` is the rail's. */
export function readingPicture(
  study: Study,
  reading: Reading,
  picture: ReadingPicture,
  order: number,
): HandedOn | null {
  const name = `${reading.title}, ${words[picture]}`;
  const ink = { ...PAPER_INK, phases: phaseInk(phaseColoursOf(study), 'light') };
  const shared = { fontFamily: FONTS, textSize: 12, ink };
  const current = reading.current && reading.reversed ? reversedSpectrum(reading.current) : reading.current;
  if (picture === 'phasors') return { name, ...phasors(reading, current, order, shared) };
  if (picture === 'waveform') return { name, ...waves(reading, current, shared) };
  return spectrum(reading, name, shared);
}

type Shared = Pick<React.ComponentProps<typeof WaveformFigure>, 'fontFamily' | 'textSize' | 'ink'>;

function phasors(reading: Reading, current: Reading['current'], at: number, shared: Shared) {
  const order = Number.isInteger(at) && at >= 1 && at <= reading.maxOrder ? at : 1;
  const size = { width: 320, height: 340 };
  const voltage = reading.voltage && phasorsAt(reading.voltage, order);
  const amperes = current && phasorsAt(current, order);
  const names = reading.phaseNames;
  return {
    ...size,
    figure: (
      <PhasorFigure
        {...size}
        {...shared}
        voltage={voltage}
        current={amperes}
        order={order}
        {...(names ? { names } : {})}
      />
    ),
    values: phasorValues(voltage, amperes, names),
  };
}

function waves(reading: Reading, current: Reading['current'], shared: Shared) {
  const size = { width: 640, height: 320 };
  const { voltage, frequencyHz, maxOrder, summation } = reading;
  return {
    ...size,
    figure: (
      <WaveformFigure
        {...size}
        {...shared}
        voltage={voltage}
        current={current}
        frequencyHz={frequencyHz}
        maxOrder={maxOrder}
        summation={summation}
        anglesUnknown={reading.anglesUnknown.some(Boolean)}
        settings={{ content: 'all', periods: 1, phases: 'all' }}
      />
    ),
    values: waveValues({ voltage, current, frequencyHz, maxOrder, names: reading.phaseNames }),
  };
}

function spectrum(reading: Reading, name: string, shared: Shared): HandedOn | null {
  const { judged, maxOrder, limits, demandCurrentA, pin } = reading;
  const bars = judged ? spectrumBars(judged, maxOrder, limits ?? [], demandCurrentA) : null;
  if (!bars) return null;
  const size = { width: 640, height: 280 };
  const thd = (pin.quantity === 'voltage' ? reading.bus : reading.terminal)?.thdPercent ?? [];
  const known = thd.filter((value) => value !== null);
  const base = demandCurrentA === undefined ? 'of fundamental' : 'of demand current';
  return {
    name,
    ...size,
    figure: (
      <SpectrumFigure
        {...size}
        {...shared}
        quantity={pin.quantity}
        bars={bars}
        baseWords={base}
        thdPercent={known.length > 0 ? Math.max(...known) : null}
        {...(reading.thdLimit === undefined ? {} : { thdLimit: reading.thdLimit })}
        maxOrder={maxOrder}
      />
    ),
    values: spectrumValues(bars, pin.quantity, base),
  };
}
