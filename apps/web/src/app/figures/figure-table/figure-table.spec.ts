import { TestBed } from '@angular/core/testing';
import { FigureTable } from './figure-table';

function renderTable() {
  const fixture = TestBed.createComponent(FigureTable);
  fixture.componentRef.setInput('of', 'Spectrum');
  fixture.componentRef.setInput('columns', [
    { head: 'Name', numeric: false },
    { head: 'Period', numeric: true },
  ]);
  fixture.componentRef.setInput('rows', [['worm', '480 s']]);
  return { fixture, page: fixture.nativeElement as HTMLElement };
}

describe('FigureTable', () => {
  it('keeps its rows out of the page until they are asked for', async () => {
    const { fixture, page } = renderTable();
    await fixture.whenStable();
    expect(page.querySelector('table')).toBeNull();

    const details = page.querySelector('details')!;
    details.open = true;
    details.dispatchEvent(new Event('toggle'));
    await fixture.whenStable();
    expect(page.querySelector('td')?.textContent).toBe('worm');
    expect(page.querySelector('td.numeric')?.textContent).toBe('480 s');
    expect(page.querySelector('caption')?.textContent.trim()).toBe('Spectrum');
  });
});
