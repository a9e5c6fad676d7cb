const fs = require('node:fs')
const path = require('node:path')

const ROOT = path.resolve(__dirname, '..')
/** Where files made for the bundler are: inside the project, where it finds its files, and never in git. */
const OUTPUT = path.join(ROOT, 'dist', 'made')

/** Writes a file only when it differs, and whole: another build may be reading it. */
function writeMade(file, text) {
  if (fs.existsSync(file) && fs.readFileSync(file, 'utf8') === text) return
  fs.mkdirSync(path.dirname(file), { recursive: true })
  fs.writeFileSync(`${file}.${process.pid}`, text)
  fs.renameSync(`${file}.${process.pid}`, file)
}

module.exports = { OUTPUT, ROOT, writeMade }
