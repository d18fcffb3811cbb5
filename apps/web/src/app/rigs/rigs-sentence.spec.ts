import { type RigState } from '@stillpier/contract';
import { fieldRig, nightSummary, rigState } from '../../testing/answers';
import { rigsSentence } from './rigs-sentence';

const read = (...rigs: { name: string; severity: 'fine' | 'watch' | 'act' | null }[]) => {
  const examples = rigs.map(({ name }, i) => fieldRig({ name, id: idOf(i) }));
  const states: RigState[] = rigs.map(({ severity }, i) =>
    rigState({
      rigId: idOf(i),
      lastNight:
        severity === null
          ? null
          : nightSummary({ mainLimit: { code: 'periodic-error', severity } }),
    }),
  );
  return rigsSentence(examples, states)
    .map(({ text }) => text)
    .join('');
};
const idOf = (i: number) => `00000000-0000-4000-8000-00000000000${i}`;

describe('the sentence of the rigs page', () => {
  it('names the rig that needs work among several', () => {
    const sentence = read(
      { name: 'North pier', severity: 'act' },
      { name: 'Balcony', severity: 'watch' },
      { name: 'Field case', severity: null },
    );
    expect(sentence).toBe(
      'One of your three rigs needs work before the next clear night: North pier.',
    );
  });

  it('lists several that need work', () => {
    const sentence = read(
      { name: 'North pier', severity: 'act' },
      { name: 'Balcony', severity: 'act' },
    );
    expect(sentence).toContain('Two of your two rigs need work');
    expect(sentence).toContain('North pier and Balcony.');
  });

  it('does not count a single rig', () => {
    expect(read({ name: 'North pier', severity: 'act' })).toBe(
      'Something is to be done before the next clear night on North pier.',
    );
  });

  it('keeps an eye on what is to be watched', () => {
    expect(read({ name: 'Balcony', severity: 'watch' })).toContain('keep an eye on Balcony.');
  });

  it('says that nothing has to be done', () => {
    expect(read({ name: 'Balcony', severity: 'fine' })).toBe(
      'Nothing has to be done before the next clear night.',
    );
  });

  it('asks for the first log while there is no night', () => {
    expect(read({ name: 'Balcony', severity: null })).toContain('Add the first log');
  });
});
