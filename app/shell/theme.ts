import 'server-only'
import { cookies } from 'next/headers'
import { THEME_COOKIE, type Theme, themeFrom } from '../theme'

export async function chosenTheme(): Promise<Theme> {
  return themeFrom((await cookies()).get(THEME_COOKIE)?.value)
}
