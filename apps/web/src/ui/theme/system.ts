import { createSystem, defineConfig } from '@chakra-ui/react/styled-system';
import { baseConfig } from './base-config.js';
import { kitColourRules } from './kit-colour-rules.js';
import { recipes } from './recipes.js';
import { textStyles } from './text-styles.js';
import { semanticTokens, tokens } from './tokens.js';

/** The one Chakra system. Only what the shop uses is in it: the default theme alone would weigh 50 kB. */
export const system = createSystem(
  baseConfig,
  defineConfig({
    preflight: true,
    cssVarsPrefix: 'wc',
    cssVarsRoot: ':where(html)',
    globalCss: {
      html: {
        color: 'ink',
        bg: 'ground',
        fontFamily: 'body',
        lineHeight: 'normal',
        fontVariantNumeric: 'tabular-nums',
        textRendering: 'optimizeLegibility',
        accentColor: '{colors.ink}',
        colorScheme: 'light',
      },
      'html.dark': { colorScheme: 'dark' },
      body: { minHeight: '100dvh' },
      'h1, h2, h3, h4': { textWrap: 'balance' },
      '*:focus-visible': { outline: '2px solid', outlineColor: 'ink', outlineOffset: '2px' },
      '*::placeholder': { color: 'ink.soft' },
      '*::selection': { bg: 'ink', color: 'ink.contrast' },
      ...kitColourRules(),
    },
    theme: {
      breakpoints: { sm: '30rem', md: '48rem', lg: '64rem', xl: '80rem', '2xl': '90.0625rem' },
      tokens,
      semanticTokens,
      textStyles,
      recipes,
    },
  }),
);
