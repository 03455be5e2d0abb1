import './api/zod-setup'
import '@fontsource/source-sans-3/latin-400.css'
import '@fontsource/source-sans-3/latin-600.css'
import '@fontsource/source-sans-3/latin-700.css'
import '@fontsource/source-sans-3/greek-400.css'
import '@fontsource/source-sans-3/greek-600.css'
import '@fontsource/source-sans-3/greek-700.css'
import './styles/tokens.css'
import './styles/element-theme.css'
import './styles/base.css'
import './styles/drawing.css'
import './styles/page.css'
import './styles/combobox.css'
import './styles/tables.css'
import './styles/phone.css'
import './styles/print.css'
import { createPinia } from 'pinia'
import { createApp } from 'vue'
import App from './App.vue'
import { setSignedOutHandler } from './api/client'
import { createAppRouter } from './router'
import { PAGES } from './router/names'
import { usePreferences } from './stores/preferences'
import { useSession } from './stores/session'

const app = createApp(App).use(createPinia())
const preferences = usePreferences()
preferences.load('', navigator.languages)
preferences.apply(document.documentElement, matchMedia('(prefers-color-scheme: dark)'))

const router = createAppRouter()
/** Everything typed stays in its draft; signing in leads back to where it happened. */
setSignedOutHandler(() => {
  useSession().forget()
  const to = router.currentRoute.value.fullPath
  void router.push({ name: PAGES.signIn, query: { to, again: '1' } })
})
app.use(router).mount('#app')
