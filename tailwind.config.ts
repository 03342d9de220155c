import type { Config } from 'tailwindcss'
import plugin from 'tailwindcss/plugin'

/** Colours and type are named here and nowhere else. */
export const LIGHT = {
  paper: '#f7f4ed',
  sheet: '#fdfcf8',
  field: '#ffffff',
  ink: '#23262b',
  soft: '#5d6168',
  line: '#dcd6c8',
  hair: '#bdb6a6',
  edge: '#8a8473',
  accent: '#2f3e9e',
  wash: '#e6e8f5',
  metal: '#e3dece',
  moss: '#2f6b3c',
  ochre: '#8a5300',
  brick: '#9c2f22',
}
export const DARK: typeof LIGHT = {
  paper: '#15171a',
  sheet: '#1b1e22',
  field: '#101214',
  ink: '#ece8de',
  soft: '#a6a399',
  line: '#33373d',
  hair: '#565b63',
  edge: '#7d838c',
  accent: '#a9b4ff',
  wash: '#262b45',
  metal: '#3a3d42',
  moss: '#83c892',
  ochre: '#e0ab5b',
  brick: '#f09084',
}

const variables = (colours: typeof LIGHT, scheme: 'light' | 'dark') => ({
  ...Object.fromEntries(Object.entries(colours).map(([name, value]) => [`--${name}`, value])),
  'color-scheme': scheme,
})

export default {
  theme: {
    extend: {
      colors: Object.fromEntries(Object.keys(LIGHT).map((name) => [name, `var(--${name})`])),
      fontFamily: {
        sans: ['Atkinson Hyperlegible Next Variable', 'Signs', 'sans-serif'],
        mono: ['Atkinson Hyperlegible Mono Variable', 'Signs', 'monospace'],
      },
      borderRadius: { DEFAULT: '3px' },
      fontSize: { small: ['0.86rem', '1.4'], tiny: ['0.78rem', '1.35'] },
    },
  },
  plugins: [
    plugin(({ addBase }) =>
      addBase({
        ':root': variables(LIGHT, 'light'),
        '@media (prefers-color-scheme: dark)': { ':root:not([data-theme="light"])': variables(DARK, 'dark') },
        ':root[data-theme="dark"]': variables(DARK, 'dark'),
      }),
    ),
  ],
} satisfies Config
