'use client'
import { useState } from 'react'
import { THEME_COOKIE, THEMES, type Theme, themeFrom } from '../../theme'
import css from '../shell.module.css'

const WORDS: Readonly<Record<Theme, string>> = { system: 'as the system', light: 'light', dark: 'dark' }
const YEAR_S = 365 * 24 * 3600

/** Day, night, or whatever the system says; kept in a cookie, so that the server sends the right one at once. */
export function ThemeSwitch({ theme }: { theme: Theme }) {
  const [chosen, setChosen] = useState(theme)
  const choose = (next: Theme) => {
    setChosen(next)
    document.documentElement.dataset.theme = next
    // biome-ignore lint/suspicious/noDocumentCookie: the Cookie Store API is missing in a third of browsers
    document.cookie = `${THEME_COOKIE}=${next}; path=/; max-age=${next === 'system' ? 0 : YEAR_S}; samesite=lax`
  }
  return (
    <label className={css.theme}>
      <span>Theme</span>
      <select value={chosen} onChange={(event) => choose(themeFrom(event.target.value))}>
        {THEMES.map((one) => (
          <option key={one} value={one}>
            {WORDS[one]}
          </option>
        ))}
      </select>
    </label>
  )
}
