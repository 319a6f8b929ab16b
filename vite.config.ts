import { relative } from 'node:path'
import { fileURLToPath } from 'node:url'
import vue from '@vitejs/plugin-vue'
import elementPlus from 'unplugin-element-plus/vite'
import type { Plugin } from 'vite'
import { defineConfig } from 'vitest/config'

const folder = (path: string) => fileURLToPath(new URL(path, import.meta.url))

/** Notes the modules of every script, for check-bundle; dotfiles are not served. */
function recordModules(): Plugin {
  return {
    name: 'toehold:record-modules',
    apply: 'build',
    generateBundle(_options, bundle) {
      const chunks = Object.values(bundle).filter((output) => output.type === 'chunk')
      const modules = chunks.map(({ fileName, moduleIds }) => [
        fileName,
        moduleIds.map((id) => relative(process.cwd(), id)),
      ])
      const source = JSON.stringify(Object.fromEntries(modules), null, 2)
      this.emitFile({ type: 'asset', fileName: '.vite/modules.json', source })
    },
  }
}

/** What the API server answers while the page is developed. */
function proxied(paths: readonly string[]): Record<string, string> {
  const address = `http://localhost:${process.env.API_PORT ?? 3001}`
  return Object.fromEntries(paths.map((path) => [path, address]))
}

/** Asks a bundler for the modules that a module imports at once. */
interface ModuleGraph {
  readonly getModuleInfo: (id: string) => { readonly importedIds: readonly string[] } | null
}

let firstPage: ReadonlySet<string> | undefined

/** Everything that the first page loads at once. */
function modulesOfFirstPage(graph: ModuleGraph): ReadonlySet<string> {
  if (firstPage) return firstPage
  const found = new Set([folder('./src/main.ts')])
  for (const id of found) {
    for (const imported of graph.getModuleInfo(id)?.importedIds ?? []) found.add(imported)
  }
  firstPage = found
  return found
}

/** In one file, not in one for every set of later pages that share a part: that packs better. */
const FIRST_PAGE_GROUP = {
  name: (id: string, graph: ModuleGraph) => (modulesOfFirstPage(graph).has(id) ? 'first' : null),
}

const ENGINE_TESTS = ['tests/shared/**/*.test.ts']

/** Parts of vue-i18n that are not used: options API, global components, message compiler. */
const WITHOUT_I18N_EXTRAS = {
  __VUE_I18N_LEGACY_API__: false,
  __VUE_I18N_FULL_INSTALL__: false,
  __INTLIFY_DROP_MESSAGE_COMPILER__: true,
  __INTLIFY_PROD_DEVTOOLS__: false,
}

export default defineConfig({
  plugins: [vue(), elementPlus({}), recordModules()],
  resolve: {
    alias: {
      '@shared': folder('./shared'),
      '@': folder('./src'),
      'vue-i18n': 'vue-i18n/dist/vue-i18n.runtime.mjs',
    },
  },
  define: WITHOUT_I18N_EXTRAS,
  server: { proxy: proxied(['/api', '/order', '/service-worker.js']) },
  // check-bundle reads manifest and modules to learn what the first page loads.
  build: {
    manifest: true,
    rolldownOptions: { output: { codeSplitting: { groups: [FIRST_PAGE_GROUP] } } },
    // Fonts come as files: the content security policy refuses them inline.
    assetsInlineLimit: (file) => (/\.(woff2?|ttf)$/.test(file) ? false : undefined),
  },
  test: {
    environment: 'node',
    setupFiles: ['tests/support/fixed-seed.ts'],
    server: { deps: { inline: ['element-plus'] } },
    // A property test draws thousands of cases, also on a machine that has other work.
    testTimeout: 30_000,
    maxWorkers: 2,
    projects: [
      // Pure functions leave nothing behind, so their files share what is loaded.
      { extends: true, test: { name: 'engine', include: ENGINE_TESTS, isolate: false } },
      {
        extends: true,
        test: {
          name: 'product',
          setupFiles: ['tests/support/patient-waits.ts'],
          include: ['tests/**/*.test.ts'],
          exclude: [...ENGINE_TESTS, 'tests/e2e/**'],
        },
      },
    ],
  },
})
