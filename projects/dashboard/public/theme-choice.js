// Before the first paint, so that a chosen dark theme never flashes light. Its twin is core/shell/theme-choice.ts.
(function () {
  try {
    var choice = localStorage.getItem('underseam.theme');
    if (choice === 'light' || choice === 'dark') document.documentElement.dataset.theme = choice;
  } catch {
    // Storage is switched off: the device decides.
  }
})();
