import react from '@vitejs/plugin-react';
import { defaultClientConditions, defineConfig } from 'vite';

const apiOrigin = process.env.PROOFPLATE_API_ORIGIN ?? 'http://127.0.0.1:3000';

export default defineConfig({
  plugins: [react()],
  // Naming the list drops Vite's own conditions, so they are added back.
  resolve: { conditions: ['@proofplate/source', ...defaultClientConditions] },
  server: { host: '127.0.0.1', port: 5173, proxy: { '/api': apiOrigin } },
  preview: { host: '127.0.0.1', proxy: { '/api': apiOrigin } },
  build: {
    manifest: true,
    // Every browser that reads ES2022 modules preloads them itself.
    modulePreload: { polyfill: false },
    // A data: URL would need a wider content security policy.
    assetsInlineLimit: 0,
    target: 'es2022',
  },
});
