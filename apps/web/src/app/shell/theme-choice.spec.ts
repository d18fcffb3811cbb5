import { TestBed } from '@angular/core/testing';
import { ThemeChoice } from './theme-choice';

describe('the choice of theme', () => {
  const root = document.documentElement;

  beforeEach(() => {
    localStorage.clear();
  });
  afterEach(() => {
    vi.restoreAllMocks();
  });

  it('follows the system until one is chosen', () => {
    const system = systemTheme({ dark: true });
    const choice = TestBed.inject(ThemeChoice);
    expect(choice.theme()).toBe('night');
    expect(root.className).toBe('theme-night');

    system.turn({ dark: false });
    expect(choice.theme()).toBe('day');
    expect(root.className).toBe('theme-day');
  });

  it('keeps what was chosen on this device, whatever the system says', () => {
    const system = systemTheme({ dark: false });
    TestBed.inject(ThemeChoice).choose('red');
    system.turn({ dark: true });
    expect(root.className).toBe('theme-red');

    TestBed.resetTestingModule();
    expect(TestBed.inject(ThemeChoice).theme()).toBe('red');
  });

  it('takes a stored name that it does not know for none', () => {
    localStorage.setItem('stillpier-theme', 'sepia');
    expect(TestBed.inject(ThemeChoice).theme()).toBe('day');
  });

  it('changes the theme where nothing can be stored', () => {
    vi.spyOn(Storage.prototype, 'setItem').mockImplementation(() => {
      throw new DOMException('storage is off', 'SecurityError');
    });
    TestBed.inject(ThemeChoice).choose('night');
    expect(root.className).toBe('theme-night');
  });
});

/** A system that is light or dark, and can turn. */
function systemTheme({ dark }: { dark: boolean }) {
  const query = Object.assign(matchMedia(''), { matches: dark });
  vi.spyOn(window, 'matchMedia').mockReturnValue(query);
  return {
    turn(to: { dark: boolean }) {
      query.dispatchEvent(Object.assign(new Event('change'), { matches: to.dark }));
    },
  };
}
