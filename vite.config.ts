import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

/** The client. In development everything that is not the client's comes from the web process at API_URL. */
const api = process.env.API_URL ?? 'http://127.0.0.1:3000';

export default defineConfig({
  plugins: [react(), tailwindcss()],
  server: {
    host: '127.0.0.1',
    // the Host header stays as the browser sent it, so that the server's same-origin check sees one origin
    // what the running product writes is no source
    watch: { ignored: ['**/storage/data/**', '**/dist/**'] },
    proxy: { '/api': { target: api }, '/m/': { target: api } },
  },
  build: {
    outDir: 'dist/client',
    emptyOutDir: true,
    // nothing inline: the content security policy takes scripts, styles and fonts from 'self' alone
    assetsInlineLimit: 0,
    modulePreload: { polyfill: false },
    rolldownOptions: {
      output: {
        codeSplitting: {
          groups: [
            // fetched with the first page that plays something, and kept by the browser when the rest changes
            {
              name: 'player',
              test: /node_modules[\\/](video\.js|@videojs|videojs-|mux\.js|m3u8-parser|mpd-parser|aes-decrypter|@xmldom)/,
            },
            {
              name: 'react',
              test: /node_modules[\\/](react|react-dom|react-router|react-router-dom|scheduler|@tanstack)[\\/]/,
            },
          ],
        },
      },
    },
  },
});
