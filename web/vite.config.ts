import tailwind from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

export default defineConfig({
  plugins: [react(), tailwind()],
  build: {
    // Nothing becomes a data: address, so the content security policy can stay `'self'`.
    assetsInlineLimit: 0,
    sourcemap: true,
  },
  server: {
    host: '127.0.0.1',
    proxy: { '/api': { target: process.env.API_URL ?? 'http://127.0.0.1:4310' } },
  },
});
