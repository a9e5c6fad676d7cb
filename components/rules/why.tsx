import { lazy, Suspense, useState, type MouseEvent } from 'react'
import { createPortal } from 'react-dom'
import { View } from 'react-native'
import { space, useTheme, useWidth } from '@/components/theme'
import { Button, Dialog, Loading } from '@/components/ui'
import { useWords } from '@/components/words'
import { findRule, type RuleId } from '@/shared/rules'

/** Loaded by who asks: a phone that never asks carries none of it. */
const WhyArticle = lazy(() => import('./why-article').then(({ WhyArticle: it }) => ({ default: it })))

const WIDEST_PX = 760

/**
 * "Why?" at the end of a finding: the rule's page, laid over what one is doing and taken away again. It is a link to
 * that page too, so that it can be opened in another tab.
 */
export function Why({ ruleId }: Readonly<{ ruleId: RuleId }>) {
  const words = useWords()
  const { colors } = useTheme()
  const { widthPx } = useWidth()
  const [isOpen, setOpen] = useState(false)
  const title = findRule(ruleId)?.explain.title
  if (title === undefined) return null
  const open = (event: MouseEvent) => {
    // Whoever asks for another tab gets one.
    if (event.metaKey || event.ctrlKey || event.shiftKey) return
    event.preventDefault()
    event.stopPropagation()
    setOpen(true)
  }
  const dialogPx = Math.min(WIDEST_PX, widthPx - space.wide)
  return (
    <>
      <a
        href={`/rules/${ruleId}`}
        onClick={open}
        aria-haspopup="dialog"
        aria-label={words.rules.whySpoken(title)}
        style={{
          color: colors.azurite,
          textDecoration: 'underline',
          textDecorationThickness: 1,
          textUnderlineOffset: 3,
          whiteSpace: 'nowrap',
          padding: `${space.small}px ${space.tiny}px`,
          margin: `-${space.small}px -${space.tiny}px`,
        }}
      >
        {words.rules.why}
      </a>
      {isOpen
        ? createPortal(
            // Keys and presses in the dialog are not meant for the score behind it, though they bubble to it in React.
            <div
              onKeyDown={(event) => event.stopPropagation()}
              onClick={(event) => event.stopPropagation()}
              onPointerDown={(event) => event.stopPropagation()}
              role="presentation"
            >
              <Dialog
                title={title}
                isOpen
                onClose={() => setOpen(false)}
                widthPx={dialogPx}
                actions={
                  <>
                    <View style={{ justifyContent: 'center', flexGrow: 1 }}>
                      <a
                        href={`/rules/${ruleId}`}
                        target="_blank"
                        rel="noreferrer"
                        style={{ color: colors.azurite, padding: '12px 0' }}
                      >
                        {words.rules.onItsPage}
                      </a>
                    </View>
                    <Button label={words.common.close} onPress={() => setOpen(false)} />
                  </>
                }
              >
                <Suspense fallback={<Loading lines={6} />}>
                  <WhyArticle ruleId={ruleId} widthPx={dialogPx - 2 * space.wide} />
                </Suspense>
              </Dialog>
            </div>,
            document.body,
          )
        : null}
    </>
  )
}
