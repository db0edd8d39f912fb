import { formatNumber } from '../units/formatQuantity.ts';
import { interpolate, isWithin, rangeOf } from './interpolate.ts';
import {
  type EfficiencyRow,
  efficiencySource,
  ie3At50Hz,
  ie3At60Hz,
  ie4At50Hz,
} from './motorEfficiencies.ts';
import { type Typical, typicalOrigin } from './Typical.ts';

export interface MotorChoice {
  /** 4 where not said. */
  poles?: 2 | 4 | 6 | 8;
  /** 'IE3' where not said. */
  efficiencyClass?: 'IE3' | 'IE4';
  frequencyHz?: 50 | 60;
}

export interface MotorValues {
  /** Per unit, as the field has it. */
  efficiency: number;
}

function tableOf({
  efficiencyClass = 'IE3',
  frequencyHz = 50,
}: MotorChoice): readonly EfficiencyRow[] | null {
  if (efficiencyClass === 'IE3') return frequencyHz === 60 ? ie3At60Hz : ie3At50Hz;
  return frequencyHz === 50 ? ie4At50Hz : null;
}

/**
 * Efficiency at rated load by rated shaft kW, poles and class: the minimum of the class, linear between
 * ratings, within 0.2 point of the regulation's own formula for IE3 at 50 Hz. Refuses ratings outside the
 * table with its range. The power factor has no such table and stays as it is.
 */
export function typicalMotor(kW: number, choice: MotorChoice = {}): Typical<MotorValues> {
  const { poles = 4, efficiencyClass = 'IE3', frequencyHz = 50 } = choice;
  const table = tableOf(choice);
  if (!table)
    return {
      ok: false,
      error: `${efficiencySource} is read here for ${efficiencyClass} at 50 Hz alone; allowed at ${frequencyHz} Hz is IE3.`,
    };
  if (!isWithin(table, kW)) {
    const [low, high] = rangeOf(table);
    const asked = Number.isFinite(kW) ? `${formatNumber(kW)} kW` : 'this rating';
    return {
      ok: false,
      error: `There is no ${efficiencyClass} motor of ${asked} in ${efficiencySource} at ${frequencyHz} Hz; allowed is ${low} to ${high} kW.`,
    };
  }
  const percent = interpolate(table, poles / 2, kW);
  const between = table.some((row) => row[0] === kW) ? '' : ', linear between ratings';
  const source = `${efficiencySource}, ${efficiencyClass}, ${poles} poles, ${frequencyHz} Hz, minimum at rated load${between}`;
  return {
    ok: true,
    values: { efficiency: Math.round(percent * 100) / 10_000 },
    origins: { efficiency: typicalOrigin(source) },
    source: `η: ${source}.`,
  };
}
