/** Day, night, or as the device says. Kept in a cookie, so that the server already draws the right one. */
export function useTheme() {
  const theme = useState<Theme>('theme', () =>
    themeFromCookie(import.meta.server ? useRequestHeaders(['cookie']).cookie ?? '' : document.cookie))

  function setTheme(chosen: Theme) {
    theme.value = chosen
    document.cookie = `theme=${chosen}; path=/; max-age=${365 * 24 * 60 * 60}; samesite=lax`
  }

  return { theme, setTheme }
}
