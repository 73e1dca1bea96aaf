/** Tokens of the drawing-office sheet. Names say what a colour is for, not what it looks like. */
const pxScale = (pairs) =>
  Object.fromEntries(Object.entries(pairs).map(([name, [size, line]]) => [name, [`${size / 16}rem`, line]]));

/** @type {import('tailwindcss').Config} */
module.exports = {
  content: ['./src/**/*.{astro,ts,tsx,mdx}', './content/handbook/**/*.mdx'],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      white: '#ffffff',
      ground: '#e6ebea',
      sheet: '#fbfcfc',
      side: '#f3f6f5',
      ink: { DEFAULT: '#14191b', 2: '#4a5653' },
      rule: '#aebbb7',
      hair: '#d5dedb',
      petrol: '#0b5560',
      wash: '#dcebec',
      pit: { DEFAULT: '#0e1416', 2: '#182124' },
      chalk: '#eef3f2',
      lamp: '#57c0c8',
      // ANSI Z535 signal panels only.
      danger: '#c8102e',
      warning: '#ff8200',
      caution: '#ffd100',
      notice: '#0057b8',
    },
    fontFamily: {
      serif: ['Merriweather', '"Merriweather fallback"', 'Georgia', 'serif'],
      sans: ['"Barlow Semi Condensed"', '"Barlow fallback"', '"Arial Narrow"', 'sans-serif'],
    },
    fontSize: pxScale({
      small: [14.5, '1.4'],
      base: [16, '1.5'],
      prose: [16.5, '1.7'],
      lead: [19, '1.35'],
      title: [29, '1.2'],
      display: [35, '1.18'],
      value: [34, '1.05'],
      bench: [92, '1'],
    }),
    extend: {
      borderRadius: { DEFAULT: '3px' },
      borderWidth: { frame: '1.5px' },
      maxWidth: { prose: '58ch', sheet: '77.5rem', desk: '81.25rem' },
      minHeight: { touch: '46px', glove: '72px' },
    },
  },
  plugins: [],
};
