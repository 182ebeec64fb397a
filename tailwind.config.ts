import type { Config } from 'tailwindcss';

/** Only what interface.md section 11 names exists here: every other colour, size or distance is a missing class, not a default. */
const config: Config = {
  content: ['./app/**/*.{ts,tsx}', './components/**/*.{ts,tsx}', './lib/server/**/*.tsx'],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      slip: 'var(--slip)',
      bisque: 'var(--bisque)',
      wash: 'var(--wash)',
      iron: 'var(--iron)',
      umber: 'var(--umber)',
      celadon: 'var(--celadon)',
      cobalt: 'var(--cobalt)',
      manganese: 'var(--manganese)',
      oxide: 'var(--oxide)',
      ash: 'var(--ash)',
      copper: 'var(--copper)',
      rule: 'var(--rule)',
      'wash-celadon': 'var(--wash-celadon)',
      'wash-ash': 'var(--wash-ash)',
      'wash-copper': 'var(--wash-copper)',
      'wash-cobalt': 'var(--wash-cobalt)',
    },
    fontFamily: {
      serif: ['"Literata Scripts"', 'var(--font-literata)', 'Georgia', 'serif'],
      sans: ['"Atkinson Scripts"', '"Commissioner Scripts"', 'var(--font-atkinson)', 'Verdana', 'sans-serif'],
    },
    fontSize: {
      small: ['0.9375rem', '1.45'],
      plain: ['1rem', '1.5'],
      read: ['1.125rem', '1.6'],
      lead: ['1.375rem', '1.4'],
      title: ['1.6875rem', '1.25'],
      display: ['2.125rem', '1.18'],
    },
    fontWeight: { normal: '400', strong: '600' },
    spacing: {
      0: '0px',
      px: '1px',
      1: '0.25rem',
      2: '0.5rem',
      3: '0.75rem',
      4: '1rem',
      6: '1.5rem',
      8: '2rem',
      target: '2.75rem',
      12: '3rem',
      16: '4rem',
      24: '6rem',
    },
    borderRadius: { none: '0px', corner: '2px', lip: '14px', full: '9999px' },
    screens: { sm: '30rem', md: '40rem', lg: '64rem' },
    maxWidth: { text: '42rem', page: '72rem', field: '20rem', full: '100%', none: 'none' },
  },
};

export default config;
