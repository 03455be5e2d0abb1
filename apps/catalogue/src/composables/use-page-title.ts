import { useRoute } from 'vue-router'
import { useWords } from './use-words'

const TITLE_ID = 'page-title'

/** The title of the page in the tab, and the heading that takes the focus when a page opens. */
export function usePageTitle() {
  const route = useRoute()
  const { say } = useWords()

  function setTitle(title: string): void {
    const page = title === '' ? say(route.meta.title) : title
    document.title = say('app.title', { page })
  }

  return { titleId: TITLE_ID, setTitle }
}
