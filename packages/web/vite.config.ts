import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

const api = process.env['DRIPRAIL_API_URL'] ?? 'http://127.0.0.1:4601';

export default defineConfig({
  plugins: [react(), tailwindcss()],
  build: { outDir: 'dist', manifest: 'manifest.json', chunkSizeWarningLimit: 400 },
  server: { proxy: { '/api': { target: api, xfwd: true }, '/socket.io': { target: api, ws: true } } },
});
