import { fileURLToPath } from 'node:url'
import vue from '@vitejs/plugin-vue'
import elementPlus from 'unplugin-element-plus/vite'
import { defineConfig } from 'vitest/config'

const folder = (path: string) => fileURLToPath(new URL(path, import.meta.url))

export default defineConfig({
  plugins: [vue(), elementPlus({})],
  resolve: { alias: { '@shared': folder('./shared'), '@': folder('./src') } },
  server: { proxy: { '/api': `http://localhost:${process.env.API_PORT ?? 3001}` } },
  test: {
    include: ['tests/**/*.test.ts'],
    exclude: ['tests/e2e/**'],
    environment: 'node',
    server: { deps: { inline: ['element-plus'] } },
  },
})
