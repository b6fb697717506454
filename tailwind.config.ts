import type { Config } from 'tailwindcss';

/** Colours by name; drawings on canvas take them from here, pages through their class names. */
export const colours = {
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
} as const;

/** Tones of the timber table's species and of what fills an opening, for drawings of frames only. */
export const timber = {
  'white ash': '#DCC7A0', beech: '#D3AE84', 'yellow birch': '#DDBF8D', cherry: '#B5724A', 'hard maple': '#E3CDA6', 'red maple': '#D6B68F',
  'red oak': '#C69A6D', 'white oak': '#C2A177', walnut: '#6F4E37', 'yellow-poplar': '#CFCB9F',
  mirror: '#C9D6D8', backer: '#B99A70',
} as const;

/** The colours and type of a shop drawing pinned to a plastered wall; pages use them by name only. */
const theme: Config = {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  theme: {
    colors: colours,
    fontFamily: {
      sans: ['"Nunito Sans"', 'ui-sans-serif', 'system-ui', 'sans-serif'],
    },
    extend: {},
  },
};

export default theme;
