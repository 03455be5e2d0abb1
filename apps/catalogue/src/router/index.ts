import {
  createRouter,
  createWebHistory,
  type RouteLocationNormalized,
  type RouteLocationRaw,
} from 'vue-router'
import { useSession } from '../stores/session'
import { PAGES } from './names'
import { ROUTE_TABLE } from './routes'

/** Who may see which page: strangers sign in first and come back to where they wanted to go. */
async function guard(to: RouteLocationNormalized): Promise<RouteLocationRaw | true> {
  if (to.name === PAGES.failed) return true
  const session = useSession()
  const known = await session.load()
  if (!known.ok) {
    return to.meta.open ? true : { name: PAGES.failed, query: { to: to.fullPath } }
  }
  if (to.meta.open) return true
  if (session.person === null) return { name: PAGES.signIn, query: { to: to.fullPath } }
  if (to.name === 'home-place') {
    return session.home
      ? { path: `/c/${session.home.collection.uid}/${String(to.params['place'])}` }
      : { name: PAGES.noCollection }
  }
  const collection = to.params['collection']
  if (typeof collection === 'string' && !session.enter(collection)) {
    return { name: PAGES.notFound, params: { rest: to.path.slice(1).split('/') } }
  }
  return true
}

export function createAppRouter() {
  const router = createRouter({
    history: createWebHistory(),
    routes: ROUTE_TABLE,
    scrollBehavior: (to, from, saved) => {
      if (saved) return saved
      return to.path === from.path ? false : { top: 0 }
    },
  })
  router.beforeEach(guard)
  return router
}
