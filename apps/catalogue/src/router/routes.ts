import type { Right } from '@coaxwain/contract'
import type { MessageCode } from '@coaxwain/wording'
import type { RouteRecordRaw } from 'vue-router'
import { PAGES } from './names'

declare module 'vue-router' {
  interface RouteMeta {
    /** Title of the page until it says something more telling. */
    title: MessageCode
    /** The place of the rail that it lies in. */
    place?: 'hookups' | 'shelf' | 'models'
    /** May be seen without being signed in. */
    open?: boolean
    /** A form that only this right can save: others are told so before they fill it in. */
    needs?: Right
  }
}

const UID = '[A-Za-z0-9_-]{22}'

const inCollection: RouteRecordRaw[] = [
  {
    path: 'hookups',
    name: PAGES.hookups,
    component: () => import('../views/AskView.vue'),
    meta: { title: 'page.hookups', place: 'hookups' },
  },
  {
    path: 'hookups/answer',
    name: PAGES.answer,
    component: () => import('../views/AnswerView.vue'),
    meta: { title: 'page.answer', place: 'hookups' },
  },
  {
    path: 'hookups/check',
    name: PAGES.check,
    component: () => import('../views/CheckView.vue'),
    meta: { title: 'page.check', place: 'hookups' },
  },
  {
    path: 'hookups/several',
    name: PAGES.arrange,
    component: () => import('../views/ArrangeView.vue'),
    meta: { title: 'page.arrange', place: 'hookups' },
  },
  {
    path: 'hookups/several/answer',
    name: PAGES.arrangement,
    component: () => import('../views/ArrangementView.vue'),
    meta: { title: 'page.arrangement', place: 'hookups' },
  },
  {
    path: `hookups/:hookup(${UID})`,
    name: PAGES.hookup,
    component: () => import('../views/SavedHookupView.vue'),
    meta: { title: 'page.hookup', place: 'hookups' },
  },
  {
    path: 'shelf',
    name: PAGES.shelf,
    component: () => import('../views/ShelfView.vue'),
    meta: { title: 'page.shelf', place: 'shelf' },
  },
  {
    path: 'shelf/add',
    name: PAGES.addUnit,
    component: () => import('../views/UnitFormView.vue'),
    meta: { title: 'page.add-unit', place: 'shelf', needs: 'shelf.write' },
  },
  {
    path: `shelf/:unit(${UID})`,
    name: PAGES.unit,
    component: () => import('../views/UnitView.vue'),
    meta: { title: 'page.unit', place: 'shelf' },
  },
  {
    path: `shelf/:unit(${UID})/edit`,
    name: PAGES.editUnit,
    component: () => import('../views/UnitFormView.vue'),
    meta: { title: 'page.edit-unit', place: 'shelf', needs: 'shelf.hold' },
  },
  {
    path: 'models',
    name: PAGES.models,
    component: () => import('../views/ModelsView.vue'),
    meta: { title: 'page.models', place: 'models' },
  },
  {
    path: 'models/add',
    name: PAGES.addModel,
    component: () => import('../views/ModelFormView.vue'),
    meta: { title: 'page.add-model', place: 'models', needs: 'models.write' },
  },
  {
    path: `models/:model(${UID})`,
    name: PAGES.model,
    component: () => import('../views/ModelView.vue'),
    meta: { title: 'page.model', place: 'models' },
  },
  {
    path: `models/:model(${UID})/edit`,
    name: PAGES.editModel,
    component: () => import('../views/ModelFormView.vue'),
    meta: { title: 'page.edit-model', place: 'models', needs: 'models.write' },
  },
]

export const ROUTE_TABLE: RouteRecordRaw[] = [
  {
    path: '/sign-in',
    name: PAGES.signIn,
    component: () => import('../views/SignInView.vue'),
    meta: { title: 'page.sign-in', open: true },
  },
  {
    path: '/help',
    name: PAGES.help,
    component: () => import('../views/HelpView.vue'),
    meta: { title: 'page.help', open: true },
  },
  {
    path: '/no-collection',
    name: PAGES.noCollection,
    component: () => import('../views/NoCollectionView.vue'),
    meta: { title: 'page.no-collection' },
  },
  {
    path: '/failed',
    name: PAGES.failed,
    component: () => import('../views/FailedView.vue'),
    meta: { title: 'page.failed', open: true },
  },
  {
    path: `/c/:collection(${UID})`,
    component: () => import('../views/CollectionFrame.vue'),
    meta: { title: 'page.hookups' },
    redirect: { name: PAGES.hookups },
    children: inCollection,
  },
  { path: '/', name: 'home', redirect: '/hookups', meta: { title: 'page.hookups' } },
  {
    path: '/:place(hookups|shelf|models)',
    name: 'home-place',
    component: () => import('../views/CollectionFrame.vue'),
    meta: { title: 'page.hookups' },
  },
  {
    path: '/:rest(.*)*',
    name: PAGES.notFound,
    component: () => import('../views/NotFoundView.vue'),
    meta: { title: 'page.not-found', open: true },
  },
]
