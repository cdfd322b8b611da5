import { fileURLToPath } from 'node:url';
import react from '@vitejs/plugin-react';
import { defineConfig, type Plugin } from 'vite';

const packageSource = (name: string) =>
  fileURLToPath(new URL(`../../packages/${name}/src/index.ts`, import.meta.url));

/** The first text on screen waits for this file, so the browser is told of it before it has read the CSS. */
function preloadLatinFont(): Plugin {
  return {
    name: 'windchest:preload-latin-font',
    apply: 'build',
    transformIndexHtml: {
      order: 'post',
      handler(_html, { bundle }) {
        const font = Object.keys(bundle ?? {}).find((file) =>
          /source-sans-3-latin-wght-normal.*\.woff2$/.test(file),
        );
        if (!font) return [];
        const attrs = { rel: 'preload', href: `/${font}`, as: 'font', type: 'font/woff2', crossorigin: '' };
        return [{ tag: 'link', attrs, injectTo: 'head' }];
      },
    },
  };
}

/**
 * What nobody here uses of a library is dropped from the bundle only where making it is known to have no effect.
 * React's factories come through a CommonJS wrapper that hides it, and a name for the developer tools keeps a
 * component alive.
 */
function letUnusedComponentsGo(): Plugin {
  return {
    name: 'windchest:let-unused-components-go',
    apply: 'build',
    transform: {
      filter: { id: /node_modules\/(react-router|swr|@emotion|@chakra-ui)\/.*\.m?js$/ },
      handler: (code) => ({
        code: code
          .replace(/(?<== )(?=(React\d*\.)?(forwardRef|createContext|memo)\()/g, '/* @__PURE__ */ ')
          .replace(/^\w+\.displayName = "\w+";$/gm, ''),
        map: null,
      }),
    },
  };
}

/** The router's package offers its development build, with all its warnings, to whoever asks; this is the other one. */
const routerForVisitors = [
  { find: /^react-router$/, replacement: 'react-router/dist/production/index.mjs' },
  { find: /^react-router\/dom$/, replacement: 'react-router/dist/production/dom-export.mjs' },
].map(({ find, replacement }) => ({
  find,
  replacement: fileURLToPath(new URL(`../../node_modules/${replacement}`, import.meta.url)),
}));

export default defineConfig(({ command }) => ({
  plugins: [react(), preloadLatinFont(), letUnusedComponentsGo()],
  resolve: {
    alias: [
      ...['contracts', 'money', 'voicing', 'meshes', 'plates'].map((name) => ({
        find: `@windchest/${name}`,
        replacement: packageSource(name),
      })),
      // Emotion's own sheet writes `<style>` elements, which the content security policy blocks.
      {
        find: '@emotion/sheet',
        replacement: fileURLToPath(new URL('./src/ui/theme/adopted-sheet.ts', import.meta.url)),
      },
      // SWR asks for a stand-in that React has had itself since version 18.
      { find: /^use-sync-external-store\/shim$/, replacement: 'react' },
      ...(command === 'build' ? routerForVisitors : []),
    ],
  },
  server: {
    host: '127.0.0.1',
    proxy: {
      '/api': { target: process.env['WINDCHEST_API_URL'] ?? 'http://127.0.0.1:3000', changeOrigin: false },
    },
  },
  build: {
    outDir: 'dist',
    // The first-load script reads the manifest; the API serves /assets for a year because names carry a hash.
    manifest: true,
    assetsDir: 'assets',
    // Data addresses would need `data:` in the content security policy.
    assetsInlineLimit: 0,
    sourcemap: false,
    modulePreload: {
      polyfill: false,
      // To fetch the parts of a dialog at once, the first page would have to name all of them.
      resolveDependencies: (file, parts) => (file.includes('-dialog-') ? [] : parts),
    },
    // What draws in three dimensions is that large; it is fetched when a visitor asks to turn a part.
    chunkSizeWarningLimit: 1000,
    rolldownOptions: {
      treeshake: {
        manualPureFunctions: ['defineConfig', 'defineConditions'],
        // Emotion brings these two for `withTheme`, which nobody here calls.
        moduleSideEffects: [
          { test: /node_modules\/(hoist-non-react-statics|react-is)\//, sideEffects: false },
        ],
      },
    },
  },
}));
