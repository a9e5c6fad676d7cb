import { useEffect } from 'react'
import { GROUNDS, useTheme, type Ground } from '@/components/theme'

/** Light or dark by the address, for a projector nobody wants to walk to: `?ground=dark`. */
export function useGroundFromAddress(): void {
  const { setGround } = useTheme()
  useEffect(() => {
    const asked = new URLSearchParams(window.location.search).get('ground')
    if (asked !== null && (GROUNDS as readonly string[]).includes(asked)) setGround(asked as Ground)
  }, [setGround])
}
