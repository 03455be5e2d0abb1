import { onBeforeUnmount, onMounted, ref, type Ref } from 'vue'

/** Width of an element's inside in pixels, followed as it changes. */
export function useWidth(element: Ref<HTMLElement | null>, first: number) {
  const width = ref(first)
  let observer: ResizeObserver | null = null

  onMounted(() => {
    if (!element.value) return
    observer = new ResizeObserver(([entry]) => {
      const inside = entry?.contentRect.width ?? 0
      if (inside > 0) width.value = Math.floor(inside)
    })
    observer.observe(element.value)
  })
  onBeforeUnmount(() => observer?.disconnect())

  return width
}
