/** Kept with every document: raised when the same log may come out with other figures than before. */
export const ANALYSIS_VERSION = '2';
