import { useRouter, type Href } from 'expo-router'
import { useEffect, useRef, useState } from 'react'
import { View } from 'react-native'
import { callApi } from '@/components/api'
import { space } from '@/components/theme'
import { Loading, Refused, useTitle } from '@/components/ui'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'

/** A wall link opened on the projector's own machine: the token is given up for a cookie that can only show. */
export function WallLinkScreen({ token }: Readonly<{ token: string }>) {
  const words = useWords()
  useTitle(words.wall.opening)
  const router = useRouter()
  const [problem, setProblem] = useState<string | null>(null)
  const asked = useRef(false)
  useEffect(() => {
    // A token is good for one exchange: never ask twice.
    if (asked.current) return
    asked.current = true
    callApi(api.lessons.openWall, { body: { token } }).then(
      (result) => {
        if (result.ok)
          router.replace(`/lessons/${result.value.lessonId}/wall${window.location.search}` as Href)
        else if (result.reason.code === 'offline') setProblem(words.errors.of('offline').title)
        else setProblem(words.wall.linkSpent)
      },
      () => undefined,
    )
  }, [token, router, words])
  return (
    <View role="main" id="page" style={{ padding: space.double }}>
      {problem ? <Refused level={1} title={problem} /> : <Loading lines={4} />}
    </View>
  )
}
