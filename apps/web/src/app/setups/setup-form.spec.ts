import { setupPaths } from '@stillpier/contract';
import { fieldSetup } from '../../testing/answers';
import { showComponent } from '../../testing/page-under-test';
import { SetupForm } from './setup-form';

const show = (setup: ReturnType<typeof fieldSetup> | null, mayEdit = true) =>
  showComponent(SetupForm, { rigId: 'rig', rigName: 'North pier', setup, mayEdit });

const noteOf = (page: HTMLElement, name: string) =>
  [...page.querySelectorAll('.note')].find((note) => note.textContent.includes(name))?.textContent;

describe('the form of a setup', () => {
  it('works the figures out while typing', async () => {
    const shown = await show(fieldSetup({}));
    expect(noteOf(shown.page, 'Guide to imaging scale')).toContain('3.99');
    shown.type('Pixel size, µm', '7.52'); // twice the imaging pixel: half the ratio
    await shown.settle();
    expect(noteOf(shown.page, 'Guide to imaging scale')).toContain('1.99');
    expect(shown.page.querySelector('h1')?.textContent).toContain('0.20 px');
  });

  it('says what is missing in a new setup and draws nothing', async () => {
    const shown = await show(null);
    expect(noteOf(shown.page, 'Imaging scale')).toContain('does not tell the imaging focal length');
    expect(shown.page.querySelector('app-pixel-figure')).toBeNull();
  });

  it('offers the usual filters once, with minutes or longer as their subs', async () => {
    const shown = await show(null);
    shown.press('H-alpha, O III, S II');
    await shown.settle();
    expect(shown.fixture.componentInstance.form.getRawValue().filters).toEqual([
      { name: 'H-alpha', subSeconds: 1200 },
      { name: 'O III', subSeconds: 1200 },
      { name: 'S II', subSeconds: 1200 },
    ]);
    expect(shown.page.textContent).not.toContain('Luminance, red');
  });

  it('sends a setup as the contract has it, and tells the version that was saved', async () => {
    const setup = fieldSetup({});
    const shown = await show(setup);
    const saved = vi.fn();
    shown.fixture.componentInstance.saved.subscribe(saved);
    shown.type('Name of the setup', 'Refractor with reducer');
    shown.press('Save the setup');
    await shown.settle();
    const sent = shown.http.expectOne({
      method: 'PUT',
      url: setupPaths.one(setup.rigId, setup.id),
    });
    expect(sent.request.headers.get('If-Match')).toBe('"2"');
    expect(sent.request.body).toMatchObject({ name: 'Refractor with reducer', keepAspect: 1.15 });
    sent.flush({ ...setup, name: 'Refractor with reducer', version: 3 });
    await shown.settle();
    expect(saved).toHaveBeenCalledWith(expect.objectContaining({ version: 3 }));
  });

  it('lets an advisor read and not write', async () => {
    const shown = await show(fieldSetup({}), false);
    expect(shown.page.querySelectorAll('input:enabled, select:enabled')).toHaveLength(0);
    expect(noteOf(shown.page, 'Imaging scale')).toContain('0.97″ per px');
  });
});
