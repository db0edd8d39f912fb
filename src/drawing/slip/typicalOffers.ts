import {
  type Cable,
  type Conductor,
  cableSizes,
  type GeneratorBuild,
  generatorReactances,
  type Motor,
  type MotorChoice,
  type Study,
  type StudyElement,
  type Transformer,
  type TransformerChoice,
  type Typical,
  typicalCable,
  typicalGenerator,
  typicalMotor,
  typicalTransformer,
} from '../../study/index.ts';

/** What the typical values depend on besides the part's rating. */
export interface TypicalChoice {
  key: string;
  label: string;
  options: readonly { value: string; label: string }[];
}

export type Chosen = Readonly<Record<string, string>>;

export interface TypicalOffer {
  /** The choices open after what was chosen so far. */
  choices(chosen: Chosen): readonly TypicalChoice[];
  values(chosen: Chosen): Typical<object>;
}

/** The chosen value of a key, or its first option. */
export function chosenOf(choices: readonly TypicalChoice[], chosen: Chosen, key: string): string {
  const options = choices.find((choice) => choice.key === key)?.options ?? [];
  const wanted = options.find(({ value }) => value === chosen[key]);
  return (wanted ?? options[0])?.value ?? '';
}

function transformerOffer(element: Transformer, study: Study): TypicalOffer {
  const choices: TypicalChoice[] = [
    {
      key: 'filling',
      label: 'filling',
      options: [
        { value: 'liquid', label: 'liquid-filled' },
        { value: 'dry', label: 'dry-type' },
      ],
    },
    {
      key: 'tier',
      label: 'losses allowed',
      options: [
        { value: '2', label: 'from July 2021, tier 2' },
        { value: '1', label: 'from July 2015, tier 1' },
      ],
    },
  ];
  return {
    choices: () => choices,
    values: (chosen) => {
      const choice: TransformerChoice = {
        tier: chosenOf(choices, chosen, 'tier') === '1' ? 1 : 2,
        filling: chosenOf(choices, chosen, 'filling') === 'dry' ? 'dry' : 'liquid',
        frequencyHz: study.frequencyHz,
        hvV: element.hvV,
        lvV: element.lvV,
      };
      return typicalTransformer(element.ratedKVA, choice);
    },
  };
}

/** Operating temperatures of conductors: common practice by insulation. */
const temperatures = [
  { value: '70', label: '70 °C, PVC at its limit' },
  { value: '90', label: '90 °C, XLPE at its limit' },
  { value: '20', label: '20 °C, cold' },
];

function cableOffer(element: Cable, study: Study): TypicalOffer {
  const conductors = [
    { value: 'copper', label: 'copper' },
    { value: 'aluminium', label: 'aluminium' },
  ];
  const metal = (chosen: Chosen): Conductor => (chosen.conductor === 'aluminium' ? 'aluminium' : 'copper');
  const choices = (chosen: Chosen): TypicalChoice[] => [
    { key: 'conductor', label: 'conductor', options: conductors },
    { key: 'mm2', label: 'cross-section', options: sizeOptions(element, metal(chosen)) },
    { key: 'temperature', label: 'conductor at', options: temperatures },
  ];
  return {
    choices,
    values: (chosen) =>
      typicalCable(
        Number(chosenOf(choices(chosen), chosen, 'mm2')),
        metal(chosen),
        Number(chosenOf(choices(chosen), chosen, 'temperature')),
        { frequencyHz: study.frequencyHz },
      ),
  };
}

/** The size nearest to the resistance the cable has stands first: the list begins where the engineer is. */
function sizeOptions(element: Cable, conductor: Conductor): { value: string; label: string }[] {
  const away = (mm2: number): number => {
    const typical = typicalCable(mm2, conductor, 70);
    return typical.ok
      ? Math.abs(Math.log(typical.values.resistanceOhmPerKm / element.resistanceOhmPerKm))
      : Number.POSITIVE_INFINITY;
  };
  const sizes = cableSizes(conductor);
  const nearest = sizes.toSorted((a, b) => away(a) - away(b))[0];
  const ordered = [nearest, ...sizes.filter((mm2) => mm2 !== nearest)].filter((mm2) => mm2 !== undefined);
  return ordered.map((mm2) => ({ value: String(mm2), label: `${mm2} mm²` }));
}

const poleNumbers = [4, 2, 6, 8] as const;

function motorOffer(element: Motor, study: Study): TypicalOffer {
  const classes = study.frequencyHz === 50 ? ['IE3', 'IE4'] : ['IE3'];
  const choices: TypicalChoice[] = [
    {
      key: 'poles',
      label: 'poles',
      options: poleNumbers.map((poles) => ({ value: String(poles), label: String(poles) })),
    },
    { key: 'class', label: 'efficiency class', options: classes.map((value) => ({ value, label: value })) },
  ];
  return {
    choices: () => choices,
    values: (chosen) => {
      const choice: MotorChoice = {
        poles: poleNumbers.find((poles) => String(poles) === chosenOf(choices, chosen, 'poles')) ?? 4,
        efficiencyClass: chosenOf(choices, chosen, 'class') === 'IE4' ? 'IE4' : 'IE3',
        frequencyHz: study.frequencyHz,
      };
      return typicalMotor(element.ratedKW, choice);
    },
  };
}

const generatorBuilds: readonly GeneratorBuild[] = ['salient-12', 'salient-more', 'round-4', 'round-2'];

function generatorOffer(): TypicalOffer {
  const choices: TypicalChoice[] = [
    {
      key: 'build',
      label: 'build',
      options: generatorBuilds.map((value) => ({ value, label: generatorReactances[value].words })),
    },
  ];
  return {
    choices: () => choices,
    values: (chosen) => {
      const wanted = chosenOf(choices, chosen, 'build');
      return typicalGenerator(generatorBuilds.find((build) => build === wanted) ?? 'salient-12');
    },
  };
}

/** Typical values there are for a part, or null where there are none. */
export function typicalOffer(element: StudyElement, study: Study): TypicalOffer | null {
  switch (element.kind) {
    case 'transformer':
      return transformerOffer(element, study);
    case 'cable':
      return cableOffer(element, study);
    case 'motor':
      return motorOffer(element, study);
    case 'generator':
      return generatorOffer();
    default:
      return null;
  }
}
