import { View } from 'react-native'
import { JoinField } from '@/components/landing/join-field'
import { Bicinium } from '@/components/landing/bicinium'
import { SiteHeader, useSession } from '@/components/session'
import { space, useWidth } from '@/components/theme'
import { LinkText, Page, Txt } from '@/components/ui'
import { useWords } from '@/components/words'

export default function Landing() {
  const words = useWords()
  const { me } = useSession()
  const { isWide } = useWidth()
  const person = me && !me.isGuest ? me : null
  return (
    <>
      <SiteHeader
        me={null}
        side={
          <View style={{ justifyContent: 'center' }}>
            <LinkText
              href={person ? '/home' : '/sign-in'}
              label={person ? words.common.nav.courses : words.common.signIn}
              style={{ paddingVertical: 10 }}
            />
          </View>
        }
      />
      <Page title={words.common.motto} heading={words.entry.landing.heading} size="display">
        <View style={{ gap: isWide ? space.triple : space.double }}>
          <View
            style={{ flexDirection: isWide ? 'row' : 'column', columnGap: space.triple, rowGap: space.wide }}
          >
            <View style={isWide ? { flex: 1, maxWidth: 720 } : null}>
              <Txt kind={isWide ? 'title' : 'text'} face="sans" tone="lead">
                {words.entry.landing.lede}
              </Txt>
            </View>
            <View style={isWide ? { flex: 1, maxWidth: 620, marginLeft: 'auto' } : null}>
              <JoinField />
            </View>
          </View>
          <Bicinium />
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: space.one }}>
            <Txt tone="lead" style={{ paddingVertical: 10 }}>
              {words.entry.landing.teaching}
            </Txt>
            {person ? (
              <LinkText
                href="/home"
                label={words.entry.landing.yourCourses}
                style={{ paddingVertical: 10 }}
              />
            ) : (
              <>
                <LinkText href="/sign-in" label={words.common.signIn} style={{ paddingVertical: 10 }} />
                <LinkText
                  href="/sign-up"
                  label={words.entry.landing.makeAccount}
                  style={{ paddingVertical: 10 }}
                />
              </>
            )}
          </View>
        </View>
      </Page>
    </>
  )
}
