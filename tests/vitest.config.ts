import { fileURLToPath } from 'node:url'
import vue from '@vitejs/plugin-vue'
import { ElementPlusResolver } from 'unplugin-vue-components/resolvers'
import Components from 'unplugin-vue-components/vite'
import { defineConfig } from 'vitest/config'

const root = fileURLToPath(new URL('..', import.meta.url))
const nothing = fileURLToPath(new URL('./support/nothing.ts', import.meta.url))

/** Styles of the component library are no business of component tests. */
const withoutStyles = [
  { find: /^element-plus\/(es|theme-chalk)\/.*(style\/css|\.css)$/, replacement: nothing },
]

const SLOW_MS = 60_000

/** Files share what they import; no test replaces a module or leaves anything behind. */
const isolate = false

const onDatabase = (name: string, include: string[]) => ({
  test: {
    name,
    root,
    include,
    environment: 'node' as const,
    isolate,
    globalSetup: ['tests/support/global-database.ts'],
    testTimeout: SLOW_MS,
    hookTimeout: SLOW_MS,
  },
})

/** How every page looks and is reached; it changes nothing, and takes as long as all that people do. */
const LOOKS = ['tests/browser/pages.test.ts', 'tests/browser/keyboard.test.ts']

/** Each on a site of its own, one file after the other. */
const onSite = (name: string, include: string[], exclude: string[] = []) => ({
  test: {
    name,
    root,
    include,
    exclude,
    environment: 'node' as const,
    globalSetup: ['tests/support/global-site.ts'],
    testTimeout: SLOW_MS,
    hookTimeout: SLOW_MS,
    fileParallelism: false,
  },
})

const plain = (name: string, include: string[]) => ({
  test: { name, root, include, environment: 'node' as const, isolate, testTimeout: SLOW_MS },
})

export default defineConfig({
  root,
  test: {
    root,
    allowOnly: false,
    projects: [
      plain('unit', [
        'packages/**/*.test.ts',
        'apps/api/**/*.test.ts',
        'database/**/*.test.ts',
        'scripts/**/*.test.ts',
      ]),
      {
        plugins: [
          vue(),
          Components({
            dts: false,
            dirs: [],
            resolvers: [ElementPlusResolver({ importStyle: false })],
          }),
        ],
        resolve: { alias: withoutStyles },
        test: {
          name: 'web',
          root,
          include: ['apps/catalogue/**/*.test.ts'],
          environment: 'happy-dom',
          isolate,
        },
      },
      onDatabase('api', ['tests/api/**/*.test.ts']),
      onDatabase('faults', ['tests/faults/**/*.test.ts']),
      plain('architecture', ['tests/architecture/**/*.test.ts']),
      plain('reference', ['tests/reference/**/*.test.ts']),
      plain('laws', ['tests/laws/**/*.test.ts']),
      plain('enumeration', ['tests/enumeration/**/*.test.ts']),
      plain('cases', ['tests/cases/**/*.test.ts']),
      onSite('browser', ['tests/browser/*.test.ts'], LOOKS),
      onSite('looks', LOOKS),
    ],
  },
})
