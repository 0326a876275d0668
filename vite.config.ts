import optimizeLocales from '@react-aria/optimize-locales-plugin';
import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

export default defineConfig({
  root: 'web',
  plugins: [react(), tailwindcss(), { ...optimizeLocales.vite({ locales: ['en-US'] }), enforce: 'pre' }],
  // In development the API runs beside the web server; the launcher says where.
  server: { proxy: { '/api': { target: process.env.CLAUSEWAY_API ?? 'http://127.0.0.1:4170' } } },
  build: {
    outDir: '../dist/web',
    emptyOutDir: true,
    target: 'es2022',
    // `light-dark()` must reach the browser as written: both themes are one set of tokens.
    cssTarget: ['chrome123', 'firefox128', 'safari17.5'],
    // The content security policy allows fonts and images from this server only, so nothing becomes a data: address.
    assetsInlineLimit: 0,
  },
});
