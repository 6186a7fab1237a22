/** A vehicle in a few words, such as "Unit S-14, Halyard 450". */
export function vehicleWords({ unitNumber, year, make, model }: {
  unitNumber: string | null
  year?: number | null
  make: string
  model: string
}): string {
  const name = [year, make, model].filter(Boolean).join(' ')
  return unitNumber ? `Unit ${unitNumber}, ${name}` : name
}

/** Where a value is printed, such as "Workshop manual, 3-12, p. 214, 2019". */
export function sourceWords({ title, section, page, date }: {
  title: string
  section: string | null
  page: string | null
  date: string | null
}): string {
  return [title, section, page && (/^\d/.test(page) ? `p. ${page}` : page), date].filter(Boolean).join(', ')
}
