import type { Config } from 'tailwindcss'

// Colours are custom properties (assets/css/tailwind.css), so that day, night and paper share every class.
export default {
  content: [
    './components/**/*.vue',
    './pages/**/*.vue',
    './layouts/**/*.vue',
    './app.vue',
    './error.vue',
  ],
  theme: {
    colors: {
      'transparent': 'transparent',
      'current': 'currentColor',
      'ground': 'var(--ground)',
      'surface': 'var(--surface)',
      'ink': 'var(--ink)',
      'muted': 'var(--muted)',
      'line': 'var(--line)',
      'paint': 'var(--paint)',
      'paint-ink': 'var(--paint-ink)',
      'ok': 'var(--ok)',
      'edge': 'var(--edge)',
      'out': 'var(--out)',
      'steel': 'var(--steel)',
      'steel-2': 'var(--steel-2)',
      'plate': 'var(--plate)',
    },
    borderRadius: { none: '0', DEFAULT: '3px', full: '9999px' },
    boxShadow: { none: 'none' },
    fontFamily: {
      sans: ['"IBM Plex Sans"', 'system-ui', 'sans-serif'],
      mono: ['"IBM Plex Mono"', 'ui-monospace', 'monospace'],
    },
    fontSize: {
      'xs': ['0.8125rem', '1.125rem'],
      'sm': ['0.9375rem', '1.375rem'],
      'base': ['1rem', '1.5rem'],
      'lg': ['1.1875rem', '1.75rem'],
      'xl': ['1.3125rem', '1.75rem'],
      '2xl': ['1.5rem', '1.875rem'],
      '3xl': ['1.75rem', '2.125rem'],
      '4xl': ['2.25rem', '2.5rem'],
      // The one number the hand acts on.
      'setting': ['clamp(4rem, 13vw, 5.75rem)', '0.95'],
    },
    fontWeight: { normal: '400', medium: '500', semibold: '600' },
    extend: {
      borderWidth: { rule: '1.5px' },
      outlineWidth: { 3: '3px' },
      // Target sizes: desk, anything in the bay, number keys, main buttons in the bay.
      spacing: { desk: '2.5rem', target: '3rem', key: '4.75rem', bay: '5rem' },
      maxWidth: { page: '93.75rem', reading: '42rem' },
    },
  },
} satisfies Config
