// Sets the theme before the first paint. A file of its own because the page allows no inline script.
// The store in src/stores/preferences.ts takes over as soon as the app has started.
;(function () {
  let chosen = null
  try {
    chosen = JSON.parse(localStorage.getItem('toehold:preferences') ?? 'null')?.theme ?? null
  } catch {
    // No storage, or not ours: the system decides.
  }
  const isDark =
    chosen === 'dark' || (chosen !== 'light' && matchMedia('(prefers-color-scheme: dark)').matches)
  document.documentElement.dataset.theme = isDark ? 'dark' : 'light'
})()
