import type { CSSProperties, ReactNode } from 'react'
import { View } from 'react-native'
import { fonts, leading, space, type, useTheme, useWidth } from '@/components/theme'
import { useWords } from '@/components/words'
import { Txt } from './txt'

export type Column<Row> = Readonly<{
  key: string
  label: string
  cell: (row: Row) => ReactNode
  /** Set when the list can be sorted by it. */
  isSortable?: boolean
  align?: 'left' | 'right'
  width?: string
  /** On a phone this cell is the card's heading, or stands at its foot; the others are lines with their label. */
  onPhone?: 'heading' | 'foot' | 'line' | 'hidden'
}>

export type Sort = Readonly<{ by: string; direction: 'up' | 'down' }>

/** Rows of facts: a real table where there is room, the same rows as blocks on a phone. */
export function Table<Row>({
  label,
  columns,
  rows,
  keyOf,
  sort,
  onSort,
}: Readonly<{
  label: string
  columns: readonly Column<Row>[]
  rows: readonly Row[]
  keyOf: (row: Row) => string
  sort?: Sort
  onSort?: (sort: Sort) => void
}>) {
  const { isWide } = useWidth()
  return isWide ? (
    <WideTable {...{ label, columns, rows, keyOf, sort, onSort }} />
  ) : (
    <Blocks {...{ label, columns, rows, keyOf }} />
  )
}

function WideTable<Row>({ label, columns, rows, keyOf, sort, onSort }: Parameters<typeof Table<Row>>[0]) {
  const { colors } = useTheme()
  const words = useWords().common
  const cell: CSSProperties = {
    padding: `${space.tiny}px ${space.one}px ${space.tiny}px 0`,
    borderBottom: `1px solid ${colors.hairline}`,
    verticalAlign: 'middle',
    height: 50,
    font: `${type.text}px/${leading.text}px ${fonts.AlegreyaSans}`,
    fontVariantNumeric: 'tabular-nums lining-nums',
    overflowWrap: 'anywhere',
  }
  const head: CSSProperties = {
    ...cell,
    height: 40,
    padding: `0 ${space.one}px 0 0`,
    font: `${type.note}px/${leading.note}px ${fonts.AlegreyaSansMedium}`,
    color: colors.lead,
    borderBottom: `1.5px solid ${colors.lampblack}`,
  }
  const ends = (place: number): CSSProperties => (place === columns.length - 1 ? { paddingRight: 0 } : {})
  const next = (key: string): Sort => ({
    by: key,
    direction: sort?.by === key && sort.direction === 'up' ? 'down' : 'up',
  })
  return (
    <table
      style={{ width: '100%', borderCollapse: 'collapse', color: colors.lampblack, tableLayout: 'fixed' }}
      aria-label={label}
    >
      <colgroup>
        {columns.map((column) => (
          <col key={column.key} style={{ width: column.width }} />
        ))}
      </colgroup>
      <thead>
        <tr>
          {columns.map((column, place) => {
            const isBy = sort?.by === column.key
            return (
              <th
                key={column.key}
                scope="col"
                aria-sort={isBy ? (sort.direction === 'up' ? 'ascending' : 'descending') : undefined}
                style={{ ...head, ...ends(place), textAlign: column.align ?? 'left' }}
              >
                {column.isSortable && onSort ? (
                  <button
                    type="button"
                    onClick={() => onSort(next(column.key))}
                    title={
                      isBy
                        ? sort.direction === 'up'
                          ? words.sortedUp(column.label)
                          : words.sortedDown(column.label)
                        : words.sortBy(column.label)
                    }
                    style={{
                      font: 'inherit',
                      color: isBy ? colors.lampblack : 'inherit',
                      background: 'none',
                      border: 0,
                      padding: 0,
                      minHeight: 40,
                      cursor: 'pointer',
                    }}
                  >
                    {column.label}
                    <span aria-hidden style={{ display: 'inline-block', width: 18, textAlign: 'center' }}>
                      {isBy ? (sort.direction === 'up' ? '↑' : '↓') : ''}
                    </span>
                  </button>
                ) : (
                  column.label
                )}
              </th>
            )
          })}
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={keyOf(row)}>
            {columns.map((column, place) =>
              column.onPhone === 'heading' ? (
                <th key={column.key} scope="row" style={{ ...cell, textAlign: 'left', fontWeight: 'normal' }}>
                  {column.cell(row)}
                </th>
              ) : (
                <td key={column.key} style={{ ...cell, ...ends(place), textAlign: column.align ?? 'left' }}>
                  {column.align === 'right' ? (
                    <View style={{ alignItems: 'flex-end' }}>{column.cell(row)}</View>
                  ) : (
                    column.cell(row)
                  )}
                </td>
              ),
            )}
          </tr>
        ))}
      </tbody>
    </table>
  )
}

function Blocks<Row>({ label, columns, rows, keyOf }: Parameters<typeof Table<Row>>[0]) {
  const { colors } = useTheme()
  const part = (which: string) => columns.filter((column) => (column.onPhone ?? 'line') === which)
  return (
    <View role="list" aria-label={label} style={{ borderTopWidth: 1.5, borderColor: colors.lampblack }}>
      {rows.map((row) => (
        <View
          role="listitem"
          key={keyOf(row)}
          style={{
            borderBottomWidth: 1,
            borderColor: colors.hairline,
            paddingVertical: space.half,
            gap: space.tiny,
          }}
        >
          {part('heading').map((column) => (
            <View key={column.key}>{column.cell(row)}</View>
          ))}
          {part('line').map((column) => (
            <View key={column.key} style={{ flexDirection: 'row', gap: space.half, alignItems: 'baseline' }}>
              <Txt kind="note" tone="lead" style={{ width: 84, flexShrink: 0 }}>
                {column.label}
              </Txt>
              <View style={{ flex: 1, minWidth: 0 }}>{column.cell(row)}</View>
            </View>
          ))}
          {part('foot').map((column) => (
            // A frameless button's words begin where the other words do.
            <View key={column.key} style={{ marginLeft: -space.small }}>
              {column.cell(row)}
            </View>
          ))}
        </View>
      ))}
    </View>
  )
}
