// Before the first paint, so that a dark page does not flash up white. The application's AppearanceStore takes over.
try {
  const chosen = localStorage.getItem('layerwright.appearance');
  if (chosen === 'light' || chosen === 'dark') document.documentElement.dataset.appearance = chosen;
} catch {
  // Storage is closed to us: the system's appearance it is.
}
