import { casesOf, studyInCase } from '../cases.ts';
import type { SiteFinding, Study } from '../types.ts';
import { capacitorFindings } from './capacitors.ts';
import { caseListFindings } from './caseFindings.ts';
import { coverageFindings } from './coverage.ts';
import { criteriaFindings } from './criteria.ts';
import { feedingFindings } from './feeding.ts';
import { fractionFindings } from './fractions.ts';
import { nameFindings } from './names.ts';
import { originFindings } from './origins.ts';
import { parallelFindings } from './parallelTransformers.ts';
import { partDataFindings } from './partData.ts';
import { placedFinding } from './placedFinding.ts';
import type { Repair, Said, State } from './Said.ts';
import { sourceFindings } from './sources.ts';
import { spectrumFindings } from './spectra.ts';
import { voltageFindings } from './voltages.ts';

/** Families that look at one operating state. */
const stateFamilies: readonly ((state: State) => Said[])[] = [
  feedingFindings,
  parallelFindings,
  voltageFindings,
  capacitorFindings,
  fractionFindings,
];

/** Families that look at the study as it is written. */
const studyFamilies: readonly ((study: Study) => Said[])[] = [
  sourceFindings,
  partDataFindings,
  spectrumFindings,
  criteriaFindings,
  nameFindings,
  caseListFindings,
  coverageFindings,
  originFindings,
];

const remembered = new WeakMap<Study, SiteFinding[]>();

/**
 * What is missing or odd about a site that can be solved, gravest first: each with its part, quantity, value
 * and unit, what is allowed, and what would mend it. Families of operating states are asked in every case; what
 * holds in all of them is said once. Nothing here refuses the study. Remembered per study.
 */
export function siteFindings(study: Study): SiteFinding[] {
  const known = remembered.get(study);
  if (known) return known;
  const found = study.buses.length === 0 ? [] : gathered(study);
  remembered.set(study, found);
  return found;
}

const rank: Record<SiteFinding['severity'], number> = { error: 0, warning: 1, note: 2 };

function gathered(study: Study): SiteFinding[] {
  const said = [
    ...overCases(study),
    ...studyFamilies.flatMap((family) => family(study).map(whateverTheCase)),
  ];
  return said
    .map(({ said: one, cases, repairs }) => placedFinding(study, one, cases, repairs))
    .toSorted((a, b) => rank[a.severity] - rank[b.severity]);
}

interface InCases {
  said: Said;
  /** Empty where it holds whatever the case. */
  cases: readonly string[];
  repairs: readonly Repair[];
}

function whateverTheCase(said: Said): InCases {
  return { said, cases: [], repairs: said.repair ? [said.repair] : [] };
}

/** Every state family in every case; equal words on one field are one finding. */
function overCases(study: Study): InCases[] {
  const cases = casesOf(study);
  const gathering = new Map<string, { said: Said; cases: string[]; repairs: Map<string, Repair> }>();
  for (const { id } of cases) {
    const state = { base: study, here: studyInCase(study, id), caseId: id };
    for (const said of stateFamilies.flatMap((family) => family(state))) {
      const key = JSON.stringify([said.code, said.subject, said.field, said.text]);
      const one = gathering.get(key) ?? { said, cases: [], repairs: new Map<string, Repair>() };
      one.cases.push(id);
      if (said.repair) one.repairs.set(said.repair.scope, said.repair);
      gathering.set(key, one);
    }
  }
  return [...gathering.values()].map(({ said, cases: held, repairs }) => ({
    said,
    cases: held.length === cases.length ? [] : held,
    repairs: [...repairs.values()],
  }));
}
