export type Theme = 'system' | 'light' | 'dark';

const key = 'clauseway.theme';

export function chosenTheme(): Theme {
  const theme = document.documentElement.dataset.theme;
  return theme === 'light' || theme === 'dark' ? theme : 'system';
}

export function chooseTheme(theme: Theme): void {
  if (theme === 'system') {
    delete document.documentElement.dataset.theme;
  } else {
    document.documentElement.dataset.theme = theme;
  }
  try {
    if (theme === 'system') localStorage.removeItem(key);
    else localStorage.setItem(key, theme);
  } catch {
    // A browser that keeps nothing still shows the chosen theme until the page is left.
    return;
  }
}
