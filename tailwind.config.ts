import type { Config } from 'tailwindcss';

/** Colours are named after coats; src/styles.css holds their values as custom properties. */
export default {
  content: ['./index.html', './src/**/*.{ts,tsx,html}'],
  theme: {
    extend: {
      colors: {
        cream: 'var(--cream)',
        linen: 'var(--linen)',
        fawn: 'var(--fawn)',
        ink: 'var(--ink)',
        slate: 'var(--slate)',
        collar: 'var(--collar)',
        'collar-soft': 'var(--collar-soft)',
        merle: 'var(--merle)',
        mint: 'var(--mint)',
        honey: 'var(--honey)',
        apricot: 'var(--apricot)',
        liver: 'var(--liver)',
        rosette: 'var(--rosette)',
        'rosette-soft': 'var(--rosette-soft)',
      },
      borderRadius: { card: '14px' },
      fontFamily: { sans: ['"Work Sans Variable"', '"Work Sans"', 'system-ui', 'sans-serif'] },
    },
  },
} satisfies Config;
