import { exampleIn } from '@/shared/rules/example-in'

/** Four bars over a Dorian cantus: the line that most rules show as right. */
export const shortExample = exampleIn(2, 'D4 F4 E4 D4')
export const SHORT_LINE = 'r:2,A4:2 D5:2,A4:2 B4:2,C#5:2 D5'

/** Five bars whose leaps all lie inside the bar. */
export const steppingExample = exampleIn(2, 'D4 E4 F4 E4 D4')
export const STEPPING_LINE = 'A4:2,D5:2 C5:2,E5:2 D5:2,A4:2 B4:2,C#5:2 D5'

/** Five bars in which the second upbeat is a dissonant passing note. */
export const passingExample = exampleIn(2, 'D4 E4 G4 E4 D4')
export const PASSING_LINE = 'r:2,A4:2 G4:2,A4:2 B4:2,G4:2 B4:2,C#5:2 D5'
