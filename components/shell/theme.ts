export const THEMES = ['system', 'light', 'dark'] as const;
export type Theme = (typeof THEMES)[number];

/** The choice lives in a cookie, so that the server can send the right page at once. */
export const THEME_COOKIE = 'strandline-theme';

export function themeFrom(value: string | undefined): Theme {
  return THEMES.find((theme) => theme === value) ?? 'system';
}
