import { columnMapPathsOf, ownColumnMapPaths, type SavedColumnMap } from '@stillpier/contract';
import { showComponent } from '../../testing/page-under-test';
import { ColumnMapList } from './column-map-list';

const RIG = '00000000-0000-4000-8000-000000000001';
const paths = columnMapPathsOf(RIG);
const MAP: SavedColumnMap = {
  id: '00000000-0000-4000-8000-000000000031',
  rigId: RIG,
  name: 'dome computer',
  headerCells: ['clock', 'dRA', 'dDec'],
  map: { columns: { clock: { role: 'time', unit: 'clock' }, x: { role: 'ignore' } } },
  createdAt: '2026-05-09T10:00:00Z',
};

async function showMaps(maps: SavedColumnMap[] = [MAP], mayEdit = true) {
  const inputs = { owner: RIG, title: 'Column maps', mayEdit };
  const shown = await showComponent(ColumnMapList, inputs);
  shown.http.expectOne(paths.all).flush(maps);
  await shown.settle();
  const takeIn = async (name: string, text: string) => {
    const input = shown.page.querySelector<HTMLInputElement>('input[type=file]')!;
    Object.defineProperty(input, 'files', { value: [new File([text], name)], configurable: true });
    Object.defineProperty(input, 'value', { value: '', writable: true, configurable: true });
    input.dispatchEvent(new Event('change'));
    await shown.settle();
  };
  return { ...shown, takeIn };
}

describe('ColumnMapList', () => {
  it('says which header a map recognises, and gives it as a file', async () => {
    const { page } = await showMaps();
    expect(page.textContent).toContain('1 of 2 columns used; clock, dRA, dDec');
    expect(page.querySelector('li a')?.getAttribute('href')).toBe(paths.file(MAP.id));
  });

  it('gives a map another name, and lets the old one go only when the new one stands', async () => {
    const { http, page, press, settle, type } = await showMaps();
    page.querySelector<HTMLElement>('[aria-label^="Rename"]')!.click();
    await settle();
    type('Name of the map', 'pier computer');
    press('Save the name');
    const made = http.expectOne({ method: 'POST', url: paths.all });
    const { headerCells, map } = MAP;
    expect(made.request.body).toEqual({ name: 'pier computer', headerCells, map });
    http.expectNone({ method: 'DELETE', url: paths.one(MAP.id) });
    made.flush({ ...MAP, id: '00000000-0000-4000-8000-000000000032', name: 'pier computer' });
    await settle();
    http.expectOne({ method: 'DELETE', url: paths.one(MAP.id) }).flush(null);
    await settle();
    http.expectOne({ method: 'GET', url: paths.all }).flush([{ ...MAP, name: 'pier computer' }]);
    await settle();
    expect(page.querySelector('form')).toBeNull();
    expect(page.querySelector('li b')?.textContent).toBe('pier computer');
  });

  it('takes in a map that came as a file, under the name of the file', async () => {
    const { http, page, settle, takeIn } = await showMaps([]);
    await takeIn('club.json', '{"delimiter":";"}');
    const made = http.expectOne((request) => request.url === paths.files);
    expect(made.request.params.get('name')).toBe('club');
    expect(made.request.body).toEqual({ delimiter: ';' });
    made.flush({ ...MAP, headerCells: null, name: 'club' });
    await settle();
    http.expectOne(paths.all).flush([{ ...MAP, headerCells: null, name: 'club' }]);
    await settle();
    expect(page.textContent).toContain('every header with the columns that it names');
  });

  it.each([
    ['is no JSON', 'delimiter=;'],
    ['has a fault', '{"delimiter":"x"}'],
  ])('says so of a file that %s', async (_case, text) => {
    const { http, page, takeIn } = await showMaps([]);
    await takeIn('club.json', text);
    expect(page.querySelector('[role=alert]')?.textContent).toContain('club.json is no column map');
    http.verify();
  });

  it('shows an advisor the maps and nothing to change them', async () => {
    const { page } = await showMaps([MAP], false);
    expect(page.querySelector('button, input')).toBeNull();
    expect(page.querySelector('li a')).not.toBeNull();
  });

  it('holds the maps of a person in the same way', async () => {
    const shown = await showComponent(ColumnMapList, { owner: null, title: 'x', mayEdit: true });
    shown.http.expectOne(ownColumnMapPaths.all).flush([]);
    await shown.settle();
    expect(shown.page.textContent).toContain('No map is saved.');
  });
});
