import type {
  Bank,
  Converter,
  Criteria,
  DataOrigin,
  LimitChoice,
  Load,
  Motor,
  Study,
  StudyCase,
  StudyElement,
  Supply,
  Transformer,
} from '../types.ts';
import { typicalMotor } from '../typical/typicalMotor.ts';
import { typicalTransformer } from '../typical/typicalTransformer.ts';
import { formatQuantity } from '../units/formatQuantity.ts';
import { driveKinds } from './driveKinds.ts';
import { assumedSite, type SiteFigures } from './SiteAnswers.ts';
import { type LoadShares, type Share, splitLoad } from './splitLoad.ts';
import { type SuggestedBank, suggestedBank } from './suggestedBank.ts';

/** A site as drawn: what an edit puts on the paper. */
export interface DrawnSite {
  study: Study;
  shares: LoadShares;
  bank: SuggestedBank | null;
}

type Origins = Record<string, DataOrigin>;

const typicalXOverR = 10;
const eddyLossShare = 0.1;
const motorKW = 22;
const usualLoadPercent = 75;
/** Lumps below this share of the site are not worth a symbol. */
const negligible = 0.005;

/**
 * The commonest site as a study: supply, intake, transformer, main board; motors, drives and other load that
 * together draw the bill's power; a bank for `kvar` at the main board. Every value nobody gave carries its
 * origin with a note. With an unknown fault level there are two cases, so that the worse one governs.
 */
export function drawSite(figures: SiteFigures, kvar: number): DrawnSite {
  const shares = splitLoad(figures);
  const bank = suggestedBank(figures, kvar, kvaOf(shares.drives));
  const { system } = figures;
  const origins: Origins = { ...frameOrigins(figures) };
  const parts: (StudyElement | null)[] = [
    supplyOf(figures, origins),
    transformerOf(figures, origins),
    motorsOf(figures, shares, origins),
    othersOf(figures, shares, origins),
    drivesOf(figures, shares, origins),
    bank && bankOf(figures, bank, kvar, origins),
  ];
  const elements = parts.filter((part) => part !== null);
  const kind = driveKinds[figures.driveKind];
  const ownSpectrum = typeof kind.spectrum !== 'string' && elements.some(({ id }) => id === 'drives');
  const study: Study = {
    format: 'varwright-study',
    version: 1,
    title: `Site behind one transformer of ${plain(figures.ratedKVA, 'kVA')}`,
    notes: notesOf(figures),
    frequencyHz: system.frequencyHz,
    limits: limitsOf(system.frequencyHz),
    criteria: criteriaOf(figures),
    ...(ownSpectrum && typeof kind.spectrum !== 'string'
      ? {
          spectra: [
            {
              id: lowHarmonicId,
              name: 'Drives, low-harmonic',
              orders: [...kind.spectrum.rows],
              origin: kind.spectrum.origin,
            },
          ],
        }
      : {}),
    buses: [
      { id: 'intake', name: 'Intake', nominalV: system.intakeV, pcc: true },
      { id: 'main', name: 'Main board', nominalV: system.mainV },
    ],
    elements,
    cases: casesOfSite(figures),
    origins,
    view: {
      pins: [
        { quantity: 'current', element: 'supply', bus: 'intake' },
        { quantity: 'voltage', bus: 'main' },
        ...(bank ? [{ quantity: 'current', element: 'bank', bus: 'main' } as const] : []),
      ],
      focusBus: 'main',
    },
  };
  return { study, shares, bank };
}

const lowHarmonicId = 'drives-low-harmonic';

function kvaOf({ kW, kvar }: Share): number {
  return Math.hypot(kW, kvar);
}

/** Three digits, as a reader would write an estimate down. */
function round(value: number): number {
  return Number(value.toPrecision(3));
}

/** A quantity with plain spaces, for notes and names. */
function plain(value: number, unit: string): string {
  return formatQuantity(value, unit).replaceAll('\u2009', ' ');
}

function assumed(note: string): DataOrigin {
  return { origin: 'assumed', note };
}

function typical(note: string): DataOrigin {
  return { origin: 'typical', note };
}

function frameOrigins({ system, given }: SiteFigures): Origins {
  return {
    'buses.intake.nominalV': assumed(`usual above ${system.mainV} V`),
    criteria: assumed('demand current I_L and fault level at the PCC from the figures of the quick start'),
    cases: assumed('full load alone; a light-load state shows the weekend voltage and leading kvar'),
    ...(given.has('system') ? {} : { 'buses.main.nominalV': assumed('system not stated') }),
  };
}

