// Runs before the first paint so that a chosen theme never flashes the other one; a separate file because
// the content security policy allows no inline script.
try {
  const chosen = localStorage.getItem('clauseway.theme');
  if (chosen === 'light' || chosen === 'dark') document.documentElement.dataset.theme = chosen;
} catch {
  document.documentElement.removeAttribute('data-theme');
}
