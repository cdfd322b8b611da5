/* Runs before the first paint, so that a page chosen dark never flashes white. `src/lib/colour-scheme.ts`
   keeps the choice and follows the system afterwards; both use the key `windchest.colour-scheme`. */
(function () {
  var choice = null;
  try {
    choice = localStorage.getItem('windchest.colour-scheme');
  } catch {
    choice = null;
  }
  var dark = choice === 'dark' || (choice !== 'light' && matchMedia('(prefers-color-scheme: dark)').matches);
  document.documentElement.classList.toggle('dark', dark);
})();
