/** The piano's recorded notes: MIDI number and the address of the recording. Made by `build.mjs`, tuned to A4 = 440 Hz. */
import A1 from './A1.mp3'
import Cs2 from './Cs2.mp3'
import F2 from './F2.mp3'
import A2 from './A2.mp3'
import Cs3 from './Cs3.mp3'
import F3 from './F3.mp3'
import A3 from './A3.mp3'
import Cs4 from './Cs4.mp3'
import F4 from './F4.mp3'
import A4 from './A4.mp3'
import Cs5 from './Cs5.mp3'
import F5 from './F5.mp3'
import A5 from './A5.mp3'
import Cs6 from './Cs6.mp3'
import F6 from './F6.mp3'
import A6 from './A6.mp3'

export type Sample = Readonly<{ midi: number; address: string }>

export const SAMPLES: readonly Sample[] = [
  { midi: 33, address: A1 },
  { midi: 37, address: Cs2 },
  { midi: 41, address: F2 },
  { midi: 45, address: A2 },
  { midi: 49, address: Cs3 },
  { midi: 53, address: F3 },
  { midi: 57, address: A3 },
  { midi: 61, address: Cs4 },
  { midi: 65, address: F4 },
  { midi: 69, address: A4 },
  { midi: 73, address: Cs5 },
  { midi: 77, address: F5 },
  { midi: 81, address: A5 },
  { midi: 85, address: Cs6 },
  { midi: 89, address: F6 },
  { midi: 93, address: A6 },
]
