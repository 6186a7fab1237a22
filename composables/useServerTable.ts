import { getCoreRowModel, useVueTable, type ColumnDef, type RowData } from '@tanstack/vue-table'
import type { BaseTableColumn } from '~/components/base/TableHeading.vue'

declare module '@tanstack/vue-table' {
  // The names of the parameters are the library's own.
  // eslint-disable-next-line @typescript-eslint/no-unused-vars
  interface ColumnMeta<TData extends RowData, TValue> {
    align?: 'start' | 'end'
    /** The cell that carries the row's link. */
    link?: boolean
    /** Shown only from this width of the screen on. */
    from?: 'md' | 'lg' | 'xl'
  }
}

interface ServerTable<T> {
  rows: () => readonly T[]
  /** Id, heading, whether it sorts, and `meta` for how it is drawn. */
  columns: readonly (ColumnDef<T> & { id: string, header: string })[]
  rowId: (row: T) => string
  /** The sorted column's id, with a minus for descending; the server does the sorting. */
  sort: Ref<string>
}

/** A table whose rows the server sorts: columns, rows and sort as BaseTable takes them. */
export function useServerTable<T>({ rows, columns, rowId, sort }: ServerTable<T>) {
  const table = useVueTable<T>({
    get data() {
      return [...rows()]
    },
    columns: [...columns],
    getRowId: rowId,
    getCoreRowModel: getCoreRowModel(),
    manualSorting: true,
    enableMultiSort: false,
    state: {
      get sorting() {
        return sort.value ? [{ id: sort.value.replace(/^-/, ''), desc: sort.value.startsWith('-') }] : []
      },
    },
    onSortingChange: (updater) => {
      const next = typeof updater === 'function' ? updater(table.getState().sorting) : updater
      sort.value = next[0] ? `${next[0].desc ? '-' : ''}${next[0].id}` : ''
    },
  })

  return {
    columns: computed<BaseTableColumn[]>(() => table.getVisibleLeafColumns().map(({ id, columnDef, getCanSort }) => ({
      key: id, label: typeof columnDef.header === 'string' ? columnDef.header : id, sortable: getCanSort(), ...columnDef.meta,
    }))),
    rows: computed(() => table.getRowModel().rows.map(row => row.original)),
    sorted: computed({
      get: () => sort.value,
      set: chosen => table.setSorting([{ id: chosen.replace(/^-/, ''), desc: chosen.startsWith('-') }]),
    }),
  }
}
