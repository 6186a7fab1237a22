import { expect, it } from 'vitest'
import { navigationFor } from '../../../utils/navigation'
import { themeFromCookie } from '../../../utils/theme'

it.each([
  ['theme=night', 'night'], ['jamnut=abc; theme=day', 'day'], ['theme=purple', 'device'], ['', 'device'], ['mytheme=day', 'device'],
])('reads the theme from %j', (cookies, theme) => expect(themeFromCookie(cookies)).toBe(theme))

it('shows people only to administrators and the bays to those who work in them', () => {
  const labels = (role: Parameters<typeof navigationFor>[0]) => navigationFor(role).map(({ label }) => label)
  expect(labels('administrator')).toContain('People')
  expect(labels('foreman')).not.toContain('People')
  expect(labels('technician')).toContain('Bays')
  expect(labels('advisor')).not.toContain('Bays')
  expect(labels('quality_lead')).toContain('Wrench crib')
})
