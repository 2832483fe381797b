import tailwindcss from '@tailwindcss/vite'
import react from '@vitejs/plugin-react'
import { defineConfig } from 'vitest/config'

const apiPort = process.env['API_PORT'] ?? '4621'

export default defineConfig({
  plugins: [react(), tailwindcss()],
  build: { outDir: 'dist', assetsInlineLimit: 0, chunkSizeWarningLimit: 900 },
  server: { port: 4620, proxy: { '/api': `http://127.0.0.1:${apiPort}` } },
  test: {
    projects: [
      {
        test: {
          name: 'unit',
          environment: 'node',
          testTimeout: 30_000,
          hookTimeout: 60_000,
          include: [
            'shared/**/*.test.ts',
            'server/**/*.test.ts',
            'src/**/*.test.ts',
            'tests/reference/**/*.test.ts',
            'tests/api/**/*.test.ts',
            'tests/durability/**/*.test.ts',
          ],
          setupFiles: ['tests/setup/no-console-errors.ts'],
          globalSetup: ['tests/setup/database-template.ts'],
        },
      },
      {
        test: {
          name: 'journeys',
          environment: 'node',
          testTimeout: 180_000,
          hookTimeout: 60_000,
          fileParallelism: false,
          include: ['tests/journeys/**/*.test.ts'],
        },
      },
    ],
  },
})
