export const THEMES = ['system', 'light', 'dark'] as const
export type Theme = (typeof THEMES)[number]
export const THEME_COOKIE = 'theme'

export const themeOf = (text: string | undefined): Theme => THEMES.find((theme) => theme === text) ?? 'system'

/** Takes the theme at once and keeps it for the next visit; the server writes it into the page from the cookie. */
export function takeTheme(theme: Theme): void {
  const { documentElement: root } = document
  if (theme === 'system') root.removeAttribute('data-theme')
  else root.dataset.theme = theme
  root.ownerDocument.cookie = `${THEME_COOKIE}=${theme}; path=/; max-age=31536000; samesite=lax`
}
