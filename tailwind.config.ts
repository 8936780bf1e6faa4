import type { Config } from 'tailwindcss';

/**
 * The drawing-office tokens. Each colour is a CSS variable so that the night-blue board can redefine it in app/globals.css;
 * the canvas reads the same values through lib/layout/palette.ts.
 */
const config: Config = {
  content: ['./app/**/*.{ts,tsx}', './components/**/*.{ts,tsx}'],
  darkMode: ['selector', '[data-board="night"]'],
  theme: {
    extend: {
      colors: {
        paper: 'var(--paper)',
        sheet: 'var(--sheet)',
        ink: 'var(--ink)',
        'ink-soft': 'var(--ink-soft)',
        hair: 'var(--hair)',
        rule: 'var(--rule)',
        petrol: 'var(--petrol)',
        'petrol-wash': 'var(--petrol-wash)',
        'on-petrol': 'var(--on-petrol)',
        red: 'var(--red)',
        amber: 'var(--amber)',
        green: 'var(--green)',
      },
      fontFamily: {
        sans: ['"Barlow Semi Condensed"', 'system-ui', 'sans-serif'],
        mono: ['"Sometype Mono"', 'ui-monospace', 'monospace'],
      },
      borderRadius: { none: '0', DEFAULT: '2px' },
    },
  },
};

export default config;
