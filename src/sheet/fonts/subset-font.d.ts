declare module 'subset-font' {
  interface SubsetOptions {
    targetFormat?: 'sfnt' | 'woff' | 'woff2';
    keepFeatures?: string[];
    keepAllGlyphs?: boolean;
    noHinting?: boolean;
    preserveNameIds?: number[];
  }
  export default function subsetFont(
    font: Buffer,
    text: string | undefined,
    options?: SubsetOptions,
  ): Promise<Buffer>;
}
