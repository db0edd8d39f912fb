import { figure, type Working } from '../checks/index.ts';
import { type DrawnSite, drawSite, figuresOf, type SiteAnswers, type SiteFigures } from '../study/index.ts';
import { kvarForTarget } from './kvarForTarget.ts';

export interface QuickSite {
  figures: SiteFigures;
  /** Kvar from the bill's cos φ to the target at the intake; negative where the bill is better. */
  kvar: number;
  /** Bill, power factor, kvar, bank: the steps of the computation with their numbers. */
  working: Working[];
  drawn: DrawnSite;
}

/** The quick start's answer: from the bill to the kvar wanted, and the site drawn with a bank for them. */
export function quickSite(answers: SiteAnswers): QuickSite {
  const figures = figuresOf(answers);
  const { kW, tanPhi, cosPhi, targetPF } = figures;
  const needed = kvarForTarget({ kW, pf1: cosPhi, pf2: targetPF });
  const drawn = drawSite(figures, needed.kvar);
  const working = [
    powerWorking(figures),
    {
      equation: 'tan φ = E_r/E, cos φ = 1/√(1 + tan² φ)',
      numbers: `${figure(figures.reactiveKvarh)} kvarh / ${figure(figures.activeKWh)} kWh = ${figure(tanPhi)}, cos φ = ${figure(cosPhi)}`,
    },
    ...needed.working.slice(1),
    ...bankWorking(drawn),
  ];
  return { figures, kvar: needed.kvar, working, drawn };
}

function powerWorking({ given, activeKWh, hours, kW }: SiteFigures): Working {
  if (given.has('peakKW'))
    return {
      equation: 'h = E/P',
      numbers: `${figure(activeKWh)} kWh / ${figure(kW)} kW = ${figure(hours)} h`,
    };
  return { equation: 'P = E/h', numbers: `${figure(activeKWh)} kWh / ${figure(hours)} h = ${figure(kW)} kW` };
}

function bankWorking({ bank, study }: DrawnSite): Working[] {
  if (!bank) return [];
  const { steps, stepKvar, ratedV, detuningPercent, givesKvar } = bank;
  const mainV = study.buses[1]?.nominalV ?? ratedV;
  return [
    {
      equation: 'Q = Q_N · (U/U_N)² / (1 − p)',
      numbers: `${steps} × ${stepKvar} kvar · (${mainV} V / ${ratedV} V)² / (1 − ${detuningPercent / 100}) = ${figure(givesKvar)} kvar`,
    },
  ];
}
