export const themes = ['device', 'day', 'night'] as const
export type Theme = (typeof themes)[number]

/** The theme a person chose on this device, read from a Cookie header or document.cookie; 'device' when none is set. */
export function themeFromCookie(cookies: string): Theme {
  const value = /(?:^|;\s*)theme=([a-z]+)/.exec(cookies)?.[1]
  return themes.find(theme => theme === value) ?? 'device'
}