function supplyOf(figures: SiteFigures, origins: Origins): Supply {
  const { strongMVA, weakMVA, given } = figures;
  const known = given.has('faultLevelMVA');
  origins['elements.supply.xOverR'] = typical('5 to 15 at medium voltage, common practice');
  origins['elements.supply.background'] = assumed('none taken; measure it, or ask the network operator');
  if (known) {
    origins['elements.supply.shortCircuitMVAMin'] = assumed(
      'not stated; ask the network operator for the minimum as well',
    );
  } else {
    const note = `not known: ${weakMVA} to ${strongMVA} MVA, the worse governs; ask the network operator`;
    origins['elements.supply.shortCircuitMVA'] = assumed(note);
    origins['elements.supply.shortCircuitMVAMin'] = assumed(note);
  }
  return {
    id: 'supply',
    name: 'Supply',
    kind: 'supply',
    bus: 'intake',
    shortCircuitMVA: strongMVA,
    xOverR: typicalXOverR,
    ...(known ? {} : { shortCircuitMVAMin: weakMVA }),
  };
}

function transformerOf(figures: SiteFigures, origins: Origins): Transformer {
  const { system, ratedKVA, ukPercent, given } = figures;
  const data = typicalTransformer(ratedKVA, { frequencyHz: system.frequencyHz });
  if (!data.ok) throw new RangeError(data.error);
  const { ukPercent: ukOrigin, ...lossOrigins } = data.origins;
  for (const [field, origin] of Object.entries(lossOrigins)) origins[`elements.t1.${field}`] = origin;
  if (!given.has('ukPercent')) origins['elements.t1.ukPercent'] = ukOrigin;
  if (!given.has('ratedKVA')) origins['elements.t1.ratedKVA'] = assumed('not stated');
  origins['elements.t1.vectorGroup'] = typical('usual for distribution transformers, common practice');
  origins['elements.t1.eddyLossShare'] = typical('0.01 to 0.15, common practice');
  return {
    id: 't1',
    name: 'T1',
    kind: 'transformer',
    from: 'intake',
    to: 'main',
    ratedKVA,
    hvV: system.intakeV,
    lvV: system.mainV,
    ukPercent,
    loadLossKW: data.values.loadLossKW,
    vectorGroup: system.vectorGroup,
    noLoadLossKW: data.values.noLoadLossKW,
    noLoadCurrentPercent: data.values.noLoadCurrentPercent,
    eddyLossShare,
  };
}

/** As many motors of one size as run at three quarters of their load, then the load that gives the kW exactly. */
function motorsOf(figures: SiteFigures, { motors }: LoadShares, origins: Origins): Motor | null {
  if (motors.kW < negligible * figures.kW) return null;
  const data = typicalMotor(motorKW, { frequencyHz: figures.system.frequencyHz });
  if (!data.ok) throw new RangeError(data.error);
  const { efficiency } = data.values;
  const shaftKW = motors.kW * efficiency;
  const count = Math.max(1, Math.round(shaftKW / ((motorKW * usualLoadPercent) / 100)));
  const split = assumed(`${billWords(figures)}; motors take the kvar that drives and transformer leave`);
  origins['elements.motors.ratedKW'] = assumed('all motors of the site as one size');
  origins['elements.motors.count'] = split;
  origins['elements.motors.loadPercent'] = split;
  origins['elements.motors.powerFactor'] = split;
  origins['elements.motors.efficiency'] = data.origins.efficiency;
  return {
    id: 'motors',
    name: 'Motors',
    kind: 'motor',
    bus: 'main',
    ratedKW: motorKW,
    count,
    loadPercent: round((100 * shaftKW) / (motorKW * count)),
    efficiency,
    powerFactor: round(motors.kW / kvaOf(motors)),
  };
}

function othersOf(figures: SiteFigures, { others }: LoadShares, origins: Origins): Load | null {
  if (others.kW < negligible * figures.kW) return null;
  origins['elements.others.kW'] = assumed(`${billWords(figures)}; what motors and drives leave`);
  origins['elements.others.powerFactor'] = assumed('heating and lighting');
  return {
    id: 'others',
    name: 'Other load',
    kind: 'load',
    bus: 'main',
    kW: round(others.kW),
    powerFactor: 1,
    model: 'impedance',
  };
}

