import vue from '@vitejs/plugin-vue'
import Components from 'unplugin-vue-components/vite'
import { ElementPlusResolver } from 'unplugin-vue-components/resolvers'
import { defineConfig } from 'vite'

/** Where `npm run dev` finds the API; the built client is served by the API itself. */
const api = process.env['COAXWAIN_API'] ?? 'http://127.0.0.1:8080'

export default defineConfig({
  plugins: [
    vue(),
    Components({
      dirs: [],
      dts: false,
      resolvers: [ElementPlusResolver({ importStyle: 'css' })],
    }),
  ],
  build: {
    outDir: 'dist',
    // No data: addresses, so that the content policy can stay at 'self'.
    assetsInlineLimit: 0,
    // light-dark() is kept as written: the tokens rest on it.
    // The schemas must find their setting made: modules run in the order in which they are imported.
    rolldownOptions: { output: { strictExecutionOrder: true } },
    cssTarget: ['chrome123', 'firefox120', 'safari17.5'],
  },
  // What the engine's worker imports is pure: facts that it does not ask for are not loaded.
  worker: { rolldownOptions: { treeshake: { moduleSideEffects: false } } },
  server: { port: 5173, proxy: { '/api': { target: api } } },
})
