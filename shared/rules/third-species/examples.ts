import { exampleIn } from '@/shared/rules/example-in'

/** Four bars over a Dorian cantus: the line that most rules show as right. */
export const shortExample = exampleIn(3, 'D4 F4 E4 D4')
export const SHORT_LINE = 'D4:1,E4:1,F4:1,G4:1 A4:1,B4:1,C5:1,A4:1 G4:1,A4:1,B4:1,C#5:1 D5'

/** The same with a dissonant third quarter in its second bar. */
export const ACCENTED_LINE = 'D4:1,E4:1,F4:1,G4:1 A4:1,C5:1,B4:1,A4:1 G4:1,A4:1,B4:1,C#5:1 D5'
