import { useRouter } from 'expo-router'
import { useRef, useState } from 'react'
import { View } from 'react-native'
import { RefusalNotice, useMutation } from '@/components/api'
import { space } from '@/components/theme'
import { Button, Notice } from '@/components/ui'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'
import { findRule } from '@/shared/rules'

/** A rule set is a tenth of this. */
const MAX_FILE_BYTES = 60_000

/** What a field of the file is about, in words: the rule it belongs to, or its own name. */
function fieldInWords(path: string): string {
  const [, ruleId, , param] = /^rules\.([^.]+)(\.params\.?(.*))?/.exec(path) ?? []
  if (ruleId === undefined) return `“${path}”`
  const title = findRule(ruleId)?.explain.title ?? ruleId
  return param ? `“${title}” (${param})` : `“${title}”`
}

/** Takes a rule set in from a file, and says what in it cannot be taken. */
export function ImportRuleSet() {
  const words = useWords().ruleSets
  const router = useRouter()
  const input = useRef<HTMLInputElement>(null)
  const [problem, setProblem] = useState<string | null>(null)
  const take = useMutation(api.ruleSets.import)

  const read = async (file: File) => {
    setProblem(null)
    take.reset()
    if (file.size > MAX_FILE_BYTES) return setProblem(words.importTooLarge)
    let body: unknown
    try {
      body = JSON.parse(await file.text())
    } catch {
      return setProblem(words.importNotJson)
    }
    // The server judges it by the published schema; whatever it is, it is only sent.
    const result = await take.run({ body: body as never })
    if (result.ok) return router.push(`/rule-sets/${result.value.ruleSet.id}` as never)
    if (result.reason.code === 'invalid' || result.reason.code === 'bad-request')
      setProblem(words.importRefused(result.reason.fields.slice(0, 4).map(({ path }) => fieldInWords(path))))
  }

  return (
    <View style={{ gap: space.small }}>
      <input
        ref={input}
        type="file"
        accept=".json,application/json"
        hidden
        aria-label={words.import}
        onChange={(event) => {
          const file = event.target.files?.[0]
          event.target.value = ''
          if (file) void read(file)
        }}
      />
      <Button label={words.import} isBusy={take.isBusy} onPress={() => input.current?.click()} />
      {problem ? <Notice kind="bad" title={problem} /> : <RefusalNotice refusal={take.refusal} />}
    </View>
  )
}
