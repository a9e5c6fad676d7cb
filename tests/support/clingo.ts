/** Runs Debian's answer-set solver on the two exact rule sets, as an engine that shares nothing with ours. */
import { execFileSync, spawnSync } from 'node:child_process'
import path from 'node:path'
import type { Mode } from '@/shared/theory/mode'
import { chromaticNumber, diatonicNumber, pitchOf } from '@/shared/theory/pitch'
import { raisesSeventh, SCALE_SEMITONES } from '@/shared/theory/scale'

export type ClingoCase = Readonly<{
  cantus: readonly string[]
  mode: Mode
  final: string
  position: 'above' | 'below'
  lo: string
  hi: string
}>

export type ClingoAnswer = Readonly<{
  count: number
  /** A solution's atoms each, when they were asked for. */
  models: readonly (readonly string[])[]
  /** What clingo itself says it took, grounding and all. */
  seconds: number
}>

const PROGRAMS = path.join(__dirname, '..', 'fixtures', 'asp')

export const hasClingo = (): boolean => spawnSync('clingo', ['--version']).status === 0

/** Printed where a comparison is left out. */
export const CLINGO_MISSING =
  'clingo is not installed, so the comparison with it is left out: apt-get install gringo'

const place = (name: string): string => `${diatonicNumber(pitchOf(name))},${chromaticNumber(pitchOf(name))}`

/** The facts of a case. */
export function factsOf({ cantus, mode, final, position, lo, hi }: ClingoCase): string {
  const scale = SCALE_SEMITONES[mode].map((semitones, index) => `scale(${index + 1},${semitones}).`)
  return [
    `len(${cantus.length}). ${position}. final(${place(`${final}0`)}). lo(${place(lo)}). hi(${place(hi)}).`,
    ...cantus.map((name, index) => `cf(${index + 1},${place(name)}).`),
    ...scale,
    raisesSeventh(mode) ? 'raises.' : '',
  ].join('\n')
}

type Report = Readonly<{
  Call: readonly Readonly<{ Witnesses?: readonly Readonly<{ Value: readonly string[] }>[] }>[]
  Models: Readonly<{ Number: number }>
  Time: Readonly<{ Total: number }>
}>

/** All models of a program for a case, or their number alone. */
export function runClingo(
  program: 'core-1' | 'core-2',
  given: ClingoCase,
  wants: 'models' | 'count' = 'models',
): ClingoAnswer {
  const files = ['common.lp', `${program}.lp`].map((file) => path.join(PROGRAMS, file))
  const options = ['--models=0', '--outf=2', ...(wants === 'count' ? ['--quiet=2'] : []), ...files, '-']
  const report = JSON.parse(runQuietly(options, factsOf(given))) as Report
  return {
    count: report.Models.Number,
    models: report.Call.flatMap(({ Witnesses }) => Witnesses ?? []).map(({ Value }) => Value),
    seconds: report.Time.Total,
  }
}

/** clingo ends with 10, 20 or 30 when all went well, which an ordinary program would call a failure. */
function runQuietly(options: readonly string[], input: string): string {
  try {
    return execFileSync('clingo', options, { input, encoding: 'utf8', maxBuffer: 2 ** 30, stdio: 'pipe' })
  } catch (error) {
    const { status, stdout } = error as { status?: number; stdout?: string }
    if (status !== undefined && [10, 20, 30].includes(status)) return stdout ?? ''
    throw error
  }
}
