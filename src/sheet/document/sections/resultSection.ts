import type { Verdict } from '../../../checks/index.ts';
import { busName, elementsOfKind, nameOf } from '../../../study/index.ts';
import { correctionOf } from '../correctionParts.ts';
import { significant } from '../formatNumber.ts';
import type { Section } from '../model.ts';
import {
  type CaseView,
  caseName,
  type SheetView,
  solvedIn,
  solvedWithout,
  subjectName,
} from '../SheetView.ts';
import { cosPhiInWords, sitePower } from '../sitePower.ts';
import { byMargin, counted, decides, marginText, withUnit } from '../verdictWords.ts';

const sentence = (text: string): string => `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;

function busiest(view: SheetView): CaseView | undefined {
  const demands = view.cases.flatMap((item) => {
    const solution = solvedIn(item);
    const power = solution ? sitePower(item.studyHere, solution) : undefined;
    return power ? [{ item, kW: power.kW }] : [];
  });
  return demands.sort((a, b) => b.kW - a.kW || (a.item.id < b.item.id ? -1 : 1))[0]?.item;
}

/** What the study proposes, and the power factor in the busiest case with and without it. */
function correctionLine(view: SheetView): string {
  const parts = correctionOf(view.study);
  const most = busiest(view);
  const solution = most ? solvedIn(most) : undefined;
  const power = most && solution ? sitePower(most.studyHere, solution) : undefined;
  const without = most ? solvedWithout(most) : undefined;
  const bare = most && without ? sitePower(most.studyHere, without) : undefined;
  const where = most ? `In the busiest case, ${most.name}` : '';
  if (parts.length === 0) {
    const now = power ? `. ${where}: ${cosPhiInWords(power)}` : '';
    return sentence(`the study holds no bank or filter; the site is shown as it stands${now}`);
  }
  const what =
    parts.length <= 2
      ? parts.map((part) => part.summary).join('; ')
      : `${parts.length} banks and filters, ${significant(
          parts.reduce((sum, part) => sum + part.kvar, 0),
          4,
        )} kvar in all`;
  if (!power) return sentence(`${what}; the power factor was not computed: no case with a source was solved`);
  const compared = bare ? ` with the correction, ${cosPhiInWords(bare)} without` : '';
  return sentence(`${what}. ${where}: ${cosPhiInWords(power)}${compared}`);
}

function place(view: SheetView, verdict: Verdict): string {
  const limit = verdict.limit === null ? '' : ` against ${withUnit(verdict.limit, verdict.unit)}`;
  const value = withUnit(verdict.value, verdict.unit);
  return `${verdict.title} at ${subjectName(view.study, verdict)}, ${value}${limit}, in ${caseName(view, verdict.caseId)}`;
}

/** One line a check: its worst verdict stands for it. */
function worstOfEachCheck(verdicts: readonly Verdict[]): Verdict[] {
  const worst = new Map<string, Verdict>();
  for (const verdict of [...verdicts].sort(byMargin)) {
    if (!worst.has(verdict.check)) worst.set(verdict.check, verdict);
  }
  return [...worst.values()].sort(byMargin);
}

function judgementLine(view: SheetView): string {
  const count = (word: Verdict['verdict']): number =>
    view.verdicts.filter(({ verdict }) => verdict === word).length;
  const total = view.verdicts.length;
  if (total === 0) return 'No check has been computed, so nothing is judged.';
  const fails = view.verdicts.filter(({ verdict }) => verdict === 'fail');
  const tally = `${counted(total, 'verdict')} over ${counted(view.cases.length, 'case')}: ${count('pass')} pass, ${count('watch')} to watch, ${fails.length} fail, ${count('unknown')} without verdict`;
  if (fails.length === 0) return sentence(`nothing that was judged fails; ${tally}`);
  const checks = worstOfEachCheck(fails);
  const first = checks.slice(0, 2).map((verdict) => place(view, verdict));
  const more = fails.length - first.length;
  return sentence(`fails: ${first.join('; ')}${more > 0 ? `; and ${more} more` : ''}. ${tally}`);
}

function bindingLine(view: SheetView): string {
  const kept = view.verdicts
    .filter((verdict) => decides(verdict) && verdict.verdict !== 'fail')
    .sort(byMargin);
  const [first] = kept;
  if (!first) return 'No limit is kept with a margin that could be computed.';
  return sentence(`the smallest margin among the limits kept is ${marginText(first)}: ${place(view, first)}`);
}

/** Cases whose power factor misses its target with every bank and filter out of service. */
function powerFactorsMissed(view: SheetView): string[] {
  return view.cases.flatMap((item) => {
    const judged = view.verdicts.find(
      ({ check, caseId, limit }) =>
        check === 'target-pf' && caseId === item.id && limit !== null && limit <= 1,
    );
    const without = solvedWithout(item);
    const power = without ? sitePower(item.studyHere, without) : undefined;
    const limit = judged?.unit === '' ? judged.limit : null;
    if (limit === null || power?.cosPhi === undefined) return [];
    if (power.kvar <= 0 || power.cosPhi >= limit) return [];
    return [`${cosPhiInWords(power)} against ${withUnit(limit, '')} (${item.name})`];
  });
}

function limitsMissed(view: SheetView, compared: readonly Verdict[]): string[] {
  const missed = new Map<string, string>();
  for (const verdict of compared) {
    if (verdict.withoutCorrection?.verdict !== 'fail') continue;
    const label = `${verdict.title} at ${subjectName(view.study, verdict)}`;
    if (missed.has(label)) continue;
    const value = withUnit(verdict.withoutCorrection.value, verdict.unit);
    missed.set(label, `${label}, ${value} (${caseName(view, verdict.caseId)})`);
  }
  return [...missed.values()];
}

/** What fails with every bank and filter out of service. */
function withoutLine(view: SheetView): string {
  if (correctionOf(view.study).length === 0) {
    return 'With no correction in the study there is nothing to compare it with.';
  }
  const compared = view.verdicts.filter(({ withoutCorrection }) => withoutCorrection !== undefined);
  const powerFactors = powerFactorsMissed(view);
  if (compared.length === 0 && powerFactors.length === 0) {
    return 'The site without the correction has not been judged.';
  }
  const missed = [...powerFactors, ...limitsMissed(view, compared)];
  if (missed.length === 0) {
    return `Without the correction none of the ${counted(compared.length, 'verdict')} compared fails.`;
  }
  const more = missed.length - 3;
  return sentence(
    `without the correction ${missed.length === 1 ? 'this fails' : 'these fail'}: ${missed.slice(0, 3).join('; ')}${more > 0 ? `; and ${more} more` : ''}`,
  );
}

function openLine(view: SheetView): string {
  const unsolved = view.cases.filter((item) => !solvedIn(item));
  const unknown = view.verdicts.filter(({ verdict }) => verdict === 'unknown');
  const parts: string[] = [];
  if (unsolved.length > 0) parts.push(`not solved: ${unsolved.map(({ name }) => name).join(', ')}`);
  if (unknown.length > 0) {
    const titles = [...new Set(unknown.map(({ title }) => title))].slice(0, 3).join(', ');
    parts.push(`${counted(unknown.length, 'check')} without verdict for want of data (${titles})`);
  }
  const minimum = elementsOfKind(view.study, 'supply').filter(
    (supply) => supply.shortCircuitMVAMin === undefined,
  );
  if (minimum.length > 0) {
    const named = minimum
      .map((supply) => `${nameOf(supply)} at ${busName(view.study, supply.bus)}`)
      .join(', ');
    parts.push(`the minimum fault level of ${named} is not given`);
  }
  parts.push('parts are computed at their entered values, tolerances are not searched');
  return sentence(`open: ${parts.join('; ')}`);
}

/** The result in five lines, each written from what was computed. */
export function resultSection(view: SheetView): Section {
  return {
    id: 'result',
    title: 'Result',
    blocks: [
      {
        kind: 'list',
        items: [
          correctionLine(view),
          judgementLine(view),
          bindingLine(view),
          withoutLine(view),
          openLine(view),
        ],
      },
    ],
  };
}
