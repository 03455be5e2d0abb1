import { onScopeDispose, ref } from 'vue'

const PHONE = '(max-width: 899px)'

/** Whether the page is laid out for a phone. Only what cannot be done by style sheet may depend on it. */
export function usePhone() {
  const media = matchMedia(PHONE)
  const phone = ref(media.matches)
  const follow = (event: MediaQueryListEvent): void => {
    phone.value = event.matches
  }
  media.addEventListener('change', follow)
  onScopeDispose(() => media.removeEventListener('change', follow))
  return phone
}
