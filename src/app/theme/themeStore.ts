import { defineStore } from 'pinia'
import { computed, ref, watchEffect } from 'vue'

type Wish = 'system' | 'paper' | 'attic'
const wishes: readonly Wish[] = ['system', 'paper', 'attic']
const key = 'mudring.theme'

const remembered = (): Wish => wishes.find((wish) => wish === localStorage.getItem(key)) ?? 'system'

/** Paper or attic: as the system says, until somebody chooses. */
export const useThemeStore = defineStore('theme', () => {
  const wish = ref<Wish>(remembered())
  const dark = window.matchMedia('(prefers-color-scheme: dark)')
  const systemIsDark = ref(dark.matches)
  dark.addEventListener('change', (event) => (systemIsDark.value = event.matches))
  const theme = computed(() => (wish.value === 'system' ? (systemIsDark.value ? 'attic' : 'paper') : wish.value))
  watchEffect(() => (document.documentElement.dataset['theme'] = theme.value))

  function choose(next: Wish) {
    wish.value = next
    localStorage.setItem(key, next)
  }
  return { wish, theme, choose }
})
