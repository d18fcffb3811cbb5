import type { NightRun, Setup } from '@stillpier/contract';
import type { ShownRun } from './shown-run';
import { subChoices } from './sub-choices';

const runOf = (setupId: string, lengthSeconds: number): ShownRun => ({
  ...{ id: 'r', number: 1, name: 'M 33', startMs: 0 },
  of: { setupId, run: { subs: { lengthSeconds } } } as unknown as NightRun,
});
const setup = (id: string, filters: Setup['filters']) => ({ id, filters }) as Setup;

describe('the lengths of a sub to choose', () => {
  it('are those of the filters first, then common ones, each once', () => {
    const choices = subChoices(
      [runOf('s', 300)],
      [
        setup('s', [
          { name: 'Ha', subSeconds: 600 },
          { name: 'L', subSeconds: 120 },
          { name: 'OIII', subSeconds: 600 },
        ]),
        setup('other', [{ name: 'SII', subSeconds: 45 }]),
      ],
    );
    const space = '\u00a0';
    expect(choices.map(({ text }) => text.replace(space, ' '))).toEqual([
      ...['L 120 s', 'Ha, OIII 600 s'],
      ...['60 s', '180 s', '300 s', '900 s', '1200 s', '1800 s'],
    ]);
  });

  it('hold the length that the document was worked out with', () => {
    expect(subChoices([runOf('s', 240)], []).map(({ seconds }) => seconds)).toContain(240);
  });
});
