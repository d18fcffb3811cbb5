import { fieldSetup } from '../../testing/answers';
import { opticsReadings, type Reading } from './optics-readings';

const setup = fieldSetup({}); // 800 mm, 130 mm, 3.76 µm, mono; guided at 200 mm with 3.75 µm; seeing 2.5″

const named = (readings: readonly Reading[], name: string) =>
  readings.find((reading) => reading.name === name);
const guidedAt = (focalLengthMm: number) =>
  opticsReadings({ ...setup, guiding: { ...setup.guiding, focalLengthMm } });

describe('what follows from the optics of a setup', () => {
  const readings = opticsReadings(setup);

  it.each([
    // Plate scale 206.264806 · pixel[µm] · binning / focal length[mm]: plane geometry.
    ['Imaging scale', readings.imaging, '0.97″ per px'],
    ['Guide scale', readings.guiding, '3.87″ per px'],
    ['Guide to imaging scale', readings.guiding, '3.99'],
    ['Guide to imaging focal length', readings.guiding, '0.25'],
    ["Dawes' limit", readings.imaging, '0.89″'], // 116 / D[mm]: W. R. Dawes, Mem. R. Astron. Soc. 35 (1867)
    ["Rayleigh's limit", readings.imaging, '1.06″'], // 1.21967 λ / D at 550 nm: Fraunhofer diffraction
    ['Seeing disc', readings.sky, '2.58 px'], // 2.5″ / 0.9694″
  ])('gives the %s', (name, group, figure) => {
    expect(named(group, name)?.figure).toBe(figure);
  });

  it('says that a guide scale of four imaging pixels is too coarse for a third of a pixel', () => {
    const ratio = named(readings.guiding, 'Guide to imaging scale');
    // A tenth of a guide pixel may be a third of an imaging pixel: ratio 10 / 3. Common practice, no source.
    expect(ratio?.meaning).toContain('Up to a ratio of 3.33');
    expect(ratio?.meaning).toContain('this setup is not there, at 0.40 px');
  });

  it('says when the guide scale is fine enough', () => {
    const ratio = named(guidedAt(400).guiding, 'Guide to imaging scale');
    expect(ratio?.meaning).toContain('this setup is there, at 0.20 px');
    expect(
      guidedAt(400)
        .sentence.map(({ text }) => text)
        .join(''),
    ).toContain('within the third');
  });

  it('sets the focal length that these cameras need beside the twofold of guiding by eye', () => {
    const meaning = named(readings.guiding, 'Guide to imaging focal length')?.meaning;
    expect(meaning).toContain('twice the focal length');
    expect(meaning).toContain('with these two cameras 0.30'); // 0.25 · 3.989 / (10 / 3)
  });

  it('says what one-shot colour does to the sampling', () => {
    const colour = opticsReadings({
      ...setup,
      imaging: { ...setup.imaging, sensor: 'one-shot colour' },
    });
    expect(named(colour.sky, 'Seeing disc')?.meaning).toContain('four photosites');
    expect(named(colour.sky, 'Seeing disc')?.meaning).toContain('1.29 samples'); // 2.58 / 2
    expect(named(readings.sky, 'Seeing disc')?.meaning).not.toContain('photosites');
  });

  it.each([
    ['fewer than two', 1],
    ['between two and four', 3],
    ['more than four', 6],
  ])('judges the seeing disc: %s pixels', (words, seeingFwhmArcsec) => {
    const { sky } = opticsReadings({ ...setup, seeingFwhmArcsec });
    expect(named(sky, 'Seeing disc')?.meaning).toContain(words);
  });

  it('names what is missing instead of a figure', () => {
    const open = opticsReadings({ ...setup, imaging: { ...setup.imaging, pixelUm: null } });
    expect(named(open.imaging, 'Imaging scale')).toMatchObject({
      figure: null,
      meaning: expect.stringContaining('pixel size'),
    });
    expect(open.scaleRatio).toBeNull();
    expect(named(open.imaging, "Dawes' limit")?.figure).toBe('0.89″');
  });

  it('does not reckon with a focal length of zero', () => {
    const open = opticsReadings({ ...setup, imaging: { ...setup.imaging, focalLengthMm: 0 } });
    expect(named(open.imaging, 'Imaging scale')?.figure).toBeNull();
  });
});
