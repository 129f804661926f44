// Sets the colours before the first paint, so that a dark page never flashes light.
(function () {
  var choice = 'system';
  try {
    choice = localStorage.getItem('siltline.theme') || 'system';
  } catch {
    // Storage may be refused: the system's colours serve.
  }
  var dark = choice === 'dark' || (choice !== 'light' && matchMedia('(prefers-color-scheme: dark)').matches);
  document.documentElement.setAttribute('data-theme', dark ? 'dark' : 'light');
})();