function drivesOf(figures: SiteFigures, { drives }: LoadShares, origins: Origins): Converter | null {
  if (drives.kW < negligible * figures.kW) return null;
  const kind = driveKinds[figures.driveKind];
  const share = `${plain(figures.drivesPercent, '%')} of the load below the transformer`;
  origins['elements.drives.kW'] = assumed(
    figures.given.has('drivesPercent') ? share : `${share}; share not stated`,
  );
  origins['elements.drives.powerFactor'] = typical(
    'cos φ1 of the bridge, common practice, or what the bill leaves',
  );
  origins['elements.drives.spectrum'] = typical(
    `${figures.given.has('driveKind') ? '' : 'kind not stated: '}drives ${kind.label}, all as one, at this load`,
  );
  return {
    id: 'drives',
    name: 'Drives',
    kind: 'converter',
    bus: 'main',
    kW: round(drives.kW),
    powerFactor: Math.min(1, round(drives.kW / kvaOf(drives))),
    spectrum: typeof kind.spectrum === 'string' ? kind.spectrum : lowHarmonicId,
  };
}

function bankOf(figures: SiteFigures, bank: SuggestedBank, kvar: number, origins: Origins): Bank {
  const { steps, stepKvar, ratedV, detuningPercent, givesKvar, reason } = bank;
  origins['elements.bank.steps'] = assumed(
    `suggested: ${plain(kvar, 'kvar')} for cos φ ${figures.targetPF}, the steps give ${plain(givesKvar, 'kvar')} at ${figures.system.mainV} V`,
  );
  origins['elements.bank.ratedV'] = typical('about a tenth above the busbar, common practice');
  origins['elements.bank.detuningPercent'] = assumed(reason);
  return {
    id: 'bank',
    name: 'Bank, suggested',
    kind: 'bank',
    bus: 'main',
    steps: Array.from({ length: steps }, () => ({ kvar: stepKvar })),
    ratedV,
    ...(detuningPercent > 0 ? { detuningPercent } : {}),
  };
}

function limitsOf(frequencyHz: 50 | 60): LimitChoice {
  const internal = 'iec-61000-2-4-class-2';
  return frequencyHz === 60
    ? { pcc: 'ieee-519-2022', internal, current: 'ieee-519-2022', capacitor: 'ieee-18' }
    : { pcc: 'en-50160', internal, current: 'ieee-519-2022', capacitor: 'iec-60831-1' };
}

/** I_L = S/(√3·U) of the peak at the intake; the weaker fault level chooses the stricter row of limits. */
function criteriaOf({ kW, kvar, system, weakMVA, targetPF }: SiteFigures): Criteria {
  const demandCurrentA = round((1000 * Math.hypot(kW, kvar)) / (Math.sqrt(3) * system.intakeV));
  return { targetPF, demandCurrentA, shortCircuitMVAAtPcc: weakMVA };
}

/** The plain case keeps the id of the base study: what is corrected in it holds in both. */
function casesOfSite({ strongMVA, weakMVA }: SiteFigures): StudyCase[] {
  if (strongMVA === weakMVA) return [{ id: 'base', name: 'Full load', role: 'load', changes: [] }];
  return [
    { id: 'base', name: `Strong supply, ${strongMVA} MVA`, role: 'load', changes: [] },
    {
      id: 'weak',
      name: `Weak supply, ${weakMVA} MVA`,
      role: 'load',
      changes: [{ element: 'supply', set: { shortCircuitMVA: weakMVA } }],
    },
  ];
}

function billWords({ activeKWh, reactiveKvarh, kW, given }: SiteFigures): string {
  const source = given.has('activeKWh') || given.has('peakKW') ? 'from the bill' : 'assumed bill';
  return `${source}, ${plain(activeKWh, 'kWh')} and ${plain(reactiveKvarh, 'kvarh')} at ${plain(kW, 'kW')}`;
}

function notesOf(figures: SiteFigures): string {
  const { loading, cosPhi, hours } = assumedSite;
  const guessed = figures.given.has('activeKWh')
    ? ''
    : ` The bill itself is assumed: ${100 * loading} % of the transformer at cos φ ${cosPhi} for ${hours} h.`;
  return `Drawn by the quick start, ${billWords(figures)}. The bill is taken as metered at the intake without any correction in service, and its cos φ as that of the peak.${guessed}`;
}
