/** Figures on the keyboard go to the number keys, Enter does what the main button says. */
export function useSignOffKeys(entry: SignOffEntry, main: () => void) {
  const takesFigures = () => (entry.step === 'set' || entry.step === 'enter') && entry.way !== 'snug'

  function type(key: string) {
    if (key === '.' && entry.typed.includes('.')) return
    const typed = key === '.' && entry.typed === '' ? '0.' : entry.typed + key
    if (typed.length <= 7) entry.look({ typed, typing: entry.way !== 'read' })
  }

  function onKey(event: KeyboardEvent) {
    if (event.defaultPrevented || event.ctrlKey || event.metaKey || event.altKey || !(event.target instanceof Element)) return
    if (event.target.closest('input, textarea, select, dialog')) return
    const key = event.key === ',' ? '.' : event.key
    if (/^[\d.]$/.test(key) && takesFigures()) type(key)
    else if (key === 'Backspace' && entry.typed) entry.look({ typed: entry.typed.slice(0, -1) })
    else if (key === 'Enter' && !event.target.closest('button, a, summary')) main()
    else return
    event.preventDefault()
  }

  onMounted(() => document.addEventListener('keydown', onKey))
  onBeforeUnmount(() => document.removeEventListener('keydown', onKey))
}
