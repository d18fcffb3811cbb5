// Sets the theme before the first paint, so that no other theme flashes up. A file of its own: the content security
// policy allows no inline script. theme-choice.ts writes the key.
(function () {
  let chosen = null;
  try {
    chosen = localStorage.getItem('stillpier-theme');
  } catch {
    // Storage is off: follow the system.
  }
  if (chosen !== 'day' && chosen !== 'night' && chosen !== 'red') {
    chosen = matchMedia('(prefers-color-scheme: dark)').matches ? 'night' : 'day';
  }
  document.documentElement.className = 'theme-' + chosen;
})();
