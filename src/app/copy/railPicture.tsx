import {
  type Injection,
  type OrderDomain,
  PAPER_INK,
  type RailBand,
  RailFigure,
  type RailScan,
  railValues,
} from '../../charts/index.ts';
import { busName, type Study } from '../../study/index.ts';
import type { HandedOn } from './handOn.ts';
import { FONTS } from './standaloneSvg.ts';

interface RailShown {
  study: Study;
  focusBus: string;
  scan: RailScan;
  injected: readonly Injection[];
  band?: RailBand | undefined;
  /** The stretch of the axis on screen; absent: all of it. */
  view?: OrderDomain | undefined;
}

/** The impedance landscape on paper, with the points of its scan. */
export function railPicture({ study, focusBus, scan, injected, band, view }: RailShown): HandedOn {
  const size = { width: 900, height: 280 };
  return {
    name: `Impedance seen at ${busName(study, focusBus)}`,
    ...size,
    figure: (
      <RailFigure
        {...size}
        fontFamily={FONTS}
        textSize={12}
        ink={PAPER_INK}
        scan={scan}
        frequencyHz={study.frequencyHz}
        maxOrder={study.maxOrder ?? 50}
        injected={injected}
        band={band}
        view={view}
      />
    ),
    values: railValues(scan, study.frequencyHz),
  };
}
