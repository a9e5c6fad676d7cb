import { execFile } from 'node:child_process'
import { join } from 'node:path'
import { promisify } from 'node:util'

const run = promisify(execFile)
const ROOT = join(__dirname, '../../..')

describe('what is generated from the fonts', () => {
  test.each(['fonts/build-bravura-table.mjs', 'fonts/build-text-widths.mjs'])(
    '%s would write what is there',
    async (script) => {
      const { stderr } = await run(process.execPath, ['--import', 'tsx', join(ROOT, script), '--check'], {
        cwd: ROOT,
      })
      expect(stderr).toBe('')
    },
    60_000,
  )
})
