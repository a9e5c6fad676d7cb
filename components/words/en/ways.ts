import { lesson } from './lesson'

/** How a line may be finished. */
export const ways = {
  /** Under a figure. */
  left: (isOne: boolean) => (isOne ? 'way left' : 'ways left'),
  toFinish: (isOne: boolean) => (isOne ? 'way to finish from here' : 'ways to finish from here'),
  /** In a line of words. */
  ofLine: (figure: string, isOne: boolean) => `${figure} ${isOne ? 'way' : 'ways'} to finish`,
  onRung: (figure: string, isOne: boolean) => `${figure} ${isOne ? 'way' : 'ways'}`,
  stuckAt: (bar: number) => `stuck at ${lesson.barsInSentence([bar])}`,
  counting: 'counting',
  /** Why a line cannot be finished: the bar, and the titles of the rules that leave nothing there. */
  stuckBecause: (bar: number, rules: readonly string[]) =>
    rules.length === 0
      ? `No note is left for ${lesson.barsInSentence([bar])}.`
      : `No note is left for ${lesson.barsInSentence([bar])}. What stands against each: ${rules.map((rule) => `“${rule}”`).join(', ')}.`,
  title: 'Ways to finish are told to',
  toldTo: { nobody: 'nobody', wall: 'the wall', everyone: 'the wall and the phones' },
} as const
