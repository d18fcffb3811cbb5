import { besideKeys } from './note-places';

// DESIGN §4 "Placing notes": the first line at the y of the key, else 26 px below the note above.
describe('notes in the margin', () => {
  it('stand with the middle of their first line, 11 px down, at the height of their key', () => {
    expect(besideKeys([{ keyPx: 111, heightPx: 60 }])).toEqual([100]);
  });

  it('follow the note above where it reaches too low', () => {
    const notes = [
      { keyPx: 111, heightPx: 60 },
      { keyPx: 140, heightPx: 40 },
      { keyPx: 411, heightPx: 40 },
    ];
    // the first ends at 160, the second at 226; 26 px below it 252, and 400 is 148 further
    expect(besideKeys(notes)).toEqual([100, 0, 148]);
  });

  it('flow without a key', () => {
    expect(besideKeys([{ keyPx: null, heightPx: 60 }])).toEqual([0]);
  });
});
