import { ref } from 'vue'

/** Today's date where the reader is, as a plain date. */
export function useToday() {
  const now = new Date()
  const two = (n: number): string => String(n).padStart(2, '0')
  return ref(`${now.getFullYear()}-${two(now.getMonth() + 1)}-${two(now.getDate())}`)
}
