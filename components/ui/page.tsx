import { useLayoutEffect, type ReactNode } from 'react'
import { View } from 'react-native'
import { MEASURE_PX, space, useWidth } from '@/components/theme'
import { Heading } from './heading'
import { LinkText } from './link-text'
import { Txt } from './txt'
import { StaffFoot } from './staff-foot'
import { useArrival } from './use-arrival'
import { usePageMeasure, WIDEST_PX } from './use-page-measure'
import { useTitle } from './use-title'

export type PageProps = Readonly<{
  /** Names the browser's tab, and the page's first heading unless `heading` is given. */
  title: string
  heading?: ReactNode
  /** Where this page hangs: a link above the heading. */
  up?: Readonly<{ href: string; label: ReactNode }>
  /** A sentence under the heading. */
  lede?: ReactNode
  /** Acts of the whole page, at the right of its heading. */
  actions?: ReactNode
  /** `display`: the largest heading, for the page that says what this is. */
  size?: 'plain' | 'display'
  /** `text`: one measure of prose. `wide`: all the room there is, within reason. */
  width?: 'text' | 'wide'
  children: ReactNode
}>

/** Where the skip link leads. */
const MAIN_ID = 'page'

/** The sheet that a page is written on: margins, heading, and the tab's name. */
export function Page({
  title,
  heading,
  up,
  lede,
  actions,
  width = 'wide',
  size = 'plain',
  children,
}: PageProps) {
  useTitle(title)
  useArrival(MAIN_ID)
  useLayoutEffect(() => {
    document.documentElement.classList.add('scrolls')
    return () => document.documentElement.classList.remove('scrolls')
  }, [])
  const { isWide } = useWidth()
  const { marginPx } = usePageMeasure()
  return (
    <View
      role="main"
      id={MAIN_ID}
      style={{
        width: '100%',
        maxWidth: (width === 'text' ? MEASURE_PX : WIDEST_PX) + 2 * marginPx,
        paddingHorizontal: marginPx,
        paddingTop: isWide ? space.wide : space.one,
        paddingBottom: space.triple,
        gap: space.wide,
        flexGrow: 1,
        minWidth: 0,
      }}
    >
      <View style={{ gap: space.tiny }}>
        {up ? (
          <Txt kind="note" tone="lead">
            <LinkText href={up.href} kind="note" tone="lead" style={{ paddingVertical: 6 }}>
              {up.label}
            </LinkText>
          </Txt>
        ) : null}
        <View
          style={{
            flexDirection: 'row',
            flexWrap: 'wrap',
            alignItems: 'flex-start',
            justifyContent: 'space-between',
            columnGap: space.wide,
            rowGap: space.half,
          }}
        >
          <View style={{ minWidth: 0, flexShrink: 1, flexGrow: 1, flexBasis: 280, gap: space.tiny }}>
            <Heading
              level={1}
              kind={size === 'display' ? (isWide ? 'wall' : 'head') : isWide ? 'head' : 'large'}
            >
              {heading ?? title}
            </Heading>
            {typeof lede === 'string' ? (
              <Txt tone="lead" style={{ maxWidth: MEASURE_PX }}>
                {lede}
              </Txt>
            ) : (
              lede
            )}
          </View>
          {actions ? (
            <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.small, maxWidth: '100%' }}>
              {actions}
            </View>
          ) : null}
        </View>
      </View>
      {children}
      {width === 'text' && isWide ? <StaffFoot /> : null}
    </View>
  )
}
