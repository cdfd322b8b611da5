import createCache, { type EmotionCache } from '@emotion/cache';

/** Emotion's rules, kept in a constructed style sheet: see adopted-sheet.ts. */
export const createStyleCache = (): EmotionCache => createCache({ key: 'wc' });
