import { editToResults } from './engineFigures.ts';

/** Milliseconds from edit to results of a site of argv[2] busbars, alone in its process as a study is in its worker. */
console.log(editToResults(Number(process.argv[2]), 2500));
