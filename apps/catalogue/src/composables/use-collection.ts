import { computed } from 'vue'
import { useRoute } from 'vue-router'

/** The collection in the address of the page. */
export function useCollection() {
  const route = useRoute()
  return computed(() => {
    const value = route.params['collection']
    return typeof value === 'string' ? value : ''
  })
}
