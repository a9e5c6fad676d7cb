import { percentileOf, type BenchRow } from './row'

const HEADS = ['line', 'work', 'median', 'p95', 'runs', 'goal'] as const
/** Columns of figures stand flush right. */
const FLUSH_RIGHT = new Set([2, 3, 4])

/** Three significant figures, without an exponent. */
const formatFigure = (value: number, unit: string): string => {
  const digits = value === 0 ? 0 : Math.max(0, 2 - Math.floor(Math.log10(Math.abs(value))))
  return `${value.toFixed(Math.min(6, digits))} ${unit}`
}

/** Sets rows as a table of plain text, columns aligned. */
export function formatTable(rows: readonly BenchRow[]): string {
  const cells = rows.map(({ line, work, samples, unit, goal }) => [
    line,
    work,
    formatFigure(percentileOf(samples, 0.5), unit),
    formatFigure(percentileOf(samples, 0.95), unit),
    String(samples.length),
    goal,
  ])
  const table = [[...HEADS], ...cells]
  const widths = HEADS.map((_, column) => Math.max(...table.map((row) => (row[column] as string).length)))
  const setRow = (row: readonly string[]): string =>
    row
      .map((cell, column) => {
        const width = widths[column] as number
        return FLUSH_RIGHT.has(column) ? cell.padStart(width) : cell.padEnd(width)
      })
      .join('  ')
      .trimEnd()
  const rule = widths.map((width) => '-'.repeat(width)).join('  ')
  return [setRow(HEADS), rule, ...cells.map(setRow)].join('\n')
}
