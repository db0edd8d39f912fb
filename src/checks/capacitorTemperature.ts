import { nameOf, withDefaults } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { bankXc } from './correctionBranch.ts';
import { figure } from './figure.ts';
import { judgedOnce } from './judgedOnce.ts';
import { temperatureClasses, temperatureSource } from './limits/temperatureClasses.ts';
import { type LiveBank, liveBanks } from './liveBanks.ts';
import { partRow } from './partRow.ts';
import type { Verdict, Working } from './types.ts';
import { judged, unknown } from './verdict.ts';

/**
 * Air in the cubicle at its hottest against the capacitors' temperature class (capacitor-temperature), with
 * the losses that heat it: the capacitors' by their W/kvar, the chokes' by the currents of all orders. Judged
 * once a bank: the air is entered for the hottest day with all steps on.
 */
export function capacitorTemperature(context: CheckContext): Verdict[] {
  return liveBanks(context).flatMap((live) =>
    judgedOnce(context, live.bank.id) ? [atBank(context, live)] : [],
  );
}

function atBank(context: CheckContext, live: LiveBank): Verdict {
  const { bank } = live;
  const row = partRow(context, bank.id, {
    check: 'capacitor-temperature',
    title: 'air at the capacitors',
    unit: '°C',
    source: temperatureSource,
  });
  const losses = lossWorking(context, live);
  const named = bank.temperatureClass;
  const air = bank.cubicleAirC;
  if (named === undefined || air === undefined) {
    const absent = [
      named === undefined ? 'the temperature class of the capacitors' : '',
      air === undefined ? 'the hottest air in the cubicle' : '',
    ].filter((words) => words !== '');
    return unknown(
      { ...row, working: () => losses },
      `enter ${absent.join(' and ')} of ${nameOf(bank)}`,
      air ?? null,
      named === undefined ? null : temperatureClasses[named].highestC,
    );
  }
  const { highestC, dayMeanC, yearMeanC } = temperatureClasses[named];
  return judged({
    ...row,
    value: air,
    limit: highestC,
    // A tenth of a temperature in °C means nothing; five degrees in hand is common practice.
    watchBelow: 5 / highestC,
    working: () => [
      {
        equation: `hottest air against class ${named}`,
        numbers: `${figure(air)} °C, allowed ${highestC} °C (${dayMeanC} °C over a day, ${yearMeanC} °C over a year)`,
      },
      ...losses,
    ],
    mend: 'Ventilate the cubicle for the losses shown, part chokes and capacitors, or choose capacitors of a higher class.',
  });
}

function lossWorking(context: CheckContext, { bank, bus, terminal, kvar, p }: LiveBank): Working[] {
  const { solved } = context;
  const full = withDefaults(bank, bus);
  const capacitorW =
    full.lossWPerKvar * kvar * (solved.lineVolts(solved.bus(bus.id), 1, 0) / bank.ratedV) ** 2;
  const [share, exponent] = full.reactorSkin;
  const resistance = (p * (bankXc(bank) ?? 0)) / full.reactorQ;
  let chokeW = 0;
  for (let h = 1; h <= solved.maxOrder; h++)
    for (let phase = 0; phase < 3; phase++)
      chokeW += solved.amperes(terminal, h, phase) ** 2 * resistance * (1 - share + share * h ** exponent);
  return [
    {
      equation: p > 0 ? 'losses in the cubicle: capacitors + chokes' : 'losses in the cubicle: capacitors',
      numbers:
        p > 0
          ? `${figure(capacitorW, 3)} W + ${figure(chokeW, 3)} W = ${figure(capacitorW + chokeW, 3)} W in this case`
          : `${figure(capacitorW, 3)} W in this case`,
    },
  ];
}
