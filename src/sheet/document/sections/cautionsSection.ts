import { elementsOfKind, type Study } from '../../../study/index.ts';
import type { Section } from '../model.ts';
import type { SheetView } from '../SheetView.ts';

/** Cautions on stored charge. The first two lines stand on the first page as well. */
export const FRONT_CAUTION = [
  'Capacitors stay charged after isolation; discharge devices can fail: isolate, lock, wait, prove dead, earth and short.',
  'Local codes, the network operator’s rules and the responsible licensed engineer decide. This sheet is a calculation aid.',
];

const ALWAYS = [
  'Capacitors hold a dangerous charge after disconnection even where discharge devices are fitted, as these can fail. Isolate, lock off, wait the time stated on the nameplate, prove dead, earth and short every terminal before touching.',
  'Never re-energise a step before it has discharged; the controller’s delay must be longer than the discharge time.',
  'Never approach a bulging, leaking or noisy capacitor while it is live.',
  'Never open the secondary circuit of a current transformer under load.',
  'Work near live switchgear needs an arc-flash study and the protective equipment it asks for.',
  'Harmonics change with the loads and with the network: repeat the study when either changes.',
  'Measurements at commissioning supersede computed values: current of each step, voltage rise, distortion with the bank on and off, capacitance of each phase, discharge time.',
  'The results are a calculation aid. A qualified and, where required, licensed engineer decides; local code and the network operator’s rules prevail.',
];

function conditional(study: Study): string[] {
  const generators = elementsOfKind(study, 'generator').length > 0;
  const motors = elementsOfKind(study, 'motor').length > 0;
  const medium = study.buses.some(({ nominalV }) => nominalV > 1000);
  return [
    ...(generators
      ? [
          'Interlock capacitor banks off on generator supply unless the machine’s capability curve proves them harmless.',
        ]
      : []),
    ...(motors
      ? [
          'A bank behind a motor’s own switch can self-excite the motor after switching off; restart only after the voltage has died away.',
        ]
      : []),
    ...(medium
      ? ['Work on medium-voltage equipment is for authorised persons under the site’s switching rules.']
      : []),
  ];
}

/** Cautions customary on such documents, and those the parts of this study ask for. */
export function cautionsSection(view: SheetView): Section {
  return {
    id: 'cautions',
    title: 'Cautions',
    blocks: [
      { kind: 'list', items: [...ALWAYS.slice(0, -1), ...conditional(view.study), ...ALWAYS.slice(-1)] },
    ],
  };
}
