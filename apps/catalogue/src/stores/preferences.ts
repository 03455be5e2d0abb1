import { chooseLocale, isLocale, type Locale } from '@coaxwain/wording'
import { defineStore } from 'pinia'
import { computed, ref, watchEffect } from 'vue'
import { setClientLocale } from '../api/client'
import { sayIn } from '../format/words'

const THEMES = ['system', 'day', 'night'] as const
export type Theme = (typeof THEMES)[number]

const isTheme = (value: unknown): value is Theme => (THEMES as readonly unknown[]).includes(value)

const read = (key: string): string | null => {
  try {
    return localStorage.getItem(key)
  } catch {
    return null
  }
}

const write = (key: string, value: string): void => {
  try {
    localStorage.setItem(key, value)
  } catch {
    // A browser that keeps nothing loses only this preference.
  }
}

/** Theme and language, kept on this device for each person. */
export const usePreferences = defineStore('preferences', () => {
  const owner = ref('')
  const theme = ref<Theme>('system')
  const locale = ref<Locale>('en-GB')
  const systemIsDark = ref(false)

  const night = computed(() =>
    theme.value === 'system' ? systemIsDark.value : theme.value === 'night',
  )
  const say = computed(() => sayIn(locale.value))
  const key = (name: string): string => `coaxwain.${name}${owner.value && `.${owner.value}`}`

  /** Preferences of one person, or of the device while nobody is signed in. */
  function load(person: string, languages: readonly string[]): void {
    owner.value = person
    const keptTheme = read(key('theme'))
    theme.value = isTheme(keptTheme) ? keptTheme : 'system'
    const keptLocale = read(key('locale'))
    locale.value = isLocale(keptLocale) ? keptLocale : chooseLocale(languages)
  }

  function setTheme(value: Theme): void {
    theme.value = value
    write(key('theme'), value)
  }

  const toggleNight = (): void => setTheme(night.value ? 'day' : 'night')

  function setLocale(value: Locale): void {
    locale.value = value
    write(key('locale'), value)
  }

  /** Puts theme and language on the page, and follows the system's preference. */
  function apply(root: HTMLElement, media: MediaQueryList): void {
    systemIsDark.value = media.matches
    media.addEventListener('change', (e) => {
      systemIsDark.value = e.matches
    })
    watchEffect(() => {
      root.classList.toggle('night', theme.value === 'night')
      root.classList.toggle('day', theme.value === 'day')
      root.lang = locale.value
      setClientLocale(locale.value)
    })
  }

  return { theme, locale, night, say, load, setTheme, toggleNight, setLocale, apply }
})
