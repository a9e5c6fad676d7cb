// Read by any Node, however old: nothing newer than modules in here.
const NEEDED = [20, 19]

/** Ends with what to do where Node is too old for what we are built on. */
export function checkNode() {
  const parts = process.versions.node.split('.').map(Number)
  if (parts[0] > NEEDED[0] || (parts[0] === NEEDED[0] && parts[1] >= NEEDED[1])) return
  console.error(
    '\nBicinium needs Node ' +
      NEEDED.join('.') +
      ' or newer; this is Node ' +
      process.versions.node +
      '.\n' +
      'Install a newer one (on Debian: apt-get install -y nodejs npm, or a build from nodejs.org) and start again.\n',
  )
  process.exit(1)
}
