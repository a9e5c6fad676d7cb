import { create } from 'qrcode'
import { useMemo } from 'react'
import Svg, { Path, Rect } from 'react-native-svg'
import { LIGHT } from '@/components/theme'

/** Light modules that must surround a code, by its standard (ISO/IEC 18004). */
const QUIET_MODULES = 4

/** A square code, dark on light on either ground: cameras read it better so. */
export function QrCode({ text, sizePx, label }: Readonly<{ text: string; sizePx: number; label: string }>) {
  const { path, modules } = useMemo(() => {
    const { modules: grid } = create(text, { errorCorrectionLevel: 'M' })
    let drawn = ''
    for (let y = 0; y < grid.size; y += 1)
      for (let x = 0; x < grid.size; x += 1)
        if (grid.get(y, x)) drawn += `M${x + QUIET_MODULES} ${y + QUIET_MODULES}h1v1h-1z`
    return { path: drawn, modules: grid.size + 2 * QUIET_MODULES }
  }, [text])
  return (
    <Svg
      width={sizePx}
      height={sizePx}
      viewBox={`0 0 ${modules} ${modules}`}
      role="img"
      aria-label={label}
      {...({ shapeRendering: 'crispEdges' } as object)}
    >
      <Rect x={0} y={0} width={modules} height={modules} fill={LIGHT.leaf} />
      <Path d={path} fill={LIGHT.lampblack} />
    </Svg>
  )
}
