import { readdirSync, readFileSync, writeFileSync } from 'node:fs'
import path from 'node:path'

/** Addresses, as regular expressions, and the chunks that a page there will ask for one after the other. */
const PAGES = [
  { address: '', chunks: ['_layout'] },
  { address: '^/lessons/[^/]+/desk$', chunks: ['desk', 'live-room'] },
  { address: '^/lessons/[^/]+/lectern$', chunks: ['lectern', 'live-room'] },
  { address: '^/lessons/[^/]+/wall$', chunks: ['wall', 'live-room'] },
]

/**
 * Lets a page load at once what it would else find out about chunk by chunk, a round trip each. The page itself is one for
 * all addresses, so that a script in its head looks at the address.
 */
export function loadAhead(directory) {
  const folder = '_expo/static/js/web'
  const files = readdirSync(path.join(directory, folder)).filter((name) => name.endsWith('.js'))
  const pages = PAGES.map(({ address, chunks }) => [
    address,
    chunks.map((chunk) => {
      const found = files.filter((name) => /^(.+)-[0-9a-f]{32}\.js$/.exec(name)?.[1] === chunk)
      if (found.length !== 1) throw new Error(`${found.length} chunks are called ${chunk}.`)
      return `/${folder}/${found[0]}`
    }),
  ])
  const script = `/* Made with the build: loads ahead what the page at this address will ask for. */
;(function () {
  var pages = ${JSON.stringify(pages)}
  pages.forEach(function (page) {
    if (!new RegExp(page[0]).test(location.pathname)) return
    page[1].forEach(function (href) {
      var link = document.createElement('link')
      link.rel = 'preload'
      link.as = 'script'
      link.href = href
      document.head.appendChild(link)
    })
  })
})()
`
  writeFileSync(path.join(directory, 'ahead.js'), script)
  const file = path.join(directory, 'index.html')
  const page = readFileSync(file, 'utf8')
  writeFileSync(file, page.replace('</head>', '  <script src="/ahead.js"></script>\n  </head>'))
}
