/**
 * A plugin for babel: leaves what a rule tells of itself to who asks "why?" out of the files of `shared/rules`. A desk
 * judges notes and says what mends them; examples, sources and reasons are a chunk of their own, the rule book, which is
 * made of the whole registry (`made-beforehand.js`) and asked for by `useRuleBook`.
 */
const LIFTED = new Set(['statement', 'why', 'sources', 'right', 'wrong', 'disagreement'])
const RULE_FILE = /[\\/]shared[\\/]rules[\\/].+\.ts$/

const nameOf = ({ node }) =>
  node.type === 'ObjectProperty' && !node.computed ? (node.key.name ?? node.key.value) : null

module.exports = () => ({
  name: 'plain-rules',
  visitor: {
    ObjectExpression(object, { filename }) {
      if (!RULE_FILE.test(filename ?? '')) return
      const properties = object.get('properties')
      const names = properties.map(nameOf)
      // An explanation is known by its shape, wherever it is written.
      if (!names.includes('statement') || !names.includes('messages')) return
      for (const [index, property] of properties.entries()) if (LIFTED.has(names[index])) property.remove()
    },
  },
})
