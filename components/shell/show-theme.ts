import { THEME_COOKIE, type Theme } from './theme';

const YEAR_SECONDS = 365 * 24 * 3600;

/** Shows the choice at once and keeps it for the next page that the server sends. */
export function showTheme(theme: Theme) {
  document.cookie = `${THEME_COOKIE}=${theme}; path=/; max-age=${YEAR_SECONDS}; samesite=lax`;
  if (theme === 'system') delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = theme;
}
