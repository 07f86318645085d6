// Runs before the first paint so that a dark marking room sees no white flash. lib/colour-mode.tsx takes over from here.
(() => {
  let stored = null;
  try {
    stored = localStorage.getItem('proofplate.colour-mode');
  } catch {
    // Storage may be blocked; the system's choice then decides.
  }
  const systemIsDark = matchMedia('(prefers-color-scheme: dark)').matches;
  const mode = stored === 'light' || stored === 'dark' ? stored : systemIsDark ? 'dark' : 'light';
  document.documentElement.className = mode;
  document.documentElement.style.colorScheme = mode;
  document.documentElement.style.background = mode === 'dark' ? '#16181B' : '#F6F4EF';
})();
