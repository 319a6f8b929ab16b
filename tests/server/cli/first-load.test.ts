import { describe, expect, it } from 'vitest'
import {
  entryOf,
  firstLoad,
  keptOutModules,
  namedByPage,
} from '../../../server/cli/bundle/first-load'

const manifest = {
  'index.html': {
    file: 'assets/index.js',
    imports: ['_shared.js'],
    dynamicImports: ['src/views/QuickCheckView.vue', 'src/views/MethodView.vue'],
    css: ['assets/index.css'],
  },
  '_shared.js': { file: 'assets/shared.js', imports: ['index.html'], css: ['assets/shared.css'] },
  'src/views/QuickCheckView.vue': {
    file: 'assets/quick.js',
    imports: ['_shared.js', '_drawing.js'],
    css: ['assets/quick.css'],
  },
  '_drawing.js': { file: 'assets/drawing.js' },
  'src/views/MethodView.vue': { file: 'assets/method.js', imports: ['_formulas.js'] },
  '_formulas.js': { file: 'assets/formulas.js' },
}

const modules = {
  'assets/index.js': ['src/main.ts', 'src/router/index.ts'],
  'assets/quick.js': ['src/views/QuickCheckView.vue'],
  'assets/drawing.js': ['node_modules/chart.js/dist/chart.js', 'shared/drawing/scene.ts'],
  'assets/formulas.js': ['node_modules/katex/dist/katex.mjs', 'node_modules/mathjs/lib/index.js'],
}

describe('what the first page loads', () => {
  it('is what page and view import at once, with their styles, each file counted once', () => {
    const files = firstLoad(manifest, ['index.html', 'src/views/QuickCheckView.vue'])
    expect(files.sort()).toEqual([
      'assets/drawing.js',
      'assets/index.css',
      'assets/index.js',
      'assets/quick.css',
      'assets/quick.js',
      'assets/shared.css',
      'assets/shared.js',
    ])
  })

  it('refuses to measure an entry that the build does not have', () => {
    expect(() => firstLoad(manifest, ['other.html'])).toThrow(/other\.html/)
  })

  it('finds the view in a script of its own or in a common one', () => {
    const view = 'src/views/QuickCheckView.vue'
    expect(entryOf(view, manifest, modules)).toBe(view)
    const together = { 'assets/index.js': [view] }
    expect(entryOf(view, manifest, together)).toBe('index.html')
    expect(() => entryOf('src/views/Gone.vue', manifest, modules)).toThrow(/Gone\.vue/)
  })

  it('finds a large library in it, and leaves alone one that another place loads', () => {
    const files = firstLoad(manifest, ['src/views/QuickCheckView.vue'])
    expect(keptOutModules(modules, files)).toEqual(['node_modules/chart.js/dist/chart.js'])
    expect(keptOutModules(modules, ['assets/formulas.js'])).toHaveLength(2)
    const scene = { 'a.js': ['src/components/chart.js-like/Scene.vue', 'src/katex.ts'] }
    expect(keptOutModules(scene, ['a.js'])).toEqual([])
  })

  it('counts scripts and styles that the page itself names', () => {
    const html = `<link rel="icon" href="/favicon.svg"><script src="/theme.js"></script>
      <script type="module" crossorigin src="/assets/index.js"></script>
      <link rel="stylesheet" crossorigin href="/assets/index.css">`
    expect(namedByPage(html)).toEqual(['theme.js', 'assets/index.js', 'assets/index.css'])
  })
})
