import type { ImportReport } from '#shared/schemas/torque-specs'

interface Import {
  fileName: string
  csv: string
  report: ImportReport
  /** False after a refusal: nothing of it was kept. */
  written: boolean
}

/** The import of this sitting: its report stays while one looks at the specs it made. */
export function useSpecImport() {
  const { importCsv } = useTorqueSpecActions()
  const last = useState<Import | null>('spec-import', () => null)

  /** @param partial keep the good rows although others are refused. @throws ApiError without a report */
  async function send(fileName: string, csv: string, partial = false) {
    try {
      last.value = { fileName, csv, report: await importCsv(csv, partial), written: true }
      clearNuxtData('torque-specs')
    } catch (thrown) {
      const error = toApiError(thrown)
      const report = reportOf(error)
      if (!report) throw error
      last.value = { fileName, csv, report, written: false }
    }
  }

  function clear() {
    last.value = null
  }

  return { last, send, clear }
}
