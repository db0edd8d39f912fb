import { useMemo } from 'react';
import { FrequencyRail, type Probe } from '../../charts/index.ts';
import { freshAnswer, freshEnvelope, isStale, useWorkbench, type Workbench } from '../../store/index.ts';
import { busName } from '../../study/index.ts';
import { handOn } from '../copy/handOn.ts';
import { railPicture } from '../copy/railPicture.tsx';
import { RailSplitter } from '../panels/panelSplitters.tsx';
import { setPanels, usePanelPlaces } from '../panels/panelStore.ts';
import { injectionsOf } from './injectionsOf.ts';

/** The exact impedance under the handle, where the newest probe speaks of it. */
function probeAtHandle({ probe, view, revision }: Workbench): Probe | null {
  if (!probe || probe.revision !== revision || probe.order !== view.order || probe.caseId !== view.caseId)
    return null;
  const at = probe.buses.indexOf(view.focusBus);
  const re = probe.with.re[at];
  const im = probe.with.im[at];
  return re === undefined || im === undefined || !Number.isFinite(re + im) ? null : { re, im };
}

/** The frequency rail on the impedance of the busbar looked at. */
export function RailConnection() {
  const study = useWorkbench((state) => state.study);
  const focusBus = useWorkbench((state) => state.view.focusBus);
  const order = useWorkbench((state) => state.view.order);
  const answer = useWorkbench((state) => state.answer);
  const stale = useWorkbench(isStale);
  const fresh = useWorkbench(freshAnswer);
  const re = useWorkbench((state) => probeAtHandle(state)?.re ?? null);
  const im = useWorkbench((state) => probeAtHandle(state)?.im ?? null);
  const setOrder = useWorkbench((state) => state.setOrder);
  const scan = answer?.scan?.bus === focusBus ? answer.scan : null;
  const injected = useMemo(() => (study && fresh ? injectionsOf(study, fresh.solution) : []), [study, fresh]);
  const peakVerdicts = useMemo(
    () =>
      (fresh?.verdicts ?? []).flatMap(({ order: at, verdict, check }) =>
        check === 'resonance-distance' && at !== undefined ? [{ order: at, verdict }] : [],
      ),
    [fresh],
  );
  const band = useWorkbench(freshEnvelope);
  const place = usePanelPlaces().rail;
  if (!study || study.buses.length === 0) return null;
  return (
    <div className="rail-place" id="rail-panel">
      <RailSplitter place={place} />
      <FrequencyRail
        busName={busName(study, focusBus)}
        scan={scan}
        frequencyHz={study.frequencyHz}
        maxOrder={study.maxOrder ?? 50}
        order={order}
        {...(band ? { band } : {})}
        probe={re !== null && im !== null ? { re, im } : null}
        injected={injected}
        summation={study.summation ?? 'phasor'}
        sequence="positive"
        stale={stale}
        peakVerdicts={peakVerdicts}
        height={place.size}
        folded={place.show === 'strip'}
        onOrder={setOrder}
        onPicture={(way, shown) => {
          if (scan)
            void handOn(
              railPicture({ study, focusBus, scan, injected, band: band ?? undefined, view: shown }),
              way,
            );
        }}
        onFold={(folded) => setPanels({ rail: folded ? 'strip' : 'open' })}
      />
    </div>
  );
}
