import type { Config } from 'tailwindcss'
import plugin from 'tailwindcss/plugin'
import { SHEETS, properties } from './assets/css/sheets'

const colours = Object.fromEntries(Object.keys(SHEETS.light).map(name => [name, `var(--${name})`]))

export default {
  content: ['./components/**/*.{vue,ts}', './layouts/**/*.vue', './pages/**/*.vue', './composables/**/*.ts', './app.vue', './error.vue'],
  theme: {
    // Replaced, not extended: a colour or a corner that is not of the register can't be written.
    colors: { transparent: 'transparent', current: 'currentColor', ...colours },
    screens: { desk: '900px', wide: '1280px' },
    borderRadius: { none: '0', DEFAULT: '2px' },
    boxShadow: { none: 'none' },
    fontFamily: { sans: ['"Source Sans 3"', 'system-ui', 'sans-serif'] },
    fontWeight: { normal: '400', semibold: '600' },
    fontSize: {
      small: ['0.9375rem', '1.4'],
      base: ['1rem', '1.5'],
      answer: ['1.1875rem', '1.3'],
      head: ['1.25rem', '1.3'],
      title: ['1.75rem', '1.15'],
      figure: ['1.625rem', '1.2'],
    },
    extend: {
      spacing: { gutter: 'var(--gutter)', thumb: '3rem' },
      maxWidth: { measure: '44rem', door: '30rem' },
    },
  },
  plugins: [
    plugin(({ addBase }) => {
      addBase({
        ':root': properties('light'),
        '@media (prefers-color-scheme: dark)': { ':root[data-sheet="auto"]': properties('dark') },
        '@media (prefers-contrast: more)': { ':root[data-sheet="auto"]': properties('sun') },
        ':root[data-sheet="dark"]': properties('dark'),
        ':root[data-sheet="sun"]': properties('sun'),
        // Paper is white whatever the screen was.
        '@media print': { ':root, :root[data-sheet]': { ...properties('light'), '--paper': '#FFFFFF' } },
      })
    }),
  ],
} satisfies Config
