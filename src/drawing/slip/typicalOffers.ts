import {
  type Bank,
  busById,
  type Cable,
  type Conductor,
  type ConverterBuild,
  cableSizes,
  converterTypes,
  type Filter,
  filteredOrders,
  formatNumber,
  type GeneratorBuild,
  generatorReactances,
  homeBusOf,
  type Motor,
  type MotorChoice,
  type NetworkBuild,
  networkBuilds,
  type Study,
  type StudyElement,
  type Transformer,
  type TransformerChoice,
  type Typical,
  typicalBank,
  typicalCable,
  typicalConverter,
  typicalFilter,
  typicalGenerator,
  typicalMotor,
  typicalSupply,
  typicalTransformer,
  usualDetunings,
  usualSplits,
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

function choiceOf(
  key: string,
  label: string,
  options: Readonly<Record<string, { words: string }>>,
): TypicalChoice {
  return {
    key,
    label,
    options: Object.entries(options).map(([value, { words }]) => ({ value, label: words })),
  };
}

/** The network most like the busbar stands first. */
function supplyOffer(nominalV: number): TypicalOffer {
  const { medium, substation, transformer, feeder } = networkBuilds;
  const builds =
    nominalV > 1000
      ? { medium, substation, transformer, feeder }
      : { transformer, feeder, medium, substation };
  const choices = [choiceOf('build', 'network', builds)];
  return {
    choices: () => choices,
    values: (chosen) => typicalSupply(chosenOf(choices, chosen, 'build') as NetworkBuild),
  };
}

function converterOffer(): TypicalOffer {
  const choices = [choiceOf('build', 'build', converterTypes)];
  return {
    choices: () => choices,
    values: (chosen) => typicalConverter(chosenOf(choices, chosen, 'build') as ConverterBuild),
  };
}

/** The detuning it has stands first; steps stay as they are unless a split is asked for. */
function bankOffer(element: Bank, nominalV: number): TypicalOffer {
  const own = element.detuningPercent ?? 0;
  const detunings = [own, ...usualDetunings.filter((percent) => percent !== own)];
  const kvar = element.steps.reduce((sum, step) => sum + step.kvar, 0);
  const choices: TypicalChoice[] = [
    {
      key: 'detuning',
      label: 'detuned by',
      options: detunings.map((percent) => ({
        value: String(percent),
        label: percent === 0 ? 'plain' : `${percent} %`,
      })),
    },
    {
      key: 'count',
      label: 'split into',
      options: [
        { value: '', label: 'the steps it has' },
        ...usualSplits(kvar).map((split) => ({
          value: String(split.count),
          label: `${split.count} × ${split.kvar} kvar`,
        })),
      ],
    },
  ];
  return {
    choices: () => choices,
    values: (chosen) =>
      typicalBank(
        element.steps,
        nominalV,
        Number(chosenOf(choices, chosen, 'detuning')),
        Number(chosenOf(choices, chosen, 'count')) || undefined,
      ),
  };
}

function filterOffer(element: Filter, nominalV: number): TypicalOffer {
  const choices: TypicalChoice[] = [
    {
      key: 'order',
      label: 'for order',
      options: filteredOrders.map((order) => ({ value: String(order), label: String(order) })),
    },
  ];
  return {
    choices: () => choices,
    values: (chosen) => typicalFilter(Number(chosenOf(choices, chosen, 'order')), element.type, nominalV),
  };
}

/** Typical values there are for a part, or null where there are none. */
export function typicalOffer(element: StudyElement, study: Study): TypicalOffer | null {
  const nominalV = busById(study, homeBusOf(element))?.nominalV ?? 400;
  switch (element.kind) {
    case 'supply':
      return supplyOffer(nominalV);
    case 'transformer':
      return transformerOffer(element, study);
    case 'cable':
      return cableOffer(element, study);
    case 'motor':
      return motorOffer(element, study);
    case 'generator':
      return generatorOffer();
    case 'converter':
      return converterOffer();
    case 'bank':
      return bankOffer(element, nominalV);
    case 'filter':
      return filterOffer(element, nominalV);
    default:
      return null;
  }
}

/** Typical numbers of this very part by field, of the first choices; empty where no table knows the part. */
export function typicalHints(element: StudyElement, study: Study): ReadonlyMap<string, string> {
  const typical = typicalOffer(element, study)?.values({});
  if (!typical?.ok) return new Map();
  const numbers = Object.entries(typical.values).flatMap(([key, value]): [string, string][] =>
    typeof value === 'number' && typeof typical.origins[key] === 'object' ? [[key, formatNumber(value)]] : [],
  );
  return new Map(numbers.filter(([key]) => key !== 'detuningPercent'));
}
