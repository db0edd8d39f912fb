import { elementsOfKind } from '../lookup.ts';
import type { Cable, Motor, Study } from '../types.ts';
import { formatQuantity } from '../units/formatQuantity.ts';
import { type Said, saidOfPart } from './Said.ts';

/** Shorter than this a cable is a link, or its length was given in km. */
const shortestCableM = 0.5;

/** Data of motors and cables that are missing or hardly meant. */
export function partDataFindings(study: Study): Said[] {
  return [
    ...elementsOfKind(study, 'motor').flatMap(motorFindings),
    ...elementsOfKind(study, 'cable').flatMap(cableFindings),
  ];
}

function motorFindings(motor: Motor): Said[] {
  if (motor.efficiency !== undefined || motor.powerFactor !== undefined) return [];
  return [
    saidOfPart(motor, 'efficiency', {
      code: 'motor-data',
      severity: 'note',
      text: 'neither efficiency nor cos φ is given; 0.94 and 0.85 are assumed, and its kW and kvar rest on them',
      mend: 'take both from the nameplate, or set the typical values of its size on the slip',
    }),
  ];
}

function cableFindings(cable: Cable): Said[] {
  if (cable.lengthM >= shortestCableM) return [];
  return [
    saidOfPart(cable, 'lengthM', {
      code: 'cable-length',
      severity: 'warning',
      text: `${formatQuantity(cable.lengthM, 'm')} is next to no length; lengths are in metres`,
      mend: `enter metres (${formatQuantity(1000 * cable.lengthM, 'm')} where km were meant), or use a bus coupler for a link`,
    }),
  ];
}
