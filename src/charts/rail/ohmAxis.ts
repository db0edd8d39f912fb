import { scaleLog } from 'd3';

/** Logarithmic |Z| axis with decade marks that carry a unit. */
export interface OhmAxis {
  y(ohm: number): number;
  decades: { ohm: number; y: number; label: string }[];
}

const SMALLEST_SPAN = 10;

/** Axis showing at least one decade; `top` and `bottom` are the y of the largest and smallest ohm. */
export function ohmAxis(extent: { min: number; max: number }, top: number, bottom: number): OhmAxis {
  const middle = Math.sqrt(extent.min * extent.max);
  const min = Math.min(extent.min, middle / Math.sqrt(SMALLEST_SPAN));
  const max = Math.max(extent.max, middle * Math.sqrt(SMALLEST_SPAN));
  const scale = scaleLog().domain([min, max]).range([bottom, top]);
  const decades = [];
  for (let power = Math.ceil(Math.log10(min)); power <= Math.floor(Math.log10(max)); power++) {
    const ohm = 10 ** power;
    decades.push({ ohm, y: scale(ohm), label: decadeLabel(power) });
  }
  return { y: (ohm) => scale(ohm), decades };
}

function decadeLabel(power: number): string {
  const unit = power >= 3 ? 'kΩ' : power >= 0 ? 'Ω' : power >= -3 ? 'mΩ' : 'µΩ';
  const shift = power >= 3 ? 3 : power >= 0 ? 0 : power >= -3 ? -3 : -6;
  const digits = power - shift;
  return `${digits >= 0 ? 10 ** digits : (10 ** digits).toPrecision(1)} ${unit}`;
}
