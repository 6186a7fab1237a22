export interface Toast {
  id: number
  text: string
  kind: 'info' | 'error'
}

const shownForMs = 8000

/** Short messages after an act. Information goes by itself; an error stays until it is closed. */
export function useToasts() {
  const toasts = useState<Toast[]>('toasts', () => [])

  function remove(id: number) {
    toasts.value = toasts.value.filter(toast => toast.id !== id)
  }

  function add(text: string, kind: Toast['kind'] = 'info') {
    const id = Math.max(0, ...toasts.value.map(toast => toast.id)) + 1
    toasts.value = [...toasts.value, { id, text, kind }]
    if (import.meta.client && kind === 'info') setTimeout(() => remove(id), shownForMs)
  }

  return { toasts, add, remove }
}
