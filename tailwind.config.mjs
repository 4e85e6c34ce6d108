/** Colours and type come from the tokens in src/styles/tokens.css; both themes share the names. */
const token = (/** @type {string} */ name) => `var(--${name})`;

/** @type {import('tailwindcss').Config} */
export default {
  content: ['./src/**/*.{astro,html,js,jsx,ts,tsx}'],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      paper: token('paper'),
      surface: token('surface'),
      ink: token('ink'),
      muted: token('muted'),
      line: token('line'),
      faint: token('faint'),
      control: token('control'),
      middle: token('middle'),
      shade: token('shade'),
      cold: token('cold'),
      hot: token('hot'),
      attention: token('attention'),
      approved: token('approved'),
      'curve-1': token('curve-1'),
      'curve-2': token('curve-2'),
      'curve-3': token('curve-3'),
      plum: token('plum'),
      wash: token('wash'),
      'attention-wash': token('attention-wash'),
      'approved-wash': token('approved-wash'),
    },
    extend: {
      fontFamily: { sans: ['"Roboto Flex Variable"', '"Roboto Flex"', '"Couplet stand-in"', 'system-ui', 'sans-serif'] },
      borderRadius: { DEFAULT: '4px' },
    },
  },
  plugins: [],
};
