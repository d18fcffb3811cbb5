import type { Night, NightSummary } from '@stillpier/contract';

/** The first sentence of a night page, in parts; its numbers are the strong ones. */
export function sentenceOf(summary: NightSummary): Night['sentence'] {
  const { raRmsArcsec, decRmsArcsec, runCount } = summary;
  const runs = runCount === 1 ? '1 run' : `${runCount} runs`;
  if (raRmsArcsec === null || decRmsArcsec === null) {
    return [{ text: `Too few frames to measure in ${runs}.`, strong: false }];
  }
  return [
    { text: 'RA ', strong: false },
    { text: `${raRmsArcsec.toFixed(2)}″`, strong: true },
    { text: ' and Dec ', strong: false },
    { text: `${decRmsArcsec.toFixed(2)}″`, strong: true },
    { text: ` RMS over ${runs}.`, strong: false },
  ];
}
