import type { FigureValues } from '../../charts/index.ts';
import { nameplate, nominalVoltage } from '../../drawing/index.ts';
import { busesOf, busName, kindWords, nameOf, type Study } from '../../study/index.ts';

/** Every busbar and part with its nameplate and where it hangs. */
export function partValues(study: Study): FigureValues {
  return [
    ['kind', 'name', 'nameplate', 'at'],
    ...study.buses.map((bus) => ['busbar', nameOf(bus), nominalVoltage(bus.nominalV), '']),
    ...study.elements.map((part) => [
      kindWords[part.kind],
      nameOf(part),
      nameplate(part, study),
      busesOf(part)
        .map((id) => busName(study, id))
        .join(' to '),
    ]),
  ].map((row) => row.map((cell) => cell.replaceAll(/[\u00a0\u2009\u202f]/g, ' ')));
}
