import { version } from '../../package.json';

/** As printed on the results sheet. */
export const programmeVersion: string = version;
