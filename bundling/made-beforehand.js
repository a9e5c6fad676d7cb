/**
 * Modules of ours whose value is worked out while bundling: browsers get the value, not the code that makes it. The
 * module itself stays what the server and the tests run.
 */
const path = require('node:path')
const esbuild = require('esbuild')
const { OUTPUT, ROOT, writeMade } = require('./made')

/** Module to the one constant it exports: plain data. */
const MODULES = { 'shared/rules/rule-book.ts': 'RULE_BOOK' }

async function makeBeforehand(file, name) {
  const { outputFiles } = await esbuild.build({
    entryPoints: [path.join(ROOT, file)],
    bundle: true,
    write: false,
    format: 'cjs',
    platform: 'node',
    packages: 'external',
    alias: { '@': ROOT },
  })
  const module = { exports: {} }
  new Function('module', 'exports', 'require', outputFiles[0].text)(module, module.exports, require)
  const made = path.join(OUTPUT, path.basename(file).replace(/\.ts$/, '.js'))
  // As text: a browser reads JSON faster than it reads code.
  writeMade(
    made,
    `export const ${name} = JSON.parse(${JSON.stringify(JSON.stringify(module.exports[name]))})\n`,
  )
  return [path.join(ROOT, file), made]
}

/** Makes the values, and answers where a module's is: its path to another. */
async function makeModulesBeforehand() {
  return new Map(await Promise.all(Object.entries(MODULES).map(([file, name]) => makeBeforehand(file, name))))
}

module.exports = { makeModulesBeforehand }
