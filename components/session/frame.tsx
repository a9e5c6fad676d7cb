import { usePathname } from 'expo-router'
import type { ReactNode } from 'react'
import { View } from 'react-native'
import { space, useTheme, useWidth } from '@/components/theme'
import { LinkText, Lozenge, Name, Page, Txt, type PageProps, usePageMeasure } from '@/components/ui'
import { useWords } from '@/components/words'
import type { Me } from '@/shared/api/people'

/** A page of the house outside lessons: the line with the lozenge at its head, and where else one can go. */
export function Frame({ me, ...page }: PageProps & Readonly<{ me: Me | null }>) {
  return (
    <>
      <SiteHeader me={me} />
      <Page {...page} />
    </>
  )
}

export function SiteHeader({ me, side }: Readonly<{ me: Me | null; side?: ReactNode }>) {
  const { colors } = useTheme()
  const { isWide } = useWidth()
  const { marginPx } = usePageMeasure()
  const words = useWords().common
  return (
    <View
      role="banner"
      style={{
        minHeight: isWide ? 56 : 52,
        paddingHorizontal: marginPx,
        flexDirection: 'row',
        alignItems: 'stretch',
        columnGap: isWide ? space.wide : space.one,
        borderBottomWidth: 1,
        borderColor: colors.hairline,
      }}
    >
      <View style={{ justifyContent: 'center' }}>
        <LinkText
          href={me ? '/home' : '/'}
          label={words.product}
          kind="title"
          tone="lampblack"
          style={{ textDecorationLine: 'none', paddingVertical: space.small }}
        >
          <Brand isShort={!isWide && me !== null} />
        </LinkText>
      </View>
      <View style={{ flexGrow: 1 }} />
      {me ? <SiteNav me={me} /> : side}
    </View>
  )
}

/** The lozenge and the name; where the places need the room, the lozenge alone, with the name for those who listen. */
function Brand({ isShort }: Readonly<{ isShort: boolean }>) {
  const words = useWords().common
  return (
    <View
      style={{ flexDirection: 'row', alignItems: 'center', gap: space.half, minHeight: 36, minWidth: 28 }}
    >
      <Lozenge sizePx={isShort ? 16 : 12} />
      {isShort ? <span className="unseen">{words.product}</span> : <Txt kind="title">{words.product}</Txt>}
    </View>
  )
}

function SiteNav({ me }: Readonly<{ me: Me }>) {
  const { isWide } = useWidth()
  const words = useWords().common
  const path = usePathname()
  const places = [
    { href: '/home', label: words.nav.courses, isHere: path === '/home' || path.startsWith('/courses') },
    { href: '/cantus', label: words.nav.cantus, isHere: path.startsWith('/cantus') },
    {
      href: '/rule-sets',
      label: words.nav.rules,
      isHere: path.startsWith('/rule'),
    },
    ...(me.isAdministrator
      ? [{ href: '/people', label: words.nav.people, isHere: path.startsWith('/people') }]
      : []),
  ]
  return (
    <View
      role="navigation"
      aria-label={words.nav.label}
      // An administrator's five places take two lines on the narrowest phone.
      style={{
        flexDirection: 'row',
        flexWrap: 'wrap',
        justifyContent: 'flex-end',
        columnGap: isWide ? space.wide : space.one,
        minWidth: 0,
        flexShrink: 1,
      }}
    >
      {places.map(({ href, label, isHere }) => (
        <NavLink key={href} href={href} isHere={isHere}>
          {label}
        </NavLink>
      ))}
      <NavLink href="/account" isHere={path.startsWith('/account')} canShrink={isWide}>
        {isWide ? <Name>{me.name}</Name> : words.nav.account}
      </NavLink>
    </View>
  )
}

function NavLink({
  href,
  isHere,
  canShrink = false,
  children,
}: Readonly<{ href: string; isHere: boolean; canShrink?: boolean; children: ReactNode }>) {
  const { colors } = useTheme()
  return (
    <View
      style={{
        justifyContent: 'center',
        borderBottomWidth: 3,
        borderTopWidth: 3,
        borderColor: 'transparent',
        borderBottomColor: isHere ? colors.azurite : 'transparent',
        marginBottom: -1,
        flexShrink: canShrink ? 1 : 0,
        maxWidth: 320,
        minWidth: 44,
        alignItems: 'center',
      }}
    >
      <LinkText
        href={href}
        kind="note"
        tone={isHere ? 'lampblack' : 'lead'}
        isStrong={isHere}
        isCurrent={isHere}
        style={{ textDecorationLine: 'none', paddingVertical: 12, whiteSpace: 'nowrap' } as never}
      >
        <Txt kind="note" tone={isHere ? 'lampblack' : 'lead'} isStrong={isHere} lines={1}>
          {children}
        </Txt>
      </LinkText>
    </View>
  )
}
