import type { Handlers } from '../http/call'
import type { PeopleService } from './service'

export const peopleRoutes = (people: PeopleService) =>
  ({
    readSession: ({ person }) => people.session(person),

    signIn: async ({ signIn }) => people.session(await signIn()),

    signOut: async ({ signOut }) => {
      await signOut()
      return null
    },

    listDemoSignIns: () => people.demoSignIns(),
  }) satisfies Handlers
