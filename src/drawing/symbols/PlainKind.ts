/** Kinds whose symbol depends on no data. */
export type PlainKind =
  | 'supply'
  | 'generator'
  | 'transformer'
  | 'cable'
  | 'reactor'
  | 'motor'
  | 'converter'
  | 'load';
