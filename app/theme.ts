/** The cookie that keeps a person's choice of theme; without it the system's preference decides. */
export const THEME_COOKIE = 'halfbaud-theme'
export const THEMES = ['system', 'light', 'dark'] as const
export type Theme = (typeof THEMES)[number]

export function themeFrom(value: string | undefined): Theme {
  return THEMES.find((theme) => theme === value) ?? 'system'
}
