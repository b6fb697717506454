import type { Config } from 'tailwindcss';

/** The colours and type of a shop drawing pinned to a plastered wall; pages use them by name only. */
const theme: Config = {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      white: '#FFFFFF',
      plaster: { 50: '#F5F2EA', 100: '#E9E4D6', 200: '#D8D0BC' },
      ink: { 900: '#1E2B2A', 700: '#3C4B49', 500: '#586561' },
      chalk: { 600: '#1F5AA6', 700: '#174680', 100: '#DCE8F6' },
      brass: { 600: '#80600F', 200: '#E7D5A6' },
      madder: { 600: '#A8322A', 100: '#F7DFDB' },
      ochre: { 600: '#8A5A0B', 100: '#F8E8C8' },
      sage: { 600: '#3E6B47', 100: '#DDEBDD' },
    },
    fontFamily: {
      sans: ['"Nunito Sans"', 'ui-sans-serif', 'system-ui', 'sans-serif'],
    },
    extend: {},
  },
};

export default theme;
