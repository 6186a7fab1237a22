import { mountSuspended } from '@nuxt/test-utils/runtime'
import { h } from 'vue'
import { describe, expect, it } from 'vitest'
import { BaseTable } from '#components'

interface Row { id: string, tag: string, due: string }

const rows: Row[] = [{ id: 'a', tag: 'TW-07', due: '14 Mar 2027' }, { id: 'b', tag: 'TW-02', due: '24 Nov 2026' }]

function mountTable(sort = '') {
  return mountSuspended(BaseTable<Row>, {
    props: {
      columns: [{ key: 'tag', label: 'Wrench', sortable: true }, { key: 'due', label: 'Due', sortable: true }, { key: 'act', label: '' }],
      rows,
      rowKey: row => row.id,
      rowTo: row => `/wrenches/${row.id}`,
      caption: 'Wrenches',
      sort,
    },
    slots: {
      'cell-tag': ({ row }: { row: Row }) => row.tag,
      'cell-due': ({ row }: { row: Row }) => row.due,
      'cell-act': () => h('button', 'Record'),
    },
  })
}

describe('BaseTable', () => {
  it('says which column it is sorted by', async () => {
    const table = await mountTable('-due')
    expect(table.findAll('th').map(th => th.attributes('aria-sort'))).toEqual(['none', 'descending', undefined])
  })

  it.each([['', 'due'], ['due', '-due'], ['-due', 'due'], ['-tag', 'due']])('from %j a press on Due sorts by %j', async (from, to) => {
    const table = await mountTable(from)
    await table.findAll('th button')[1]?.trigger('click')
    expect(table.emitted('update:sort')).toEqual([[to]])
  })

  it('has a real link in each row, which a press beside it follows', async () => {
    const table = await mountTable()
    const link = table.get<HTMLAnchorElement>('tbody a')
    expect(link.attributes('href')).toBe('/wrenches/a')
    let followed = 0
    link.element.addEventListener('click', (event) => {
      event.preventDefault()
      followed++
    })
    await table.findAll('tbody td')[1]?.trigger('click')
    expect(followed).toBe(1)
    await table.get('tbody button').trigger('click')
    expect(followed).toBe(1)
  })

  it('has a caption for those who do not see it', async () => {
    expect((await mountTable()).get('caption').text()).toBe('Wrenches')
  })
})
